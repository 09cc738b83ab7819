import { describe, expect, test } from 'vitest';
import type { SeenWord } from '../../../server/reading/pages/engine.ts';
import { mendSpacing } from '../../../server/reading/pages/spacing.ts';

/** A word whose letters are 10 pixels wide, with the white given before each of them. */
function seen(text: string, left: number, gaps: Record<number, number> = {}): SeenWord {
  let x = left;
  const symbols = [...text].map((letter, index) => {
    x += gaps[index] ?? 1;
    const symbol = { text: letter, left: x, right: x + 10 };
    x += 10;
    return symbol;
  });
  return { text, left, top: 0, width: x - left, height: 18, confidence: 0.9, line: '1', symbols };
}

const texts = (...words: SeenWord[]) => mendSpacing(words, 18).map((word) => word.text);

describe('the white between words', () => {
  test('parts what was run together where it is wide', () => {
    expect(texts(seen('sumtotal', 0, { 3: 12 }))).toEqual(['sum', 'total']);
  });

  test('joins what was torn apart where it is narrow', () => {
    expect(texts(seen('f', 0), seen('irm', 12))).toEqual(['firm']);
  });

  test('parts small words that no word is spelled like', () => {
    expect(texts(seen('ofthe', 0), seen('ofApril', 200))).toEqual(['of', 'the', 'of', 'April']);
    expect(texts(seen('atone', 0), seen('often', 200))).toEqual(['atone', 'often']);
  });
});
