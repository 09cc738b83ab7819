/**
 * Taking the picture out of a scanned PDF page instead of drawing the page: a scanner's page is one
 * image that fills it. Anything out of the ordinary gives null, and the page is drawn.
 */
import { inflateSync } from 'node:zlib';
import {
  PDFArray,
  PDFBool,
  PDFDict,
  PDFDocument,
  PDFName,
  PDFNumber,
  PDFRawStream,
  type PDFObject,
  type PDFPage,
} from 'pdf-lib';
import { decodePixels } from './image-source.ts';
import type { ReadingLimits } from './limits.ts';
import type { Pixels } from './raster.ts';
import { wrapFaxAsTiff } from './fax-tiff.ts';

const MAX_CONTENT_BYTES = 400_000;

/** The document's structure, or null when it is encrypted or too damaged for this way in. */
export async function openPdfStructure(bytes: Uint8Array): Promise<PDFDocument | null> {
  try {
    return await PDFDocument.load(bytes, { updateMetadata: false, throwOnInvalidObject: true });
  } catch {
    return null;
  }
}

/** The page's single full-page picture, turned as the page says; null when the page is more than that. */
export async function takePagePicture(
  page: PDFPage,
  limits: ReadingLimits,
): Promise<Pixels | null> {
  try {
    const found = findSinglePicture(page);
    if (!found) return null;
    const pixels = await decodePicture(found, limits);
    if (!pixels) return null;
    return turnPixels(pixels, ((page.getRotation().angle % 360) + 360) % 360);
  } catch {
    return null;
  }
}

function findSinglePicture(page: PDFPage): PDFRawStream | null {
  const resources = page.node.Resources();
  const objects = resources?.lookup(PDFName.of('XObject'));
  if (!(objects instanceof PDFDict)) return null;
  const content = readContent(page);
  if (content === null) return null;
  const drawing = parseDrawing(content);
  if (!drawing) return null;
  const { width, height } = page.getCropBox();
  const [a, b, c, d] = drawing.matrix;
  if (Math.abs(b) > 0.01 * a || Math.abs(c) > 0.01 * d || a <= 0 || d <= 0) return null;
  if (a * d < 0.85 * width * height || a * d > 1.3 * width * height) return null;
  const picture = objects.lookup(PDFName.of(drawing.name));
  if (!(picture instanceof PDFRawStream)) return null;
  if (nameOf(picture.dict.lookup(PDFName.of('Subtype'))) !== 'Image') return null;
  return picture;
}

function readContent(page: PDFPage): string | null {
  const contents = page.node.Contents();
  const streams: PDFObject[] = [];
  if (contents instanceof PDFArray) {
    for (let i = 0; i < contents.size(); i++) streams.push(contents.lookup(i) as PDFObject);
  } else if (contents) streams.push(contents);
  let text = '';
  for (const stream of streams) {
    if (!(stream instanceof PDFRawStream)) return null;
    const filter = filterOf(stream);
    if (filter === 'FlateDecode') {
      const inflated = inflateSync(stream.contents, { maxOutputLength: MAX_CONTENT_BYTES });
      text += `${inflated.toString('latin1')}\n`;
    } else if (filter === null && stream.contents.length < MAX_CONTENT_BYTES) {
      text += `${Buffer.from(stream.contents).toString('latin1')}\n`;
    } else return null;
  }
  return text;
}

type Matrix = [number, number, number, number, number, number];

