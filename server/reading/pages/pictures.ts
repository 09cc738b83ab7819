/** The pictures that people look at, made from the same decoded page as the text. */
import sharp from 'sharp';
import type { Pixels } from './raster.ts';
import { samplePixels, scaleAndShift, composeMaps, type PlaneMap } from './warp.ts';

const VIEWER_SIDE = 1600;
const THUMBNAIL_WIDTH = 240;

export interface PagePictures {
  image: Buffer;
  width: number;
  height: number;
  thumbnail: Buffer;
}

/**
 * JPEG of the upright page (long side at most 1600 px) and a small one (at most 240 px wide). `map`
 * takes the upright page of `width` × `height` pixels to the source.
 */
export async function makePictures(
  source: Pixels,
  map: PlaneMap,
  width: number,
  height: number,
): Promise<PagePictures> {
  const scale = Math.min(1, VIEWER_SIDE / Math.max(width, height));
  const w = Math.max(1, Math.round(width * scale));
  const h = Math.max(1, Math.round(height * scale));
  const view = samplePixels(source, composeMaps(map, scaleAndShift(scale, 0, 0)), w, h);
  const raw = { raw: { width: w, height: h, channels: view.channels } };
  const [image, thumbnail] = await Promise.all([
    sharp(view.data, raw).jpeg({ quality: 78 }).toBuffer(),
    sharp(view.data, raw)
      .resize({ width: Math.min(THUMBNAIL_WIDTH, w) })
      .jpeg({ quality: 70 })
      .toBuffer(),
  ]);
  return { image, width: w, height: h, thumbnail };
}
