import type { Grey } from './raster.ts';

/** A connected patch of ink: its bounding box in pixels (right and bottom excluded) and its area. */
export interface InkPatch {
  left: number;
  top: number;
  right: number;
  bottom: number;
  area: number;
}

/** All patches of pixels darker than `below`, joined over sides and corners. */
export function findInkPatches(grey: Grey, below: number): InkPatch[] {
  const { width, height, data } = grey;
  const parents: number[] = [];
  const patches: InkPatch[] = [];
  const findRoot = (index: number): number => {
    let at = index;
    while (parents[at] !== at) {
      parents[at] = parents[parents[at]!]!;
      at = parents[at]!;
    }
    return at;
  };
  let above: number[] = [];
  for (let y = 0; y < height; y++) {
    const runs: number[] = [];
    const row = y * width;
    let scan = 0;
    let x = 0;
    while (x < width) {
      if (data[row + x]! >= below) {
        x++;
        continue;
      }
      const start = x;
      while (x < width && data[row + x]! < below) x++;
      let label = -1;
      while (scan < above.length && above[scan + 1]! < start) scan += 3;
      for (let i = scan; i < above.length && above[i]! <= x; i += 3) {
        const root = findRoot(above[i + 2]!);
        if (label === -1) label = root;
        else if (root !== label) {
          parents[root] = label;
          mergePatch(patches[label]!, patches[root]!);
        }
      }
      if (label === -1) {
        label = parents.length;
        parents.push(label);
        patches.push({ left: start, top: y, right: x, bottom: y + 1, area: 0 });
      }
      const patch = patches[label]!;
      if (start < patch.left) patch.left = start;
      if (x > patch.right) patch.right = x;
      patch.bottom = y + 1;
      patch.area += x - start;
      runs.push(start, x, label);
    }
    above = runs;
  }
  return patches.filter((_, index) => parents[index] === index);
}

function mergePatch(into: InkPatch, from: InkPatch): void {
  into.left = Math.min(into.left, from.left);
  into.top = Math.min(into.top, from.top);
  into.right = Math.max(into.right, from.right);
  into.bottom = Math.max(into.bottom, from.bottom);
  into.area += from.area;
}
