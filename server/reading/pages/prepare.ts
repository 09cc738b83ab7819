/** From a page as it lies in the file to an evened-out, upright page and the maps between the two. */
import { flattenLight } from './flatten.ts';
import { liesOnSide } from './orientation.ts';
import { measurePage, type PageShape } from './page-shape.ts';
import { countGreys, toGrey, type Grey, type Pixels } from './raster.ts';
import { findSheet, type Corners } from './sheet.ts';
import { findSkew } from './skew.ts';
import {
  composeMaps,
  identityMap,
  mapToCorners,
  sampleGrey,
  scaleAndShift,
  undoSkew,
  undoTurn,
  type PlaneMap,
  type Point,
} from './warp.ts';

export type QuarterTurn = 0 | 90 | 180 | 270;

/** A page made ready for reading. Sizes are those of the upright page in source pixels. */
export interface PreparedPage {
  source: Pixels;
  /** Evened-out page before turning and straightening, in the flat frame. */
  flat: Grey;
  /** Flat frame to source: undoes a photograph's perspective. */
  toSource: PlaneMap;
  turned: QuarterTurn;
  skew: number;
  width: number;
  height: number;
  shape: PageShape;
  photographed: boolean;
}

/** Straightens, evens out and measures one page. */
export function preparePage(source: Pixels): PreparedPage {
  const corners = isTwoTone(source) ? null : findSheet(source);
  const { rectified, toSource } = corners
    ? rectify(source, corners)
    : { rectified: toGrey(source), toSource: identityMap };
  const flat = isTwoTone(source) ? rectified : flattenLight(rectified);
  const turned: QuarterTurn = liesOnSide(flat) ? 90 : 0;
  return finishPreparation({ source, flat, toSource, turned, photographed: corners !== null });
}

/** The same page turned half round. */
export function turnOver(page: PreparedPage): PreparedPage {
  const turned = ((page.turned + 180) % 360) as QuarterTurn;
  return finishPreparation({ ...page, turned });
}

function finishPreparation(page: {
  source: Pixels;
  flat: Grey;
  toSource: PlaneMap;
  turned: QuarterTurn;
  photographed: boolean;
}): PreparedPage {
  const { flat, turned } = page;
  const swapped = turned === 90 || turned === 270;
  const width = swapped ? flat.height : flat.width;
  const height = swapped ? flat.width : flat.height;
  const upright =
    turned === 0
      ? flat
      : sampleGrey(flat, undoTurn(turned, flat.width, flat.height), width, height);
  const skew = findSkew(upright);
  const straight =
    skew === 0 ? upright : sampleGrey(upright, undoSkew(skew, width, height), width, height);
  return { ...page, skew, width, height, shape: measurePage(straight) };
}

/** Upright page to flat frame. */
export function mapUprightToFlat(page: PreparedPage): PlaneMap {
  return composeMaps(
    undoTurn(page.turned, page.flat.width, page.flat.height),
    undoSkew(page.skew, page.width, page.height),
  );
}

/** The part of the upright page that holds print, scaled for the engine. */
export interface ReadingImage {
  grey: Grey;
  scale: number;
  left: number;
  top: number;
}

/** Letters this high (in pixels, median of all marks) are read best and fast. */
const LETTER_TARGET = 15;
const MAX_READING_PIXELS = 9_000_000;

/** Cuts out and scales what the engine is to read. */
export function makeReadingImage(page: PreparedPage): ReadingImage {
  const { content, letterHeight } = page.shape;
  let scale = letterHeight === null ? 1 : LETTER_TARGET / letterHeight;
  scale = Math.min(2, Math.max(0.35, scale));
  if (Math.abs(scale - 1) < 0.12) scale = 1;
  const area = content.width * content.height;
  scale = Math.min(scale, Math.sqrt(MAX_READING_PIXELS / area));
  const width = Math.max(32, Math.round(content.width * scale));
  const height = Math.max(32, Math.round(content.height * scale));
  const map = composeMaps(mapUprightToFlat(page), scaleAndShift(scale, content.left, content.top));
  const grey = sampleGrey(page.flat, map, width, height);
  return { grey, scale, left: content.left, top: content.top };
}

/** Whether the picture is black and white only, as a fax is. */
export function isTwoTone(pixels: Pixels): boolean {
  if (pixels.channels !== 1) return false;
  const counts = countGreys(pixels.data, 5);
  let middle = 0;
  let total = 0;
  counts.forEach((count, value) => {
    total += count;
    if (value > 8 && value < 247) middle += count;
  });
  return middle < total * 0.002;
}

function rectify(source: Pixels, corners: Corners): { rectified: Grey; toSource: PlaneMap } {
  const [a, b, c, d] = corners;
  const length = (from: Point, to: Point) => Math.hypot(from.x - to.x, from.y - to.y);
  const width = Math.round(Math.max(length(a, b), length(d, c)));
  const height = Math.round(Math.max(length(a, d), length(b, c)));
  const toSource = mapToCorners(corners, width, height);
  return { rectified: sampleGrey(toGrey(source), toSource, width, height), toSource };
}
