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
/** No ligatures, so that copied text has its letters; no shifting, which the PDF writer would not use anyway. */
const features = {
  liga: false,
  clig: false,
  kern: false,
  mark: false,
  mkmk: false,
  dist: false,
  abvm: false,
  blwm: false,
};
/** The font tool, except that a text is laid out once: long lists say the same words again and again. */
const rememberingFontkit: Parameters<PDFDocument['registerFontkit']>[0] = {
  create(bytes, name) {
    const font = fontkit.create(bytes, name);
    const layout = font.layout.bind(font);
    const seen = new Map<string, ReturnType<typeof layout>>();
    font.layout = (text, wanted) => {
      const run = seen.get(text) ?? layout(text, wanted);
      seen.set(text, run);
      return run;
    };
    return font;
  },
};
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
  document.registerFontkit(rememberingFontkit);
  return {
    regular: await embedTypeface(document, 'regular'),
    strong: await embedTypeface(document, 'strong'),
  };
}

async function embedTypeface(document: PDFDocument, weight: Weight): Promise<Typeface> {
  const font = await document.embedFont(await loadFile(weight), {
    subset: true,
    features,
  });
  const known = new Set(font.getCharacterSet());
  const measureWord = (word: string) => font.widthOfTextAtSize(word, unitSize) / unitSize;
  return {
    font,
    clean: (text) => cleanText(text, known),
    // Word by word, since words come again more often than whole lines; widths grow with the size.
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
