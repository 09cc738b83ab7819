import type { Grey } from './raster.ts';
import { countGreys, findPercentile } from './raster.ts';

/**
 * Evens out light and shadow: every pixel is divided by the brightness of the paper around it, then ink
 * is stretched towards black. The paper's brightness is the 85th percentile of a block about 1/48 of the
 * short side, smoothed over its neighbours. Blocks far darker than the page (a printed dark panel, a
 * photograph) keep a floor, so that white print on them stays visible.
 */
export function flattenLight(grey: Grey): Grey {
  const { width, height, data } = grey;
  const block = Math.max(16, Math.round(Math.min(width, height) / 48));
  const columns = Math.ceil(width / block);
  const rows = Math.ceil(height / block);
  const pageLevel = Math.max(32, findPercentile(countGreys(data, 7), 0.8));
  const floor = pageLevel * 0.38;

  const levels = new Float32Array(columns * rows);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      levels[row * columns + column] = Math.max(floor, measureBlock(grey, column, row, block));
    }
  }
  const smooth = smoothLevels(bridgeDarkBlocks(levels, columns, rows), columns, rows);

  const out = new Uint8Array(width * height);
  const gains = new Float32Array(width);
  for (let y = 0; y < height; y++) {
    fillGains(gains, smooth, columns, rows, block, y);
    const at = y * width;
    for (let x = 0; x < width; x++) {
      const value = data[at + x]! * gains[x]!;
      out[at + x] = value > 255 ? 255 : value;
    }
  }
  return stretchInk({ width, height, data: out });
}

function measureBlock(grey: Grey, column: number, row: number, block: number): number {
  const counts = new Uint16Array(256);
  const xEnd = Math.min(grey.width, (column + 1) * block);
  const yEnd = Math.min(grey.height, (row + 1) * block);
  const step = block > 40 ? 3 : 2;
  let total = 0;
  for (let y = row * block; y < yEnd; y += step) {
    for (let x = column * block; x < xEnd; x += step) {
      const value = grey.data[y * grey.width + x]!;
      counts[value] = counts[value]! + 1;
      total++;
    }
  }
  let left = total * 0.15;
  for (let value = 255; value >= 0; value--) {
    left -= counts[value]!;
    if (left <= 0) return value;
  }
  return 0;
}

/** A block much darker than those around it is thick ink, not shadow: give it its neighbours' level. */
function bridgeDarkBlocks(levels: Float32Array, columns: number, rows: number): Float32Array {
  const out = new Float32Array(levels);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const around: number[] = [];
      for (let dy = -1; dy <= 1; dy++) {
        for (let dx = -1; dx <= 1; dx++) {
          const y = row + dy;
          const x = column + dx;
          if (y >= 0 && y < rows && x >= 0 && x < columns) around.push(levels[y * columns + x]!);
        }
      }
      around.sort((a, b) => a - b);
      const typical = around[around.length >> 1]!;
      const own = levels[row * columns + column]!;
      if (own < typical * 0.8) out[row * columns + column] = typical;
    }
  }
  return out;
}

function smoothLevels(levels: Float32Array, columns: number, rows: number): Float32Array {
  const out = new Float32Array(levels.length);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      let sum = 0;
      let weight = 0;
      for (let dy = -1; dy <= 1; dy++) {
        for (let dx = -1; dx <= 1; dx++) {
          const y = row + dy;
          const x = column + dx;
          if (y < 0 || y >= rows || x < 0 || x >= columns) continue;
          const w = (2 - Math.abs(dx)) * (2 - Math.abs(dy));
          sum += w * levels[y * columns + x]!;
          weight += w;
        }
      }
      out[row * columns + column] = sum / weight;
    }
  }
  return out;
}

/** The factor for each pixel of row `y`, interpolated between block centres. */
function fillGains(
  gains: Float32Array,
  levels: Float32Array,
  columns: number,
  rows: number,
  block: number,
  y: number,
): void {
  const fy = Math.min(rows - 1, Math.max(0, (y + 0.5) / block - 0.5));
  const row = Math.min(rows - 1, Math.floor(fy));
  const next = Math.min(rows - 1, row + 1);
  const ty = fy - row;
  const line = new Float32Array(columns);
  for (let c = 0; c < columns; c++) {
    line[c] = levels[row * columns + c]! * (1 - ty) + levels[next * columns + c]! * ty;
  }
  for (let x = 0; x < gains.length; x++) {
    const fx = Math.min(columns - 1, Math.max(0, (x + 0.5) / block - 0.5));
    const c = Math.min(columns - 1, Math.floor(fx));
    const t = fx - c;
    const level = line[c]! * (1 - t) + line[Math.min(columns - 1, c + 1)]! * t;
    gains[x] = 250 / level;
  }
}

/** Darkens faded ink: the darkest thousandth of the page becomes near black, paper noise white. */
function stretchInk(grey: Grey): Grey {
  const dark = Math.min(170, findPercentile(countGreys(grey.data, 3), 0.004));
  const low = Math.max(0, dark - 12);
  const high = 244;
  const table = new Uint8Array(256);
  for (let v = 0; v < 256; v++) {
    table[v] = Math.max(0, Math.min(255, Math.round(((v - low) * 255) / (high - low))));
  }
  const { data } = grey;
  for (let i = 0; i < data.length; i++) data[i] = table[data[i]!]!;
  return grey;
}
