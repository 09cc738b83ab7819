/** Finding the sheet in a photograph: four long straight edges where something lighter begins. */
import type { Pixels } from './raster.ts';
import type { Point } from './warp.ts';

/** Corners clockwise from the top left, in pixels of the picture. */
export type Corners = [Point, Point, Point, Point];

const WORKING_SIDE = 420;
/** Mean step in grey values along a side, and share of the side that shows one, to believe in an edge. */
const MIN_STEP = 9;
const MIN_COVER = 0.7;

interface Plane {
  width: number;
  height: number;
  data: Float32Array;
}

/** A nearly vertical line x = at + slope * (y - height / 2), or the same with x and y exchanged. */
interface Line {
  at: number;
  slope: number;
  score: number;
}

/**
 * The corners of a light sheet that lies on something else, or null where the picture is all sheet
 * (a scan) or no four edges are clear enough.
 */
export function findSheet(pixels: Pixels): Corners | null {
  const { plane, factor } = shrinkToPlane(pixels);
  const across = measureSteps(plane, 'x');
  const down = measureSteps(plane, 'y');
  const left = findLines(across, 1);
  const right = findLines(across, -1);
  const transposed = transpose(down);
  const top = findLines(transposed, 1);
  const bottom = findLines(transposed, -1);
  const best = chooseSides(plane, across, down, { left, right, top, bottom });
  if (!best) return null;
  return best.map(({ x, y }) => ({ x: x * factor, y: y * factor })) as Corners;
}

function shrinkToPlane(pixels: Pixels): { plane: Plane; factor: number } {
  const { width: w, height: h, channels, data } = pixels;
  const factor = Math.max(1, Math.round(Math.max(w, h) / WORKING_SIDE));
  const width = Math.floor(w / factor);
  const height = Math.floor(h / factor);
  const out = new Float32Array(width * height);
  const step = Math.max(1, Math.floor(factor / 4));
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      let sum = 0;
      let count = 0;
      for (let dy = 0; dy < factor; dy += step) {
        for (let dx = 0; dx < factor; dx += step) {
          const at = ((y * factor + dy) * w + x * factor + dx) * channels;
          sum += channels === 1 ? data[at]! : (data[at]! + 2 * data[at + 1]! + data[at + 2]!) / 4;
          count++;
        }
      }
      out[y * width + x] = sum / count;
    }
  }
  return { plane: { width, height, data: out }, factor };
}

/** Signed step at each place: mean of the four pixels after it less the mean of the four before it. */
function measureSteps(plane: Plane, axis: 'x' | 'y'): Plane {
  const { width, height, data } = plane;
  const out = new Float32Array(width * height);
  const stride = axis === 'x' ? 1 : width;
  const length = axis === 'x' ? width : height;
  const reach = 4;
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const along = axis === 'x' ? x : y;
      if (along < reach || along >= length - reach) continue;
      const at = y * width + x;
      let before = 0;
      let after = 0;
      for (let k = 1; k <= reach; k++) {
        before += data[at - k * stride]!;
        after += data[at + (k - 1) * stride]!;
      }
      const step = (after - before) / reach;
      out[at] = Math.max(-40, Math.min(40, step));
    }
  }
  return { width, height, data: out };
}

function transpose(plane: Plane): Plane {
  const { width, height, data } = plane;
  const out = new Float32Array(width * height);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) out[x * height + y] = data[y * width + x]!;
  }
  return { width: height, height: width, data: out };
}

/** The strongest nearly vertical lines whose steps have the given sign, no two alike. */
function findLines(steps: Plane, sign: 1 | -1): Line[] {
  const { width, height, data } = steps;
  const found: Line[] = [];
  const slopes: number[] = [];
  for (let s = -0.34; s <= 0.3401; s += 0.01) slopes.push(s);
  const sums = new Float32Array(width);
  for (const slope of slopes) {
    sums.fill(0);
    for (let y = 0; y < height; y += 2) {
      const shift = slope * (y - height / 2);
      const row = y * width;
      const whole = Math.round(shift);
      for (let x = 0; x < width; x++) {
        const at = x + whole;
        if (at < 0 || at >= width) continue;
        const value = data[row + at]! * sign;
        if (value > 4) sums[x] = sums[x]! + value;
      }
    }
    for (let x = 1; x < width - 1; x++) {
      const score = sums[x]!;
      if (score < sums[x - 1]! || score < sums[x + 1]!) continue;
      found.push({ at: x, slope, score: score / (height / 2) });
    }
  }
  found.sort((a, b) => b.score - a.score);
  const kept: Line[] = [];
  for (const line of found) {
    const alike = kept.some(
      (other) =>
        Math.abs(other.at - line.at) < 5 && Math.abs(other.slope - line.slope) * height < 10,
    );
    if (!alike) kept.push(line);
    if (kept.length >= 9) break;
  }
  return kept;
}

