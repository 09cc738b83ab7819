/** Plane maps between the picture as taken and the upright page, and sampling through them. */
import type { Grey, Pixels } from './raster.ts';

/** Homography, row-major 3 × 3, that takes output pixel centres to source pixels. */
export type PlaneMap = readonly [
  number,
  number,
  number,
  number,
  number,
  number,
  number,
  number,
  number,
];

export interface Point {
  x: number;
  y: number;
}

export const identityMap: PlaneMap = [1, 0, 0, 0, 1, 0, 0, 0, 1];

/** First `inner`, then `outer`. */
export function composeMaps(outer: PlaneMap, inner: PlaneMap): PlaneMap {
  const out: number[] = [];
  for (let row = 0; row < 3; row++) {
    for (let column = 0; column < 3; column++) {
      let sum = 0;
      for (let k = 0; k < 3; k++) sum += outer[row * 3 + k]! * inner[k * 3 + column]!;
      out.push(sum);
    }
  }
  return out as unknown as PlaneMap;
}

/** Where the map takes a point. */
export function mapPoint(map: PlaneMap, point: Point): Point {
  const w = map[6] * point.x + map[7] * point.y + map[8];
  return {
    x: (map[0] * point.x + map[1] * point.y + map[2]) / w,
    y: (map[3] * point.x + map[4] * point.y + map[5]) / w,
  };
}

/** Output (x, y) → source (x / scale + dx, y / scale + dy). */
export function scaleAndShift(scale: number, dx: number, dy: number): PlaneMap {
  return [1 / scale, 0, dx, 0, 1 / scale, dy, 0, 0, 1];
}

/** Takes an upright picture of `width` × `height` to the one that lies turned clockwise by `degrees` against it. */
export function undoTurn(
  degrees: 0 | 90 | 180 | 270,
  sourceWidth: number,
  sourceHeight: number,
): PlaneMap {
  // `degrees` is how far the source must be turned clockwise to stand upright.
  if (degrees === 90) return [0, 1, 0, -1, 0, sourceHeight, 0, 0, 1];
  if (degrees === 180) return [-1, 0, sourceWidth, 0, -1, sourceHeight, 0, 0, 1];
  if (degrees === 270) return [0, -1, sourceWidth, 1, 0, 0, 0, 0, 1];
  return identityMap;
}

/** Takes the straightened picture to one whose lines fall by `degrees` to the right, about its centre. */
export function undoSkew(degrees: number, width: number, height: number): PlaneMap {
  const angle = (degrees * Math.PI) / 180;
  const cos = Math.cos(angle);
  const sin = Math.sin(angle);
  const cx = width / 2;
  const cy = height / 2;
  return [cos, -sin, cx - cos * cx + sin * cy, sin, cos, cy - sin * cx - cos * cy, 0, 0, 1];
}

/** The map that takes the rectangle 0..width × 0..height to four corners (clockwise from top left). */
export function mapToCorners(
  corners: readonly [Point, Point, Point, Point],
  width: number,
  height: number,
): PlaneMap {
  const [p0, p1, p2, p3] = corners;
  const dx1 = p1.x - p2.x;
  const dx2 = p3.x - p2.x;
  const dx3 = p0.x - p1.x + p2.x - p3.x;
  const dy1 = p1.y - p2.y;
  const dy2 = p3.y - p2.y;
  const dy3 = p0.y - p1.y + p2.y - p3.y;
  const det = dx1 * dy2 - dx2 * dy1;
  const g = (dx3 * dy2 - dx2 * dy3) / det;
  const h = (dx1 * dy3 - dx3 * dy1) / det;
  return [
    (p1.x - p0.x + g * p1.x) / width,
    (p3.x - p0.x + h * p3.x) / height,
    p0.x,
    (p1.y - p0.y + g * p1.y) / width,
    (p3.y - p0.y + h * p3.y) / height,
    p0.y,
    g / width,
    h / height,
    1,
  ];
}

/**
 * Samples the source through the map into a picture of the given size, bilinear; outside the source
 * it is white. Where the map shrinks by more than 1.6 a small grid is averaged, so thin strokes survive.
 */
export function sampleGrey(source: Grey, map: PlaneMap, width: number, height: number): Grey {
  const out = samplePixels({ ...source, channels: 1 }, map, width, height);
  return { width: out.width, height: out.height, data: out.data };
}

/** As `sampleGrey`, for grey or colour. */
export function samplePixels(source: Pixels, map: PlaneMap, width: number, height: number): Pixels {
  const { channels } = source;
  const grid = chooseGrid(map, width, height);
  const data = new Uint8Array(width * height * channels);
  if (grid === 1) {
    sampleOnce(source, map, width, height, data);
    return { width, height, channels, data };
  }
  const sums = new Uint16Array(width * height * channels);
  const pass = new Uint8Array(width * height * channels);
  for (let gy = 0; gy < grid; gy++) {
    for (let gx = 0; gx < grid; gx++) {
      const shift: PlaneMap = [
        1,
        0,
        (gx + 0.5) / grid - 0.5,
        0,
        1,
        (gy + 0.5) / grid - 0.5,
        0,
        0,
        1,
      ];
      sampleOnce(source, composeMaps(map, shift), width, height, pass);
      for (let i = 0; i < sums.length; i++) sums[i] = sums[i]! + pass[i]!;
    }
  }
  const count = grid * grid;
  for (let i = 0; i < sums.length; i++) data[i] = (sums[i]! / count + 0.5) | 0;
  return { width, height, channels, data };
}

