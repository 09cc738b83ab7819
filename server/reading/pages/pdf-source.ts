/** PDF files: structure first (cheap), drawing only where a page is more than one scanned picture. */
import { createRequire } from 'node:module';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import type { PDFDocument } from 'pdf-lib';
import type { PDFDocumentProxy } from 'pdfjs-dist/types/src/display/api.d.ts';
import type { ReadingLimits } from './limits.ts';
import type { PageSource, RawPage } from './page-source.ts';
import { openPdfStructure, takePagePicture } from './pdf-picture.ts';
import type { Pixels } from './raster.ts';
import { isSoundLayer, readTextLayer } from './text-layer.ts';
import { UnreadableFileError } from './unreadable-file-error.ts';

/** Resolution at which pages are drawn for reading, and the most pixels one drawing may have. */
const DRAW_DPI = 200;
const DRAW_PIXELS = 9_000_000;

const damaged = 'The PDF is damaged and cannot be opened. Save or scan it again.';

/** Opens a PDF. Throws `UnreadableFileError` for a password, damage or too many pages. */
export async function openPdf(bytes: Uint8Array, limits: ReadingLimits): Promise<PageSource> {
  const structure = await openPdfStructure(bytes);
  let drawing: Promise<PDFDocumentProxy> | null = null;
  const requireDrawing = () => (drawing ??= openForDrawing(bytes));
  const pageCount = countPages(structure) ?? (await requireDrawing()).numPages;
  if (pageCount > limits.maxPages) {
    throw new UnreadableFileError(
      `The PDF has ${pageCount} pages; at most ${limits.maxPages} are read at once. Split it.`,
    );
  }
  if (pageCount < 1) throw new UnreadableFileError('The PDF has no pages. Save or scan it again.');
  return {
    pageCount,
    async loadPage(number): Promise<RawPage> {
      const page = findPage(structure, number);
      const pixels = page && (await takePagePicture(page, limits));
      if (pixels) return { pixels, textLayer: null, drawn: false };
      return drawPage(await requireDrawing(), number);
    },
    async close() {
      const opened = await drawing?.catch(() => null);
      await opened?.destroy();
    },
  };
}

function countPages(structure: PDFDocument | null): number | null {
  try {
    const count = structure?.getPageCount() ?? 0;
    return count > 0 ? count : null;
  } catch {
    return null;
  }
}

function findPage(structure: PDFDocument | null, number: number) {
  try {
    return structure?.getPage(number - 1) ?? null;
  } catch {
    return null;
  }
}

async function openForDrawing(bytes: Uint8Array): Promise<PDFDocumentProxy> {
  const pdfjs = await import('pdfjs-dist/legacy/build/pdf.mjs');
  const require = createRequire(import.meta.url);
  const home = path.dirname(require.resolve('pdfjs-dist/package.json'));
  const folder = (name: string) => `${path.join(home, name)}/`;
  // In this thread, without a worker of its own: the thread is already ours to end.
  pdfjs.GlobalWorkerOptions.workerSrc = pathToFileURL(
    path.join(home, 'legacy/build/pdf.worker.mjs'),
  ).href;
  try {
    return await pdfjs.getDocument({
      data: new Uint8Array(bytes),
      isEvalSupported: false,
      enableXfa: false,
      useSystemFonts: false,
      disableFontFace: true,
      standardFontDataUrl: folder('standard_fonts'),
      cMapUrl: folder('cmaps'),
      cMapPacked: true,
      wasmUrl: folder('wasm'),
      verbosity: 0,
    }).promise;
  } catch (error) {
    if (error instanceof Error && error.name === 'PasswordException') {
      throw new UnreadableFileError(
        'The PDF is locked with a password. Save a copy without the password and bring that.',
      );
    }
    throw new UnreadableFileError(damaged);
  }
}

async function drawPage(document: PDFDocumentProxy, number: number): Promise<RawPage> {
  try {
    const page = await document.getPage(number);
    const natural = page.getViewport({ scale: 1 });
    const area = Math.max(1, natural.width * natural.height);
    const scale = Math.min(DRAW_DPI / 72, Math.sqrt(DRAW_PIXELS / area));
    const viewport = page.getViewport({ scale });
    const { createCanvas } = await import('@napi-rs/canvas');
    const width = Math.max(1, Math.floor(viewport.width));
    const height = Math.max(1, Math.floor(viewport.height));
    const canvas = createCanvas(width, height);
    const context = canvas.getContext('2d');
    await page.render({
      canvas: null,
      canvasContext: context as unknown as CanvasRenderingContext2D,
      viewport,
      background: '#ffffff',
    }).promise;
    const pixels = dropAlpha(context.getImageData(0, 0, width, height).data, width, height);
    const words = readTextLayer(await page.getTextContent(), viewport);
    page.cleanup();
    return { pixels, textLayer: isSoundLayer(words, pixels) ? words : null, drawn: true };
  } catch (error) {
    if (error instanceof UnreadableFileError) throw error;
    throw new UnreadableFileError(`Page ${number} of the PDF is damaged. Save or scan it again.`);
  }
}

function dropAlpha(rgba: Uint8ClampedArray, width: number, height: number): Pixels {
  const data = new Uint8Array(width * height * 3);
  for (let from = 0, to = 0; to < data.length; from += 4) {
    data[to++] = rgba[from]!;
    data[to++] = rgba[from + 1]!;
    data[to++] = rgba[from + 2]!;
  }
  return { width, height, channels: 3, data };
}
