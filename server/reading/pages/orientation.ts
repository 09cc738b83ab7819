/** Whether a page lies on its side, told from the shape of its print. */
import { findInkPatches, type InkPatch } from './components.ts';
import type { Grey } from './raster.ts';

const INK_BELOW = 150;
/** Fewer letters than this say nothing. */
const MIN_LETTERS = 12;

/**
 * True when lines of print run up and down: letters stand closer to the next letter of their line than
 * to the next line, so most of them have their nearest neighbour above or below instead of beside them.
 */
export function liesOnSide(flat: Grey): boolean {
  const letters = findInkPatches(flat, INK_BELOW).filter(isLetterLike);
  if (letters.length < MIN_LETTERS) return false;
  const { beside, stacked } = countNeighbours(letters);
  return stacked > beside * 1.3;
}

/** Letters either way up: the shape of a letter on its side is not known to be one. */
function isLetterLike(patch: InkPatch): boolean {
  const width = patch.right - patch.left;
  const height = patch.bottom - patch.top;
  const long = Math.max(width, height);
  const short = Math.min(width, height);
  return long >= 5 && long <= 70 && short >= 2 && long <= short * 5 && patch.area >= 9;
}

function countNeighbours(letters: InkPatch[]): { beside: number; stacked: number } {
  const cell = 40;
  const grid = new Map<number, InkPatch[]>();
  const keyOf = (x: number, y: number) => Math.floor(y / cell) * 4096 + Math.floor(x / cell);
  for (const letter of letters) {
    const key = keyOf(middleX(letter), middleY(letter));
    const list = grid.get(key);
    if (list) list.push(letter);
    else grid.set(key, [letter]);
  }
  let beside = 0;
  let stacked = 0;
  for (const letter of letters) {
    let best: InkPatch | null = null;
    let bestGap = Infinity;
    for (let dy = -1; dy <= 1; dy++) {
      for (let dx = -1; dx <= 1; dx++) {
        const key = keyOf(middleX(letter) + dx * cell, middleY(letter) + dy * cell);
        for (const other of grid.get(key) ?? []) {
          if (other === letter || !isAlike(letter, other)) continue;
          const gap = measureGap(letter, other);
          if (gap < bestGap) [best, bestGap] = [other, gap];
        }
      }
    }
    if (!best) continue;
    const dx = Math.abs(middleX(best) - middleX(letter));
    const dy = Math.abs(middleY(best) - middleY(letter));
    if (dx > dy * 1.7) beside++;
    else if (dy > dx * 1.7) stacked++;
  }
  return { beside, stacked };
}

/** Dots, commas and accents are no neighbours of a letter. */
function isAlike(a: InkPatch, b: InkPatch): boolean {
  const sizeA = Math.max(a.right - a.left, a.bottom - a.top);
  const sizeB = Math.max(b.right - b.left, b.bottom - b.top);
  return sizeA < sizeB * 2 && sizeB < sizeA * 2;
}

/** White between two boxes. */
function measureGap(a: InkPatch, b: InkPatch): number {
  const dx = Math.max(0, Math.max(a.left, b.left) - Math.min(a.right, b.right));
  const dy = Math.max(0, Math.max(a.top, b.top) - Math.min(a.bottom, b.bottom));
  return dx + dy;
}

function middleX(patch: InkPatch): number {
  return (patch.left + patch.right) / 2;
}

function middleY(patch: InkPatch): number {
  return (patch.top + patch.bottom) / 2;
}
