/** Whether a page lies on its side or stands on its head, told from the shape of its print. */
import type { Grey } from './raster.ts';
import { shrinkTo } from './raster.ts';

/**
 * True when lines of print run up and down. Compares, in strips, how sharply ink changes from row to
 * row with how sharply it changes from column to column: lines of print make rows alternate.
 */
export function liesOnSide(flat: Grey): boolean {
  const small = shrinkTo(flat, 1000);
  return measureAlternation(small, 'columns') > measureAlternation(small, 'rows') * 1.15;
}

/** Energy of the change of ink along one axis, from profiles over strips of the other. */
function measureAlternation(grey: Grey, axis: 'rows' | 'columns'): number {
  const { width, height, data } = grey;
  const [length, breadth] = axis === 'rows' ? [height, width] : [width, height];
  const margin = 0.03;
  const first = Math.round(breadth * margin);
  const last = Math.round(breadth * (1 - margin));
  const strip = Math.max(24, Math.round(breadth / 14));
  let energy = 0;
  for (let start = first; start + strip <= last; start += strip) {
    let before = -1;
    for (let i = Math.round(length * margin); i < length * (1 - margin); i++) {
      let ink = 0;
      for (let j = start; j < start + strip; j++) {
        const value = axis === 'rows' ? data[i * width + j]! : data[j * width + i]!;
        if (value < 140) ink++;
      }
      // Ruled lines and photographs fill a strip; capped, they do not outvote print.
      ink = Math.min(ink, strip * 0.6);
      if (before >= 0) energy += (ink - before) ** 2;
      before = ink;
    }
  }
  return energy / (length * breadth);
}
