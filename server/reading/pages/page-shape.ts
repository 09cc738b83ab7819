/** What a page looks like before anything is read: is there ink, how large are the letters, where is print. */
import type { InkPatch } from './components.ts';
import { findInkPatches } from './components.ts';
import type { Grey } from './raster.ts';

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
  const patches = findInkPatches(flat, INK_BELOW);
  const marks = patches.filter((patch) => isMark(patch, flat));
  const letters = marks.filter(isLetterLike);
  return {
    blank: isBlank(marks, flat),
    letterHeight: letters.length < 25 ? null : findTypicalHeight(letters),
    content: findContent(marks, flat),
  };
}

/** The same shape in pixels `factor` times as fine, kept within a page of the given size. */
export function scaleShape(
  shape: PageShape,
  factor: number,
  width: number,
  height: number,
): PageShape {
  const left = Math.max(0, Math.floor(shape.content.left * factor));
  const top = Math.max(0, Math.floor(shape.content.top * factor));
  return {
    blank: shape.blank,
    letterHeight: shape.letterHeight === null ? null : shape.letterHeight * factor,
    content: {
      left,
      top,
      width: Math.max(1, Math.min(width - left, Math.ceil(shape.content.width * factor))),
      height: Math.max(1, Math.min(height - top, Math.ceil(shape.content.height * factor))),
    },
  };
}

/** Specks, and lines or shadows along the border, are no marks. */
function isMark(patch: InkPatch, page: Grey): boolean {
  const width = patch.right - patch.left;
  const height = patch.bottom - patch.top;
  if (patch.area < 5 || (width < 3 && height < 3)) return false;
  const edge = Math.round(Math.min(page.width, page.height) * 0.01);
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
  return height >= 4 && height <= 80 && width >= 2 && width < height * 3 && width * 8 > height;
}

/** Mean of the middle half of all heights: finer than a median of whole pixels. */
function findTypicalHeight(patches: InkPatch[]): number {
  const heights = patches.map((patch) => patch.bottom - patch.top).sort((a, b) => a - b);
  const middle = heights.slice(heights.length >> 2, Math.ceil(heights.length * 0.75));
  return middle.reduce((sum, height) => sum + height, 0) / middle.length;
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

function findContent(marks: InkPatch[], page: Grey): Rect {
  let [left, top, right, bottom] = [page.width, page.height, 0, 0];
  for (const mark of marks) {
    left = Math.min(left, mark.left);
    top = Math.min(top, mark.top);
    right = Math.max(right, mark.right);
    bottom = Math.max(bottom, mark.bottom);
  }
  if (right <= left || bottom <= top) {
    return { left: 0, top: 0, width: page.width, height: page.height };
  }
  const margin = 16;
  const x = Math.max(0, left - margin);
  const y = Math.max(0, top - margin);
  return {
    left: x,
    top: y,
    width: Math.min(page.width, right + margin) - x,
    height: Math.min(page.height, bottom + margin) - y,
  };
}
