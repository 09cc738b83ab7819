/** Pictures as raw bytes, row by row without padding, and the small sums every stage needs. */

/** One byte a pixel, 0 black to 255 white. */
export interface Grey {
  width: number;
  height: number;
  data: Uint8Array;
}

/** One (grey) or three (red, green, blue) bytes a pixel. */
export interface Pixels {
  width: number;
  height: number;
  channels: 1 | 3;
  data: Uint8Array;
}

/** The byte at an index that is known to be inside; outside counts as white. */
export function byteAt(data: Uint8Array, index: number): number {
  return data[index] ?? 255;
}

/** An empty (black) picture of the given size in pixels. */
export function createGrey(width: number, height: number): Grey {
  return { width, height, data: new Uint8Array(width * height) };
}

/** Luma of the picture (ITU-R BT.601 weights, rounded to 1/256); grey pictures are passed through. */
export function toGrey(pixels: Pixels): Grey {
  const { width, height, data } = pixels;
  if (pixels.channels === 1) return { width, height, data };
  const out = new Uint8Array(width * height);
  for (let i = 0, j = 0; i < out.length; i++, j += 3) {
    out[i] = (77 * data[j]! + 150 * data[j + 1]! + 29 * data[j + 2]!) >> 8;
  }
  return { width, height, data: out };
}

/** Shrinks by a whole factor, each output pixel the mean of its square. */
export function shrinkBy(grey: Grey, factor: number): Grey {
  if (factor <= 1) return grey;
  const width = Math.max(1, Math.floor(grey.width / factor));
  const height = Math.max(1, Math.floor(grey.height / factor));
  const out = new Uint8Array(width * height);
  const sums = new Uint32Array(width);
  const area = factor * factor;
  for (let y = 0; y < height; y++) {
    sums.fill(0);
    for (let dy = 0; dy < factor; dy++) {
      let at = (y * factor + dy) * grey.width;
      for (let x = 0; x < width; x++) {
        let sum = 0;
        for (let dx = 0; dx < factor; dx++) sum += grey.data[at++]!;
        sums[x] = sums[x]! + sum;
      }
    }
    const row = y * width;
    for (let x = 0; x < width; x++) out[row + x] = (sums[x]! / area + 0.5) | 0;
  }
  return { width, height, data: out };
}

/** Shrinks by the largest whole factor that leaves the long side at least `longSide` pixels. */
export function shrinkTo(grey: Grey, longSide: number): Grey {
  return shrinkBy(grey, Math.floor(Math.max(grey.width, grey.height) / longSide));
}

/** Turns clockwise by a quarter, a half or three quarters. */
export function turnGrey(grey: Grey, degrees: 0 | 90 | 180 | 270): Grey {
  const { width: w, height: h, data } = grey;
  if (degrees === 0) return grey;
  const out = new Uint8Array(w * h);
  if (degrees === 180) {
    for (let i = 0, j = w * h - 1; j >= 0; i++, j--) out[i] = data[j]!;
    return { width: w, height: h, data: out };
  }
  for (let y = 0; y < h; y++) {
    const row = y * w;
    for (let x = 0; x < w; x++) {
      const to = degrees === 90 ? x * h + (h - 1 - y) : (w - 1 - x) * h + y;
      out[to] = data[row + x]!;
    }
  }
  return { width: h, height: w, data: out };
}

/** Counts of each grey value, looking at every `step`-th pixel. */
export function countGreys(data: Uint8Array, step = 1): Uint32Array {
  const counts = new Uint32Array(256);
  for (let i = 0; i < data.length; i += step) counts[data[i]!] = counts[data[i]!]! + 1;
  return counts;
}

/** The grey value below which the given share (0 to 1) of counted pixels lies. */
export function findPercentile(counts: Uint32Array, share: number): number {
  let total = 0;
  for (const count of counts) total += count;
  const wanted = total * share;
  let seen = 0;
  for (let value = 0; value < 256; value++) {
    seen += counts[value]!;
    if (seen >= wanted) return value;
  }
  return 255;
}
