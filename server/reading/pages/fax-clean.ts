import { findInkPatches } from './components.ts';
import type { Grey } from './raster.ts';

/**
 * Cleans a black-and-white picture: specks and crumbs of dotted rules go, and edges are softened, since
 * the engine reads soft letters better than ragged ones. A speck is at most `speck` pixels of ink.
 */
export function cleanFax(grey: Grey, speck = 4): Grey {
  const { width, height } = grey;
  const data = new Uint8Array(grey.data);
  for (const patch of findInkPatches(grey, 128)) {
    const isCrumb = patch.area <= speck || (patch.bottom - patch.top === 1 && patch.area <= 24);
    if (!isCrumb) continue;
    for (let y = patch.top; y < patch.bottom; y++) {
      data.fill(255, y * width + patch.left, y * width + patch.right);
    }
  }
  return soften({ width, height, data });
}

/** Weights 1 2 1 down and across. */
function soften(grey: Grey): Grey {
  const { width, height, data } = grey;
  const across = new Uint16Array(width * height);
  for (let y = 0; y < height; y++) {
    const row = y * width;
    for (let x = 0; x < width; x++) {
      const left = data[row + (x > 0 ? x - 1 : 0)]!;
      const right = data[row + (x < width - 1 ? x + 1 : x)]!;
      across[row + x] = left + 2 * data[row + x]! + right;
    }
  }
  const out = new Uint8Array(width * height);
  for (let y = 0; y < height; y++) {
    const row = y * width;
    const above = y > 0 ? row - width : row;
    const below = y < height - 1 ? row + width : row;
    for (let x = 0; x < width; x++) {
      out[row + x] = (across[above + x]! + 2 * across[row + x]! + across[below + x]! + 8) >> 4;
    }
  }
  return { width, height, data: out };
}
