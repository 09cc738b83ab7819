/** What a page looks like before anything is read: is there ink, how large are the letters, where is print. */
import type { InkPatch } from './components.ts';
import { findInkPatches } from './components.ts';
import type { Grey } from './raster.ts';
import { shrinkTo } from './raster.ts';

/** A rectangle in pixels. */
export interface Rect {
  left: number;
  top: number;
  width: number;
  height: number;
}

export interface PageShape {
  /** True when the page carries next to no ink. */
  blank: boolean;
  /** Median height of letters in pixels, null where fewer than a few dozen marks look like letters. */
  letterHeight: number | null;
  /** The rectangle that holds the print, with a margin. */
  content: Rect;
}

const INK_BELOW = 150;

/** Measures an evened-out page; all results in its own pixels. */
export function measurePage(flat: Grey): PageShape {
  const factor = Math.max(1, Math.floor(Math.max(flat.width, flat.height) / 1700));
  const small = factor === 1 ? flat : shrinkTo(flat, 1700);
  const scale = flat.width / small.width;
  const patches = findInkPatches(small, INK_BELOW);
  const marks = patches.filter((patch) => isMark(patch, small));
  const letters = marks.filter(isLetterLike);
  return {
    blank: isBlank(marks, small),
    letterHeight: letters.length < 25 ? null : findMedianHeight(letters) * scale,
    content: findContent(marks, small, scale, flat),
  };
}

/** Specks, and lines or shadows along the border, are no marks. */
function isMark(patch: InkPatch, page: Grey): boolean {
  const width = patch.right - patch.left;
  const height = patch.bottom - patch.top;
  if (patch.area < 5 || (width < 3 && height < 3)) return false;
  const edge = Math.round(Math.min(page.width, page.height) * 0.012);
  const touches =
    patch.left <= edge ||
    patch.top <= edge ||
    patch.right >= page.width - edge ||
    patch.bottom >= page.height - edge;
  const long = width > page.width * 0.25 || height > page.height * 0.25;
  const thin = Math.min(width, height) <= edge * 2;
  return !(touches && (long || thin));
}

function isLetterLike(patch: InkPatch): boolean {
  const width = patch.right - patch.left;
  const height = patch.bottom - patch.top;
  return height >= 5 && height <= 90 && width >= 2 && width < height * 3 && width * 8 > height;
}

function findMedianHeight(patches: InkPatch[]): number {
  const heights = patches.map((patch) => patch.bottom - patch.top).sort((a, b) => a - b);
  return heights[heights.length >> 1] ?? 0;
}

function isBlank(marks: InkPatch[], page: Grey): boolean {
  let inked = 0;
  let sized = 0;
  for (const mark of marks) {
    inked += mark.area;
    if (mark.bottom - mark.top >= 5 && mark.right - mark.left >= 3) sized++;
  }
  return sized < 8 && inked < page.width * page.height * 0.0012;
}

function findContent(marks: InkPatch[], small: Grey, scale: number, flat: Grey): Rect {
  let [left, top, right, bottom] = [small.width, small.height, 0, 0];
  for (const mark of marks) {
    left = Math.min(left, mark.left);
    top = Math.min(top, mark.top);
    right = Math.max(right, mark.right);
    bottom = Math.max(bottom, mark.bottom);
  }
  if (right <= left || bottom <= top) {
    return { left: 0, top: 0, width: flat.width, height: flat.height };
  }
  const margin = 18;
  const x = Math.max(0, Math.floor((left - margin) * scale));
  const y = Math.max(0, Math.floor((top - margin) * scale));
  return {
    left: x,
    top: y,
    width: Math.min(flat.width, Math.ceil((right + margin) * scale)) - x,
    height: Math.min(flat.height, Math.ceil((bottom + margin) * scale)) - y,
  };
}
