/** Pages as the reader of letters hands them on, made from plain text. */
import type { Word } from '../../../server/contract/readings.ts';
import type { PageText, TextLine } from '../../../server/reading/types.ts';

const left = 0.08;
const charWidth = 0.0095;
const lineHeight = 0.014;

/**
 * A page from its lines. Two or more spaces make a gap between columns, an empty line an empty space;
 * a line that begins with `# ` is printed twice as high.
 */
export function pageOfText(text: string, number = 1, more: Partial<PageText> = {}): PageText {
  const rows = text.replace(/^\n+|\s+$/g, '').split('\n');
  const lines: TextLine[] = [];
  let y = 0.05;
  for (const row of rows) {
    const isBig = row.startsWith('# ');
    const scale = isBig ? 2 : 1;
    const print = isBig ? row.slice(2) : row;
    const words: Word[] = [];
    for (const match of print.matchAll(/\S+/g)) {
      words.push({
        text: match[0],
        confidence: 0.95,
        box: {
          x: left + match.index * charWidth * scale,
          y,
          w: match[0].length * charWidth * scale,
          h: lineHeight * scale,
        },
      });
    }
    if (words.length > 0) lines.push({ words });
    y += lineHeight * scale * 1.4;
  }
  return {
    number,
    lines,
    text: lines.map((line) => line.words.map((word) => word.text).join(' ')).join('\n'),
    source: 'ocr',
    confidence: 0.95,
    blank: lines.length === 0,
    code: null,
    ...more,
  };
}

/** Several pages in order; an empty text is a blank page. */
export function pagesOfText(...texts: string[]): PageText[] {
  return texts.map((text, index) => pageOfText(text, index + 1));
}
