/** Reads printed pages back, as words with their places and as pictures. */
import { createCanvas } from '@napi-rs/canvas';
import { createRequire } from 'node:module';
import path from 'node:path';
import { getDocument } from 'pdfjs-dist/legacy/build/pdf.mjs';

const folder = path.dirname(createRequire(import.meta.url).resolve('pdfjs-dist/package.json'));

export interface PrintedPage {
  width: number;
  height: number;
  /** In points; `y` counts from the lower edge. */
  items: { words: string; x: number; y: number; width: number }[];
  /** All words, with single spaces between. */
  text: string;
}

export interface Picture {
  width: number;
  height: number;
  /** Red, green, blue and opacity of each point. */
  data: Uint8ClampedArray;
}

function open(bytes: Uint8Array) {
  return getDocument({
    data: Uint8Array.from(bytes),
    standardFontDataUrl: `${folder}/standard_fonts/`,
    isEvalSupported: false,
    verbosity: 0,
  });
}

export async function readPages(bytes: Uint8Array): Promise<PrintedPage[]> {
  const task = open(bytes);
  const document = await task.promise;
  const pages: PrintedPage[] = [];
  for (let number = 1; number <= document.numPages; number += 1) {
    const page = await document.getPage(number);
    const [, , width = 0, height = 0] = page.view;
    const content = await page.getTextContent();
    const items = content.items.flatMap((item) =>
      'str' in item && item.str.trim() !== ''
        ? [
            {
              words: item.str,
              x: Number(item.transform[4]),
              y: Number(item.transform[5]),
              width: item.width,
            },
          ]
        : [],
    );
    const text = items
      .map(({ words }) => words)
      .join(' ')
      .replace(/\s+/g, ' ');
    pages.push({ width, height, items, text });
  }
  await task.destroy();
  return pages;
}

/** A page as pixels, `scale` to a point. */
export async function drawPage(
  bytes: Uint8Array,
  pageNumber: number,
  scale: number,
): Promise<Picture> {
  const task = open(bytes);
  const document = await task.promise;
  const page = await document.getPage(pageNumber);
  const viewport = page.getViewport({ scale });
  const width = Math.floor(viewport.width);
  const height = Math.floor(viewport.height);
  const canvas = createCanvas(width, height);
  const context = canvas.getContext('2d');
  context.fillStyle = '#ffffff';
  context.fillRect(0, 0, width, height);
  await page.render({
    canvas: null,
    canvasContext: context as unknown as CanvasRenderingContext2D,
    viewport,
  }).promise;
  const { data } = context.getImageData(0, 0, width, height);
  await task.destroy();
  return { width, height, data };
}

/** A piece of a picture; measures in pixels. */
export function cutPicture(
  picture: Picture,
  x: number,
  y: number,
  width: number,
  height: number,
): Picture {
  const data = new Uint8ClampedArray(width * height * 4);
  for (let row = 0; row < height; row += 1) {
    const start = ((y + row) * picture.width + x) * 4;
    data.set(picture.data.subarray(start, start + width * 4), row * width * 4);
  }
  return { width, height, data };
}
