/** Noto Sans in two weights, embedded as a subset; whatever a name is written in, drawing it never fails. */
import { readFile } from 'node:fs/promises';
import { createRequire } from 'node:module';
import fontkit from '@pdf-lib/fontkit';
import type { PDFDocument, PDFFont } from 'pdf-lib';
import { alignGlyphs } from './align-glyphs.ts';

const require = createRequire(import.meta.url);
const files = {
  regular: '@expo-google-fonts/noto-sans/400Regular/NotoSans_400Regular.ttf',
  strong: '@expo-google-fonts/noto-sans/600SemiBold/NotoSans_600SemiBold.ttf',
} as const;
export type Weight = keyof typeof files;

/** Stands for a character that the face does not have (Unicode: REPLACEMENT CHARACTER). */
export const missingSign = '\uFFFD';

const unitSize = 1000;
const graphemes = new Intl.Segmenter('en', { granularity: 'grapheme' });
const fileCache = new Map<Weight, Promise<Uint8Array>>();

/** One weight of the face in one document. */
export interface Typeface {
  font: PDFFont;
  /** Text as one line that the face can draw; unknown characters become `missingSign`. */
  clean(text: string): string;
  /** Width in points of text that is clean already. */
  measure(cleanText: string, size: number): number;
}

/** Embeds both weights in a document. */
export async function embedTypefaces(document: PDFDocument): Promise<Record<Weight, Typeface>> {
  document.registerFontkit(fontkit);
  return {
    regular: await embedTypeface(document, 'regular'),
    strong: await embedTypeface(document, 'strong'),
  };
}

async function embedTypeface(document: PDFDocument, weight: Weight): Promise<Typeface> {
  // No ligatures, so that text copied out of the page has the letters it was written with.
  const font = await document.embedFont(await loadFile(weight), {
    subset: true,
    features: { liga: false, clig: false, dlig: false },
  });
  const known = new Set(font.getCharacterSet());
  // Laying a word out is slow and long lists say the same words again and again; widths grow with the size.
  const widths = new Map<string, number>();
  const measureWord = (word: string) => {
    const seen = widths.get(word);
    if (seen !== undefined) return seen;
    const width = font.widthOfTextAtSize(word, unitSize) / unitSize;
    widths.set(word, width);
    return width;
  };
  return {
    font,
    clean: (text) => cleanText(text, known),
    measure: (text, size) => {
      const words = text.split(' ');
      const letters = words.reduce((sum, word) => sum + measureWord(word), 0);
      return (letters + (words.length - 1) * measureWord(' ')) * size;
    },
  };
}

function loadFile(weight: Weight): Promise<Uint8Array> {
  const cached = fileCache.get(weight);
  if (cached) return cached;
  const loading = readFile(require.resolve(files[weight])).then(alignGlyphs);
  fileCache.set(weight, loading);
  return loading;
}

/**
 * Line breaks and control characters become spaces, invisible direction marks go, compatible letters are
 * taken apart where that helps ("ﬁ" as "fi"), the rest is replaced.
 */
function cleanText(text: string, known: ReadonlySet<number>): string {
  const line = text
    .normalize('NFC')
    .replace(/[\p{Cc}\s]+/gu, ' ')
    .trim();
  if (/^[\x20-\x7e]*$/.test(line)) return line;
  const isKnown = (piece: string) =>
    [...piece].every((character) => known.has(character.codePointAt(0) ?? -1));
  let cleaned = '';
  for (const { segment } of graphemes.segment(line)) {
    const visible = segment.replace(/\p{Cf}/gu, '');
    const apart = visible.normalize('NFKC');
    if (isKnown(visible)) cleaned += visible;
    else if (isKnown(apart)) cleaned += apart;
    else cleaned += missingSign;
  }
  return cleaned;
}