function chooseGrid(map: PlaneMap, width: number, height: number): number {
  const a = mapPoint(map, { x: width / 2, y: height / 2 });
  const b = mapPoint(map, { x: width / 2 + 1, y: height / 2 });
  const c = mapPoint(map, { x: width / 2, y: height / 2 + 1 });
  const step = Math.max(Math.hypot(b.x - a.x, b.y - a.y), Math.hypot(c.x - a.x, c.y - a.y));
  return step <= 1.6 ? 1 : step <= 2.6 ? 2 : step <= 4 ? 3 : 4;
}

function sampleOnce(
  source: Pixels,
  map: PlaneMap,
  width: number,
  height: number,
  out: Uint8Array,
): void {
  const { width: sw, height: sh, data, channels } = source;
  if (channels === 1) {
    sampleGreyOnce(source, map, width, height, out);
    return;
  }
  const stride = sw * channels;
  const affine = Math.abs(map[6]) < 1e-12 && Math.abs(map[7]) < 1e-12;
  let to = 0;
  for (let y = 0; y < height; y++) {
    const py = y + 0.5;
    let nx = map[0] * 0.5 + map[1] * py + map[2];
    let ny = map[3] * 0.5 + map[4] * py + map[5];
    let nw = map[6] * 0.5 + map[7] * py + map[8];
    for (let x = 0; x < width; x++) {
      const fx = (affine ? nx / map[8] : nx / nw) - 0.5;
      const fy = (affine ? ny / map[8] : ny / nw) - 0.5;
      nx += map[0];
      ny += map[3];
      nw += map[6];
      const x0 = Math.floor(fx);
      const y0 = Math.floor(fy);
      if (x0 < -1 || y0 < -1 || x0 >= sw || y0 >= sh) {
        for (let c = 0; c < channels; c++) out[to++] = 255;
        continue;
      }
      const xa = x0 < 0 ? 0 : x0;
      const xb = x0 + 1 >= sw ? sw - 1 : x0 + 1;
      const ya = y0 < 0 ? 0 : y0;
      const yb = y0 + 1 >= sh ? sh - 1 : y0 + 1;
      const tx = fx - x0;
      const ty = fy - y0;
      const topLeft = ya * stride + xa * channels;
      const topRight = ya * stride + xb * channels;
      const lowLeft = yb * stride + xa * channels;
      const lowRight = yb * stride + xb * channels;
      for (let c = 0; c < channels; c++) {
        const top = data[topLeft + c]! * (1 - tx) + data[topRight + c]! * tx;
        const low = data[lowLeft + c]! * (1 - tx) + data[lowRight + c]! * tx;
        out[to++] = top * (1 - ty) + low * ty + 0.5;
      }
    }
  }
}

/** The same for one channel, without an inner loop: most of the time of a page's preparation goes here. */
function sampleGreyOnce(
  source: Pixels,
  map: PlaneMap,
  width: number,
  height: number,
  out: Uint8Array,
): void {
  const { width: sw, height: sh, data } = source;
  const affine = Math.abs(map[6]) < 1e-12 && Math.abs(map[7]) < 1e-12;
  const xLast = sw - 1;
  const yLast = sh - 1;
  let to = 0;
  for (let y = 0; y < height; y++) {
    const py = y + 0.5;
    let nx = map[0] * 0.5 + map[1] * py + map[2];
    let ny = map[3] * 0.5 + map[4] * py + map[5];
    let nw = map[6] * 0.5 + map[7] * py + map[8];
    for (let x = 0; x < width; x++, to++) {
      const inverse = affine ? 1 : 1 / nw;
      const fx = nx * inverse - 0.5;
      const fy = ny * inverse - 0.5;
      nx += map[0];
      ny += map[3];
      nw += map[6];
      if (fx >= 0 && fy >= 0 && fx < xLast && fy < yLast) {
        const x0 = fx | 0;
        const y0 = fy | 0;
        const tx = fx - x0;
        const at = y0 * sw + x0;
        const a = data[at]!;
        const c = data[at + sw]!;
        const top = a + (data[at + 1]! - a) * tx;
        const low = c + (data[at + sw + 1]! - c) * tx;
        out[to] = top + (low - top) * (fy - y0) + 0.5;
      } else if (fx < -1 || fy < -1 || fx > sw || fy > sh) {
        out[to] = 255;
      } else {
        const xEdge = Math.min(xLast, Math.max(0, Math.round(fx)));
        const yEdge = Math.min(yLast, Math.max(0, Math.round(fy)));
        out[to] = data[yEdge * sw + xEdge]!;
      }
    }
  }
}