/** Accepts content that only places one picture; text may be there if it is all invisible (mode 3). */
function parseDrawing(content: string): { name: string; matrix: Matrix } | null {
  let visibleText = false;
  const bare = content.replace(/\bBT\b[\s\S]*?\bET\b/g, (block) => {
    const modes = [...block.matchAll(/(\d)\s+Tr\b/g)].map((match) => match[1]);
    if (/\bT[jJ*]|['"]\s/.test(block) && (modes.length === 0 || modes.some((m) => m !== '3'))) {
      visibleText = true;
    }
    return ' ';
  });
  if (visibleText) return null;
  const tokens = bare.split(/\s+/).filter((token) => token !== '');
  if (tokens.length > 200) return null;
  let matrix: Matrix = [1, 0, 0, 1, 0, 0];
  const saved: Matrix[] = [];
  let drawn: { name: string; matrix: Matrix } | null = null;
  let operands: string[] = [];
  for (const token of tokens) {
    if (/^[-+.\d]/.test(token) || token.startsWith('/')) {
      operands.push(token);
      continue;
    }
    if (token === 'q') saved.push(matrix);
    else if (token === 'Q') matrix = saved.pop() ?? matrix;
    else if (token === 'cm') matrix = multiply(operands.slice(-6).map(Number), matrix);
    else if (token === 'Do') {
      if (drawn) return null;
      drawn = { name: (operands.at(-1) ?? '').slice(1), matrix };
    } else if (!/^(gs|re|W\*?|n|i|ri|BMC|BDC|EMC|g|G|rg|RG|w|J|j|M|d|cs|CS)$/.test(token)) {
      return null;
    }
    operands = [];
  }
  return drawn;
}

function multiply(inner: number[], outer: Matrix): Matrix {
  const [a = 1, b = 0, c = 0, d = 1, e = 0, f = 0] = inner;
  const [A, B, C, D, E, F] = outer;
  return [
    a * A + b * C,
    a * B + b * D,
    c * A + d * C,
    c * B + d * D,
    e * A + f * C + E,
    e * B + f * D + F,
  ];
}

function nameOf(object: PDFObject | undefined): string | null {
  return object instanceof PDFName ? object.decodeText() : null;
}

function numberOf(dict: PDFDict, key: string): number | null {
  const value = dict.lookup(PDFName.of(key));
  return value instanceof PDFNumber ? value.asNumber() : null;
}

/** The stream's only filter, null for none, and `several` where they are chained. */
function filterOf(stream: PDFRawStream): string | null {
  const filter = stream.dict.lookup(PDFName.of('Filter'));
  if (filter === undefined) return null;
  if (filter instanceof PDFArray) {
    return filter.size() === 1 ? nameOf(filter.lookup(0)) : filter.size() === 0 ? null : 'several';
  }
  return nameOf(filter) ?? 'several';
}

function parametersOf(stream: PDFRawStream): PDFDict | null {
  const found = stream.dict.lookup(PDFName.of('DecodeParms'));
  const first = found instanceof PDFArray ? found.lookup(0) : found;
  return first instanceof PDFDict ? first : null;
}

async function decodePicture(stream: PDFRawStream, limits: ReadingLimits): Promise<Pixels | null> {
  const { dict } = stream;
  const width = numberOf(dict, 'Width');
  const height = numberOf(dict, 'Height');
  if (!width || !height || width * height > limits.maxPixels) return null;
  for (const key of ['SMask', 'Mask', 'ImageMask']) {
    const value = dict.lookup(PDFName.of(key));
    if (value !== undefined && !(value instanceof PDFBool && !value.asBoolean())) return null;
  }
  const space = nameOf(dict.lookup(PDFName.of('ColorSpace')));
  const decode = dict.lookup(PDFName.of('Decode'));
  const inverted = decode instanceof PDFArray && String(decode.lookup(0)) === '1';
  const filter = filterOf(stream);
  if (filter === 'DCTDecode') {
    if (decode !== undefined || space === 'DeviceCMYK') return null;
    return decodePixels(stream.contents, limits.maxPixels);
  }
  const bits = numberOf(dict, 'BitsPerComponent') ?? 1;
  if (filter === 'CCITTFaxDecode') {
    const parameters = parametersOf(stream);
    const black = parameters?.lookup(PDFName.of('BlackIs1'));
    const tiff = wrapFaxAsTiff(stream.contents, {
      k: (parameters && numberOf(parameters, 'K')) ?? 0,
      columns: (parameters && numberOf(parameters, 'Columns')) ?? 1728,
      rows: height,
      inverted: (black instanceof PDFBool && black.asBoolean()) !== inverted,
    });
    return tiff && decodePixels(tiff, limits.maxPixels);
  }
  if (filter === 'FlateDecode' && (bits === 1 || bits === 8)) {
    const channels = space === 'DeviceGray' ? 1 : space === 'DeviceRGB' && bits === 8 ? 3 : null;
    const predictor = parametersOf(stream);
    if (channels === null || (predictor && (numberOf(predictor, 'Predictor') ?? 1) !== 1)) {
      return null;
    }
    const rowBytes = Math.ceil((width * channels * bits) / 8);
    const raw = inflateSync(stream.contents, { maxOutputLength: rowBytes * height + 1024 });
    if (raw.length < rowBytes * height) return null;
    if (bits === 8) {
      return inverted
        ? null
        : { width, height, channels, data: raw.subarray(0, rowBytes * height) };
    }
    return { width, height, channels: 1, data: unpackBits(raw, width, height, inverted) };
  }
  return null;
}

function unpackBits(raw: Uint8Array, width: number, height: number, inverted: boolean): Uint8Array {
  const rowBytes = Math.ceil(width / 8);
  const out = new Uint8Array(width * height);
  const one = inverted ? 0 : 255;
  for (let y = 0; y < height; y++) {
    const row = y * rowBytes;
    for (let x = 0; x < width; x++) {
      const bit = (raw[row + (x >> 3)]! >> (7 - (x & 7))) & 1;
      out[y * width + x] = bit === 1 ? one : 255 - one;
    }
  }
  return out;
}

function turnPixels(pixels: Pixels, degrees: number): Pixels {
  if (degrees === 0) return pixels;
  const { width: w, height: h, channels, data } = pixels;
  const swapped = degrees !== 180;
  const out = new Uint8Array(data.length);
  for (let y = 0; y < h; y++) {
    for (let x = 0; x < w; x++) {
      const nx = degrees === 90 ? h - 1 - y : degrees === 180 ? w - 1 - x : y;
      const ny = degrees === 90 ? x : degrees === 180 ? h - 1 - y : w - 1 - x;
      const to = (ny * (swapped ? h : w) + nx) * channels;
      const from = (y * w + x) * channels;
      for (let c = 0; c < channels; c++) out[to + c] = data[from + c]!;
    }
  }
  return { width: swapped ? h : w, height: swapped ? w : h, channels, data: out };
}
