/** Pictures: JPEG, PNG, TIFF of many pages, WebP, AVIF, and HEIC by way of its own decoder. */
import convertHeic from 'heic-convert';
import sharp from 'sharp';
import type { ReadingLimits } from './limits.ts';
import type { PageSource, RawPage } from './page-source.ts';
import type { Pixels } from './raster.ts';
import type { FileKind } from './sniff.ts';
import { UnreadableFileError } from './unreadable-file-error.ts';

/** More pixels than this say nothing more about print; larger pictures are shrunk while decoding. */
const WORKING_PIXELS = 20_000_000;

const damaged = 'The picture is damaged or cut off and cannot be read. Scan or save it again.';

/** Opens a picture file; every TIFF page counts. Throws `UnreadableFileError`. */
export async function openImage(
  bytes: Uint8Array,
  kind: FileKind,
  limits: ReadingLimits,
): Promise<PageSource> {
  const readable = kind === 'heic' ? await decodeHeic(bytes) : bytes;
  const pageCount = kind === 'tiff' ? await countPages(readable, limits) : 1;
  if (pageCount > limits.maxPages) {
    throw new UnreadableFileError(
      `The file has ${pageCount} pages; at most ${limits.maxPages} are read at once. Split it.`,
    );
  }
  return {
    pageCount,
    async loadPage(number): Promise<RawPage> {
      const pixels = await decodePixels(readable, limits.maxPixels, number - 1);
      return { pixels, textLayer: null, drawn: false };
    },
    close: () => Promise.resolve(),
  };
}

async function decodeHeic(bytes: Uint8Array): Promise<Uint8Array> {
  try {
    const jpeg = await convertHeic({
      buffer: new Uint8Array(bytes),
      format: 'JPEG',
      quality: 0.95,
    });
    return new Uint8Array(jpeg);
  } catch {
    throw new UnreadableFileError(
      'This HEIC photo could not be decoded. Let the phone save it as JPEG and bring that.',
    );
  }
}

async function countPages(bytes: Uint8Array, limits: ReadingLimits): Promise<number> {
  try {
    const { pages } = await sharp(bytes, { limitInputPixels: limits.maxPixels }).metadata();
    return pages ?? 1;
  } catch {
    throw new UnreadableFileError(damaged);
  }
}

/**
 * Decodes one picture to 8-bit grey or colour: turned as its EXIF orientation says, flattened on white,
 * shrunk to a working size. Throws `UnreadableFileError`.
 */
export async function decodePixels(
  bytes: Uint8Array,
  maxPixels: number,
  page = 0,
): Promise<Pixels> {
  try {
    const image = sharp(bytes, {
      limitInputPixels: maxPixels,
      failOn: 'error',
      page,
      sequentialRead: true,
    });
    const { width, height, space } = await image.metadata();
    const grey = space === 'b-w' || space === 'grey16';
    let pipeline = image.autoOrient().flatten({ background: '#ffffff' });
    if (width * height > WORKING_PIXELS) {
      const scale = Math.sqrt(WORKING_PIXELS / (width * height));
      pipeline = pipeline.resize(Math.round(Math.max(width, height) * scale), null, {
        fit: 'inside',
        height: Math.round(Math.max(width, height) * scale),
      });
    }
    const { data, info } = await pipeline
      .toColourspace(grey ? 'b-w' : 'srgb')
      .raw({ depth: 'uchar' })
      .toBuffer({ resolveWithObject: true });
    return takeChannels(data, info.width, info.height, info.channels);
  } catch (error) {
    if (error instanceof UnreadableFileError) throw error;
    throw new UnreadableFileError(damaged);
  }
}

/** Keeps one or three channels of whatever the decoder gave. */
function takeChannels(data: Uint8Array, width: number, height: number, channels: number): Pixels {
  if (channels === 1 || channels === 3) return { width, height, channels, data };
  const keep = channels === 2 ? 1 : 3;
  const out = new Uint8Array(width * height * keep);
  for (let i = 0, from = 0, to = 0; i < width * height; i++, from += channels) {
    for (let c = 0; c < keep; c++) out[to++] = data[from + c]!;
  }
  return { width, height, channels: keep, data: out };
}
