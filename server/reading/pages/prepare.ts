/** From a page as it lies in the file to an evened-out, upright page and the maps between the two. */
import { cleanFax } from './fax-clean.ts';
import { flattenLight } from './flatten.ts';
import { isWhiteToTheEdge } from './frame-edge.ts';
import { liesOnSide } from './orientation.ts';
import { measurePage, scaleShape, type PageShape } from './page-shape.ts';
import { countGreys, toGrey, turnGrey, type Grey, type Pixels } from './raster.ts';
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

/** A page made ready for reading. `width` and `height` are those of the upright page in source pixels. */
export interface PreparedPage {
  source: Pixels;
  grey: Grey;
  /** The page on a small scale, evened out, as it lies. */
  small: Grey;
  /** Pixels of `small` for one of the frame. */
  smallScale: number;
  /** The page without perspective, in source pixels, as it lies. */
  frame: Size;
  /** Frame to source. */
  toSource: PlaneMap;
  turned: QuarterTurn;
  skew: number;
  width: number;
  height: number;
  shape: PageShape;
  photographed: boolean;
  twoTone: boolean;
}

interface Size {
  width: number;
  height: number;
}

/** Long side of the small copy on which everything but the letters themselves is measured. */
const SMALL_SIDE = 1600;

/** Finds sheet, direction, slope and print of one page; the full picture is sampled only once, later. */
export function preparePage(source: Pixels): PreparedPage {
  const twoTone = isTwoTone(source);
  const grey = toGrey(source);
  const corners = twoTone || isWhiteToTheEdge(grey) ? null : findSheet(source);
  const frame = corners ? measureCorners(corners) : { width: grey.width, height: grey.height };
  const toSource = corners ? mapToCorners(corners, frame.width, frame.height) : identityMap;
  const smallScale = Math.min(1, SMALL_SIDE / Math.max(frame.width, frame.height));
  const sampled = sampleGrey(
    grey,
    composeMaps(toSource, scaleAndShift(smallScale, 0, 0)),
    Math.max(1, Math.round(frame.width * smallScale)),
    Math.max(1, Math.round(frame.height * smallScale)),
  );
  const small = twoTone ? sampled : flattenLight(sampled);
  const turned: QuarterTurn = liesOnSide(small) ? 90 : 0;
  const photographed = corners !== null;
  return straighten(
    { source, grey, small, smallScale, frame, toSource, photographed, twoTone },
    turned,
  );
}

/** The same page turned clockwise by another quarter, half or three quarters. */
export function turnFurther(page: PreparedPage, by: QuarterTurn): PreparedPage {
  return straighten(page, ((page.turned + by) % 360) as QuarterTurn);
}

type LyingPage = Omit<PreparedPage, 'turned' | 'skew' | 'width' | 'height' | 'shape'>;

function straighten(page: LyingPage, turned: QuarterTurn): PreparedPage {
  const { small, smallScale, frame } = page;
  const swapped = turned === 90 || turned === 270;
  const width = swapped ? frame.height : frame.width;
  const height = swapped ? frame.width : frame.height;
  const upright = turnGrey(small, turned);
  const skew = findSkew(upright);
  const straight =
    skew === 0
      ? upright
      : sampleGrey(
          upright,
          undoSkew(skew, upright.width, upright.height),
          upright.width,
          upright.height,
        );
  const shape = scaleShape(measurePage(straight), 1 / smallScale, width, height);
  return { ...page, turned, skew, width, height, shape };
}

/** Upright page to source. */
export function mapUprightToSource(page: PreparedPage): PlaneMap {
  const { frame, turned, skew, width, height } = page;
  const lying = composeMaps(
    undoTurn(turned, frame.width, frame.height),
    undoSkew(skew, width, height),
  );
  return composeMaps(page.toSource, lying);
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

/** Cuts out, straightens, scales and evens out what the engine is to read. */
export function makeReadingImage(page: PreparedPage): ReadingImage {
  const { content, letterHeight } = page.shape;
  let scale = letterHeight === null ? 1 : LETTER_TARGET / letterHeight;
  scale = Math.min(2, Math.max(0.35, scale));
  if (Math.abs(scale - 1) < 0.12) scale = 1;
  const area = content.width * content.height;
  scale = Math.min(scale, Math.sqrt(MAX_READING_PIXELS / area));
  const width = Math.max(32, Math.round(content.width * scale));
  const height = Math.max(32, Math.round(content.height * scale));
  const map = composeMaps(
    mapUprightToSource(page),
    scaleAndShift(scale, content.left, content.top),
  );
  const sampled = sampleGrey(page.grey, map, width, height);
  const grey = page.twoTone ? cleanFax(sampled) : flattenLight(sampled);
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

function measureCorners([a, b, c, d]: Corners): Size {
  const length = (from: Point, to: Point) => Math.hypot(from.x - to.x, from.y - to.y);
  return {
    width: Math.round(Math.max(length(a, b), length(d, c))),
    height: Math.round(Math.max(length(a, d), length(b, c))),
  };
}
