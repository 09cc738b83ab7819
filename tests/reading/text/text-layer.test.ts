import { describe, expect, test } from 'vitest';
import type { Word } from '../../../server/contract/readings.ts';
import type { Pixels } from '../../../server/reading/pages/raster.ts';
import { isSoundLayer, shareCovered } from '../../../server/reading/pages/text-layer.ts';

const width = 800;
const height = 1120;
const sentence =
  'The tenant pays rent on the first day of every month and keeps garden and house in order'.split(
    ' ',
  );

function place(text: string, index: number): Word {
  return {
    text,
    confidence: 1,
    box: { x: 0.1 + (index % 6) * 0.13, y: 0.1 + Math.floor(index / 6) * 0.05, w: 0.1, h: 0.02 },
  };
}

/** A white page with bars like print under the words given. */
function printUnder(words: Word[]): Pixels {
  const data = new Uint8Array(width * height).fill(255);
  for (const { box } of words) {
    for (let y = Math.ceil(box.y * height); y < (box.y + box.h) * height - 1; y++) {
      for (let x = Math.ceil(box.x * width); x < (box.x + box.w) * width - 1; x++) {
        if (x % 5 < 2) data[y * width + x] = 10;
      }
    }
  }
  return { width, height, channels: 1, data };
}

const words = sentence.map(place);
const page = printUnder(words);

describe('a text layer', () => {
  test('is believed where print stands under its words', () => {
    expect(isSoundLayer(words, page)).toBe(true);
    expect(shareCovered(words, page)).toBeGreaterThan(0.9);
  });

  test('is not believed when it is hidden on an empty place', () => {
    const moved = words.map((word) => ({ ...word, box: { ...word.box, y: word.box.y + 0.5 } }));
    expect(isSoundLayer(moved, page)).toBe(false);
  });

  test('is not believed when its letters are scrambled', () => {
    const scrambled = words.map((word) => ({ ...word, text: 'xkzrtpq'.slice(0, 6) }));
    expect(isSoundLayer(scrambled, page)).toBe(false);
  });

  test('is not believed when its letters have no meaning', () => {
    const broken = words.map((word) => ({ ...word, text: `\uFFFD${word.text}\uE001` }));
    expect(isSoundLayer(broken, page)).toBe(false);
  });

  test('is not believed when it is one line of a page full of print', () => {
    const full = Array.from({ length: 100 }, (_, index) => place('word', index));
    expect(isSoundLayer(words.slice(0, 5), printUnder(full))).toBe(false);
  });

  test('is not believed when it has hardly any words', () => {
    expect(isSoundLayer(words.slice(0, 2), page)).toBe(false);
  });
});
