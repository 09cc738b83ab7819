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
  if (!best || !standsOut(plane, best)) return null;
  const refined = refineCorners(best, across, down);
  return refined.map(({ x, y }) => ({ x: x * factor, y: y * factor })) as Corners;
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
        // Capped, so that a long edge counts for more than a harsh one.
        if (value > 4) sums[x] = sums[x]! + Math.min(value, 14);
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
    if (kept.length >= 12) break;
  }
  return kept;
}

/**
 * Whether what lies around the corners is something else than paper: clearly darker, or a little darker
 * and free of print. A framed box on a printed page is neither.
 */
function standsOut(plane: Plane, corners: Corners): boolean {
  const { width, height, data } = plane;
  const inside: number[] = [];
  const outside: number[] = [];
  for (let y = 0; y < height; y += 2) {
    for (let x = 0; x < width; x += 2) {
      const depth = findDepth(corners, x, y);
      // The shadow that a sheet throws belongs to neither.
      if (depth >= 0) inside.push(data[y * width + x]!);
      else if (depth < -8) outside.push(data[y * width + x]!);
    }
  }
  inside.sort((a, b) => a - b);
  outside.sort((a, b) => a - b);
  const at = (sorted: number[], share: number) => sorted[Math.floor(sorted.length * share)] ?? 0;
  const ratio = at(outside, 0.8) / Math.max(1, at(inside, 0.8));
  if (ratio < 0.8) return true;
  if (ratio >= 0.96) return false;
  // Paper is even: most of it is about as light as its lightest part. Cloth and wood are not.
  if (at(outside, 0.5) < 0.88 * at(outside, 0.8)) return true;
  const dark = outside.filter((value) => value < at(outside, 0.5) - 30).length;
  return dark < outside.length * 0.004;
}

/** Distance in pixels from the nearest side, negative outside. */
function findDepth(corners: Corners, x: number, y: number): number {
  let depth = Infinity;
  corners.forEach((from, index) => {
    const to = corners[(index + 1) % 4]!;
    const cross = (to.x - from.x) * (y - from.y) - (to.y - from.y) * (x - from.x);
    depth = Math.min(depth, cross / distance(from, to));
  });
  return depth;
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
    sum += Math.min(side.step, 18) * side.cover;
  }
  const area = Math.abs(findArea(corners)) / (across.width * across.height);
  return sum * (0.3 + area);
}

/** Moves the ends of each side by up to five pixels to where the step is sharpest. */
function refineCorners(corners: Corners, across: Plane, down: Plane): Corners {
  const { width, height } = across;
  const [a, b, c, d] = corners;
  const top = refineSide(down, a, b, 1, 'y');
  const bottom = refineSide(down, d, c, -1, 'y');
  const left = refineSide(across, a, d, 1, 'x');
  const right = refineSide(across, b, c, -1, 'x');
  const refined: Corners = [
    meet(left, top),
    meet(right, top),
    meet(right, bottom),
    meet(left, bottom),
  ];
  return isPlausible(refined, width, height) ? refined : corners;
}

type Segment = [Point, Point];

function refineSide(steps: Plane, from: Point, to: Point, sign: 1 | -1, axis: 'x' | 'y'): Segment {
  const shift = (point: Point, by: number): Point =>
    axis === 'x' ? { x: point.x + by, y: point.y } : { x: point.x, y: point.y + by };
  let best: Segment = [from, to];
  let bestStep = -Infinity;
  for (let one = -5; one <= 5; one += 0.5) {
    for (let other = -5; other <= 5; other += 0.5) {
      const segment: Segment = [shift(from, one), shift(to, other)];
      const { step } = measureSide(steps, segment[0], segment[1], sign);
      if (step > bestStep) [best, bestStep] = [segment, step];
    }
  }
  return best;
}

/** Where two sides, made longer if need be, cross. */
function meet([a, b]: Segment, [c, d]: Segment): Point {
  const r = { x: b.x - a.x, y: b.y - a.y };
  const s = { x: d.x - c.x, y: d.y - c.y };
  const cross = r.x * s.y - r.y * s.x;
  const t = ((c.x - a.x) * s.y - (c.y - a.y) * s.x) / cross;
  return { x: a.x + t * r.x, y: a.y + t * r.y };
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
