/** A file opened for reading page by page, whatever its kind. */
import type { Word } from '../../contract/readings.ts';
import { openImage } from './image-source.ts';
import type { ReadingLimits } from './limits.ts';
import { openPdf } from './pdf-source.ts';
import type { Pixels } from './raster.ts';
import type { FileKind } from './sniff.ts';

/** One page as it lies in the file. */
export interface RawPage {
  pixels: Pixels;
  /** Words of a digital-born page, placed on the picture; null where the picture must be read. */
  textLayer: Word[] | null;
  /** A page drawn by software: straight, upright and clean by nature. */
  drawn: boolean;
}

export interface PageSource {
  pageCount: number;
  /** Page from 1. Throws `UnreadableFileError` when that page is damaged. */
  loadPage(number: number): Promise<RawPage>;
  close(): Promise<void>;
}

/** Opens a sniffed file. Throws `UnreadableFileError`. */
export function openSource(
  bytes: Uint8Array,
  kind: FileKind,
  limits: ReadingLimits,
): Promise<PageSource> {
  return kind === 'pdf' ? openPdf(bytes, limits) : openImage(bytes, kind, limits);
}
