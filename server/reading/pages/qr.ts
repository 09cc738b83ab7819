import jsQR from 'jsqr';
import type { Grey } from './raster.ts';
import { shrinkTo } from './raster.ts';

/** The text of a QR code on the page, or null. Looks at a small copy: about 0.05 s. */
export function findCode(flat: Grey): string | null {
  const small = shrinkTo(flat, 800);
  if (!hasFinderPattern(small)) return null;
  const rgba = new Uint8ClampedArray(small.width * small.height * 4);
  for (let i = 0, to = 0; i < small.data.length; i++, to += 4) {
    const value = small.data[i]!;
    rgba[to] = value;
    rgba[to + 1] = value;
    rgba[to + 2] = value;
    rgba[to + 3] = 255;
  }
  const found = jsQR(rgba, small.width, small.height, { inversionAttempts: 'dontInvert' });
  return found && found.data.trim() !== '' ? found.data.trim() : null;
}

/**
 * Whether the corner squares of a QR code (ISO/IEC 18004: dark and light runs as 1:1:3:1:1, across and
 * down) stand on the page, so that a full search is worth its time. Print hardly shows them both ways.
 */
function hasFinderPattern(grey: Grey): boolean {
  const { width, height, data } = grey;
  const runs = new Int32Array(5);
  let hits = 0;
  for (let y = 0; y < height; y += 2) {
    const row = y * width;
    let length = 0;
    let dark = false;
    let seen = 0;
    for (let x = 0; x <= width; x++) {
      const isDark = x < width && data[row + x]! < 128;
      if (isDark === dark && x < width) {
        length++;
        continue;
      }
      runs.copyWithin(0, 1);
      runs[4] = length;
      seen++;
      // A dark run just ended: five runs may be dark, light, dark, light, dark.
      if (dark && seen >= 5 && isFinder(runs)) {
        const centre = x - runs[4] - runs[3]! - (runs[2]! >> 1) - 1;
        if (crossesDown(grey, centre, y, runs[2]! / 3) && ++hits >= 4) return true;
      }
      dark = isDark;
      length = 1;
    }
  }
  return false;
}

function isFinder(runs: Int32Array): boolean {
  const unit = (runs[0]! + runs[1]! + runs[2]! + runs[3]! + runs[4]!) / 7;
  if (unit < 1.6) return false;
  const most = unit * 0.8;
  for (let i = 0; i < 5; i++) {
    if (Math.abs(runs[i]! - (i === 2 ? 3 : 1) * unit) >= most) return false;
  }
  return true;
}

/** The same runs from the centre up and down: half the inner square, a light ring, a dark ring. */
function crossesDown(grey: Grey, x: number, y: number, unit: number): boolean {
  const { width, height, data } = grey;
  let inner = 0;
  for (const step of [-1, 1]) {
    let at = y;
    const count = (dark: boolean, most: number): number => {
      let length = 0;
      while (at >= 0 && at < height && length <= most && data[at * width + x]! < 128 === dark) {
        length++;
        at += step;
      }
      return length;
    };
    inner += count(true, unit * 4);
    const light = count(false, unit * 2.2);
    const ring = count(true, unit * 2.2);
    if (light < unit * 0.4 || ring < unit * 0.4) return false;
  }
  return Math.abs(inner - 1 - 3 * unit) < unit * 1.6;
}
