import type { Grey } from './raster.ts';
import { shrinkTo } from './raster.ts';

const INK_BELOW = 140;

/** Places of ink, thinned so that large dark areas (photographs, panels) do not outvote print. */
interface Ink {
  xs: Int16Array;
  ys: Int16Array;
  count: number;
}

/**
 * The angle in degrees by which lines of print fall to the right (positive: clockwise), found by
 * projecting ink along trial directions: the direction with the sharpest rows wins. 0 where there is
 * hardly any ink. Expects evened-out light.
 */
export function findSkew(flat: Grey, maxDegrees = 6): number {
  const small = shrinkTo(flat, 1100);
  const ink = collectInk(small);
  if (ink.count < 150) return 0;
  let best = 0;
  let bestScore = -1;
  let step = 0.5;
  for (let angle = -maxDegrees; angle <= maxDegrees + 1e-9; angle += step) {
    const score = scoreAngle(ink, small, angle);
    if (score > bestScore) [best, bestScore] = [angle, score];
  }
  while (step > 0.03) {
    step /= 2;
    for (const angle of [best - step, best + step]) {
      const score = scoreAngle(ink, small, angle);
      if (score > bestScore) [best, bestScore] = [angle, score];
    }
  }
  return Math.abs(best) < 0.04 ? 0 : best;
}

function collectInk(grey: Grey): Ink {
  const { width, height, data } = grey;
  const xs = new Int16Array(width * height);
  const ys = new Int16Array(width * height);
  let count = 0;
  const border = Math.round(Math.min(width, height) * 0.015);
  for (let y = border + 1; y < height - border; y++) {
    for (let x = border; x < width - border; x++) {
      const at = y * width + x;
      // Only where ink begins below something lighter: top edges of letters, once each.
      if (data[at]! < INK_BELOW && data[at - width]! >= INK_BELOW) {
        xs[count] = x;
        ys[count] = y;
        count++;
      }
    }
  }
  return { xs, ys, count };
}

function scoreAngle(ink: Ink, size: Grey, angle: number): number {
  const slope = Math.tan((angle * Math.PI) / 180);
  const margin = Math.ceil(Math.abs(slope) * size.width) + 2;
  const rows = new Float64Array(size.height + 2 * margin);
  for (let i = 0; i < ink.count; i++) {
    const row = ink.ys[i]! - ink.xs[i]! * slope + margin;
    const whole = Math.floor(row);
    const part = row - whole;
    rows[whole] = rows[whole]! + 1 - part;
    rows[whole + 1] = rows[whole + 1]! + part;
  }
  let score = 0;
  for (const value of rows) score += value * value;
  return score;
}