interface Sides {
  left: Line[];
  right: Line[];
  top: Line[];
  bottom: Line[];
}

function chooseSides(plane: Plane, across: Plane, down: Plane, sides: Sides): Corners | null {
  const { width, height } = plane;
  let best: Corners | null = null;
  let bestScore = 0;
  for (const left of sides.left) {
    for (const right of sides.right) {
      if (right.at - left.at < width * 0.2) continue;
      for (const top of sides.top) {
        for (const bottom of sides.bottom) {
          if (bottom.at - top.at < height * 0.2) continue;
          const corners: Corners = [
            crossLines(left, top, width, height),
            crossLines(right, top, width, height),
            crossLines(right, bottom, width, height),
            crossLines(left, bottom, width, height),
          ];
          if (!isPlausible(corners, width, height)) continue;
          const score = scoreCorners(corners, across, down);
          if (score > bestScore) [best, bestScore] = [corners, score];
        }
      }
    }
  }
  return best;
}

/** Where x = a + s (y - h/2) meets y = b + t (x - w/2). */
function crossLines(upright: Line, level: Line, width: number, height: number): Point {
  const { at: a, slope: s } = upright;
  const { at: b, slope: t } = level;
  const x = (a + s * (b - (t * width) / 2 - height / 2)) / (1 - s * t);
  return { x, y: b + t * (x - width / 2) };
}

function isPlausible(corners: Corners, width: number, height: number): boolean {
  const slack = 0.03;
  for (const { x, y } of corners) {
    if (x < -slack * width || x > (1 + slack) * width) return false;
    if (y < -slack * height || y > (1 + slack) * height) return false;
  }
  const area = Math.abs(findArea(corners));
  if (area < 0.12 * width * height) return false;
  const [a, b, c, d] = corners;
  const ratio = (one: number, other: number) => Math.max(one, other) / Math.min(one, other);
  return ratio(distance(a, b), distance(d, c)) < 1.5 && ratio(distance(a, d), distance(b, c)) < 1.5;
}

function findArea(corners: Corners): number {
  let sum = 0;
  corners.forEach((point, index) => {
    const next = corners[(index + 1) % 4]!;
    sum += point.x * next.y - next.x * point.y;
  });
  return sum / 2;
}

function distance(a: Point, b: Point): number {
  return Math.hypot(a.x - b.x, a.y - b.y);
}

/** 0 unless all four sides hold; else the mean step along the sides, larger sheets a little ahead. */
function scoreCorners(corners: Corners, across: Plane, down: Plane): number {
  const [a, b, c, d] = corners;
  const sides = [
    measureSide(down, a, b, 1),
    measureSide(across, b, c, -1),
    measureSide(down, d, c, -1),
    measureSide(across, a, d, 1),
  ];
  let sum = 0;
  for (const side of sides) {
    if (side.step < MIN_STEP || side.cover < MIN_COVER) return 0;
    sum += Math.min(side.step, 30) * side.cover;
  }
  const area = Math.abs(findArea(corners)) / (across.width * across.height);
  return sum * (0.6 + area);
}

function measureSide(
  steps: Plane,
  from: Point,
  to: Point,
  sign: 1 | -1,
): { step: number; cover: number } {
  const count = Math.max(20, Math.round(distance(from, to)));
  let sum = 0;
  let covered = 0;
  let seen = 0;
  for (let i = 1; i < count; i++) {
    const x = Math.round(from.x + ((to.x - from.x) * i) / count);
    const y = Math.round(from.y + ((to.y - from.y) * i) / count);
    if (x < 0 || y < 0 || x >= steps.width || y >= steps.height) continue;
    seen++;
    const value = steps.data[y * steps.width + x]! * sign;
    sum += value;
    if (value > 5) covered++;
  }
  if (seen < count * 0.8) return { step: 0, cover: 0 };
  return { step: sum / seen, cover: covered / seen };
}
