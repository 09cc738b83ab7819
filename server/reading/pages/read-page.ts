/** One page from its raw picture to text, places and the pictures for people. */
import type { Word } from '../../contract/readings.ts';
import type { ReadPage } from '../types.ts';
import type { Engine, SeenWord } from './engine.ts';
import type { RawPage } from './page-source.ts';
import { makePictures } from './pictures.ts';
import {
  makeReadingImage,
  mapUprightToSource,
  preparePage,
  turnFurther,
  type PreparedPage,
  type ReadingImage,
} from './prepare.ts';
import { findCode } from './qr.ts';
import { toGrey } from './raster.ts';
import { mendSpacing } from './spacing.ts';
import { assembleLines, joinLines, meanConfidence } from './text-lines.ts';
import { identityMap } from './warp.ts';

/** Under this mean confidence a page may stand on its head: it is read the other way round too. */
const DOUBT = 0.6;

/** Reads one page. The engine is asked only where there is print and no sound text layer. */
export async function readPage(raw: RawPage, number: number, engine: Engine): Promise<ReadPage> {
  if (raw.textLayer) return takeTextLayer(raw, raw.textLayer, number);
  let page = preparePage(raw.pixels);
  const code = findCode(page.small);
  let words: Word[] = [];
  if (!page.shape.blank) [page, words] = readUpright(page, engine);
  const map = mapUprightToSource(page);
  const pictures = await makePictures(page.source, map, page.width, page.height);
  return {
    ...describeText(number, words),
    source: page.shape.blank ? 'none' : 'ocr',
    blank: page.shape.blank,
    code,
    turned: page.turned,
    ...pictures,
  };
}

/** Reads the page, turning it until its words lie level and are read with confidence. */
function readUpright(first: PreparedPage, engine: Engine): [PreparedPage, Word[]] {
  let page = first;
  let words = recognise(page, engine);
  if (standOnEnd(words, page)) {
    page = turnFurther(page, 270);
    words = recognise(page, engine);
  }
  if (meanConfidence(words) < DOUBT || page.turned % 180 !== 0) {
    const other = turnFurther(page, 180);
    const otherWords = recognise(other, engine);
    if (weigh(otherWords) > weigh(words)) return [other, otherWords];
  }
  return [page, words];
}

/** The engine reads lines that run up or down as well: their words are higher than wide. */
function standOnEnd(words: Word[], page: PreparedPage): boolean {
  const long = words.filter((word) => word.text.length >= 4 && word.confidence > 0.5);
  const upended = long.filter(({ box }) => box.h * page.height > box.w * page.width * 1.2);
  return upended.length > long.length * 0.5;
}

async function takeTextLayer(raw: RawPage, words: Word[], number: number): Promise<ReadPage> {
  const { width, height } = raw.pixels;
  const pictures = await makePictures(raw.pixels, identityMap, width, height);
  return {
    ...describeText(number, words),
    source: 'text-layer',
    blank: false,
    code: findCode(toGrey(raw.pixels)),
    turned: 0,
    ...pictures,
  };
}

function describeText(number: number, words: Word[]) {
  const lines = assembleLines(words);
  return { number, lines, text: joinLines(lines), confidence: meanConfidence(words) };
}

/** How much was read for sure: confident letters count, guesses hardly. */
function weigh(words: Word[]): number {
  let sum = 0;
  for (const word of words) sum += word.text.length * Math.max(0, word.confidence - 0.4);
  return sum;
}

function recognise(page: PreparedPage, engine: Engine): Word[] {
  const image = makeReadingImage(page);
  const seen = engine.recognise(image.grey, chooseLayout(page), 160);
  const height = (page.shape.letterHeight ?? 16 / image.scale) * image.scale;
  return mendSpacing(seen, height)
    .filter(isPrint)
    .map((word) => placeWord(word, image, page));
}

/** Till receipts are narrow single columns, for which one even block reads best. */
function chooseLayout(page: PreparedPage): 'page' | 'block' {
  const { width, height } = page.shape.content;
  return height > width * 1.9 ? 'block' : 'page';
}

/** Specks and rules come out as single marks of low confidence. */
function isPrint(word: SeenWord): boolean {
  if (/[\p{L}\p{N}]/u.test(word.text)) return true;
  return word.confidence > 0.5;
}

function placeWord(word: SeenWord, image: ReadingImage, page: PreparedPage): Word {
  const { scale, left, top } = image;
  return {
    text: word.text,
    box: {
      x: (left + word.left / scale) / page.width,
      y: (top + word.top / scale) / page.height,
      w: word.width / scale / page.width,
      h: word.height / scale / page.height,
    },
    confidence: word.confidence,
  };
}
