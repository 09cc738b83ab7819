/** The text that a digital-born PDF page carries: words with places, and whether to believe them. */
import type { PageViewport } from 'pdfjs-dist/types/src/display/display_utils.d.ts';
import type { TextContent, TextItem } from 'pdfjs-dist/types/src/display/api.d.ts';
import type { Word } from '../../contract/readings.ts';
import type { Pixels } from './raster.ts';

interface Piece {
  text: string;
  x: number;
  baseline: number;
  width: number;
  size: number;
}

/** Words of the layer, boxes as shares of the page; print that does not run left to right is left out. */
export function readTextLayer(content: TextContent, viewport: PageViewport): Word[] {
  const pieces: Piece[] = [];
  for (const item of content.items) {
    if (!('str' in item) || item.str === '') continue;
    const piece = placePiece(item, viewport);
    if (piece) pieces.push(piece);
  }
  const words: Word[] = [];
  let run: { text: string; x: number; end: number; baseline: number; size: number } | null = null;
  const flush = () => {
    if (run && run.text.trim() !== '') words.push(makeWord(run, viewport));
    run = null;
  };
  for (const piece of pieces) {
    const letterWidth = piece.width / Math.max(1, piece.text.length);
    for (let i = 0; i < piece.text.length; i++) {
      const letter = piece.text[i]!;
      const x = piece.x + i * letterWidth;
      if (/\s/.test(letter)) {
        flush();
        continue;
      }
      const joins: boolean =
        run !== null &&
        Math.abs(run.baseline - piece.baseline) < piece.size * 0.2 &&
        Math.abs(x - run.end) < piece.size * 0.18;
      if (!joins) flush();
      run ??= { text: '', x, end: x, baseline: piece.baseline, size: piece.size };
      run.text += letter;
      run.end = x + letterWidth;
    }
  }
  flush();
  return words;
}

function placePiece(item: TextItem, viewport: PageViewport): Piece | null {
  const [a, b, , , e, f] = item.transform as number[];
  const [va, vb, vc, vd] = viewport.transform;
  const along = { x: a! * va! + b! * vc!, y: a! * vb! + b! * vd! };
  if (along.x <= 0 || Math.abs(along.y) > 0.1 * along.x) return null;
  const [x, baseline] = viewport.convertToViewportPoint(e!, f!) as [number, number];
  return {
    text: item.str.normalize('NFKC'),
    x,
    baseline,
    width: item.width * viewport.scale,
    size: (item.height || Math.hypot(a!, b!)) * viewport.scale,
  };
}

function makeWord(
  run: { text: string; x: number; end: number; baseline: number; size: number },
  viewport: PageViewport,
): Word {
  const top = run.baseline - run.size * 0.8;
  return {
    text: run.text,
    box: {
      x: run.x / viewport.width,
      y: top / viewport.height,
      w: (run.end - run.x) / viewport.width,
      h: run.size / viewport.height,
    },
    confidence: 1,
  };
}

/**
 * Whether the layer says what the page shows: enough letters that look like language, and ink under
 * nearly every word (hidden, white or misplaced text has none).
 */
export function isSoundLayer(words: Word[], pixels: Pixels): boolean {
  if (words.length < 3) return false;
  const text = words.map((word) => word.text).join('');
  const odd = [...text].filter((letter) => /[\uFFFD\uE000-\uF8FF\p{Cc}]/u.test(letter)).length;
  if (odd > text.length * 0.02) return false;
  if (!looksLikeLanguage(words)) return false;
  const inked = words.filter((word) => hasInk(word, pixels)).length;
  return inked >= words.length * 0.92 && shareCovered(words, pixels) >= LEAST_COVERED;
}

/** A line that a scanner wrote under its picture is sound as far as it goes, and leaves out the page. */
const LEAST_COVERED = 0.2;
const CELL = 16;

/** Of all small squares of the page that hold print, the share that the words of the layer stand in. */
export function shareCovered(words: Word[], pixels: Pixels): number {
  const columns = Math.ceil(pixels.width / CELL);
  const rows = Math.ceil(pixels.height / CELL);
  const isWord = new Uint8Array(columns * rows);
  for (const { box } of words) {
    const right = Math.min(columns - 1, Math.floor(((box.x + box.w) * pixels.width) / CELL));
    const bottom = Math.min(rows - 1, Math.floor(((box.y + box.h) * pixels.height) / CELL));
    for (let row = Math.max(0, Math.floor((box.y * pixels.height) / CELL)); row <= bottom; row++) {
      const left = Math.max(0, Math.floor((box.x * pixels.width) / CELL));
      if (right >= left) isWord.fill(1, row * columns + left, row * columns + right + 1);
    }
  }
  let printed = 0;
  let covered = 0;
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const box = {
        x: (column * CELL) / pixels.width,
        y: (row * CELL) / pixels.height,
        w: CELL / pixels.width,
        h: CELL / pixels.height,
      };
      if (!hasInk({ text: '', box, confidence: 1 }, pixels)) continue;
      printed++;
      covered += isWord[row * columns + column] ?? 0;
    }
  }
  return printed === 0 ? 1 : covered / printed;
}

/** Words of letters have vowels: a scrambled layer has few such words. */
function looksLikeLanguage(words: Word[]): boolean {
  const lettered = words.filter((word) => /^\p{L}{4,}[.,:;]?$/u.test(word.text));
  if (lettered.length < 5) return true;
  const voiced = lettered.filter((word) => /[aeiouyäöüáéíóúàèâêîôû]/iu.test(word.text));
  return voiced.length >= lettered.length * 0.7;
}

function hasInk(word: Word, pixels: Pixels): boolean {
  const { width, height, channels, data } = pixels;
  const left = Math.max(0, Math.floor(word.box.x * width));
  const right = Math.min(width, Math.ceil((word.box.x + word.box.w) * width));
  const top = Math.max(0, Math.floor(word.box.y * height));
  const bottom = Math.min(height, Math.ceil((word.box.y + word.box.h) * height));
  let low = 255;
  let high = 0;
  for (let y = top; y < bottom; y++) {
    for (let x = left; x < right; x++) {
      const value = data[(y * width + x) * channels + (channels === 3 ? 1 : 0)]!;
      if (value < low) low = value;
      if (value > high) high = value;
    }
  }
  return high - low > 40;
}
