import type { Grey } from './raster.ts';

/** Scanners give paper and lid almost white; a table, a shadow or a grey glass edge is darker. */
const WHITE_FROM = 236;
const SAMPLES = 400;

/**
 * Whether the picture is white all along its edge, as a feeder or a closed lid leaves it: then there is no
 * sheet to look for. A few dark places (holes, a fold, a stamp over the edge) do not count.
 */
export function isWhiteToTheEdge({ width, height, data }: Grey): boolean {
  const inset = Math.round(Math.min(width, height) * 0.01);
  let dark = 0;
  for (let i = 0; i < SAMPLES; i++) {
    const x = Math.floor((i / SAMPLES) * width);
    const y = Math.floor((i / SAMPLES) * height);
    const around = [
      data[inset * width + x],
      data[(height - 1 - inset) * width + x],
      data[y * width + inset],
      data[y * width + width - 1 - inset],
    ];
    for (const value of around) if ((value ?? 0) < WHITE_FROM) dark++;
  }
  return dark <= SAMPLES * 4 * 0.05;
}
