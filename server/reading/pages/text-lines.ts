/** From words with places to lines of print in reading order. */
import type { Word } from '../../contract/readings.ts';
import type { TextLine } from '../types.ts';

/**
 * Puts words on one level into one line, left to right, and lines from top to bottom. Columns run
 * together, so that a label and the value printed beside it stay on one line.
 */
export function assembleLines(words: Word[]): TextLine[] {
  const sorted = [...words].sort((a, b) => middle(a) - middle(b));
  const lines: { words: Word[]; middle: number; height: number }[] = [];
  for (const word of sorted) {
    let best: (typeof lines)[number] | null = null;
    let bestGap = Infinity;
    for (let i = lines.length - 1; i >= 0 && i >= lines.length - 6; i--) {
      const line = lines[i]!;
      const gap = Math.abs(middle(word) - line.middle);
      const room = Math.min(line.height, word.box.h) * 0.5;
      if (gap < room && gap < bestGap && !isTaken(line.words, word)) [best, bestGap] = [line, gap];
    }
    if (best) {
      best.words.push(word);
      const count = best.words.length;
      best.middle += (middle(word) - best.middle) / count;
      best.height += (word.box.h - best.height) / count;
    } else {
      lines.push({ words: [word], middle: middle(word), height: word.box.h });
    }
  }
  lines.sort((a, b) => a.middle - b.middle);
  return lines.map((line) => ({ words: line.words.sort((a, b) => a.box.x - b.box.x) }));
}

/** Lines joined by newlines, words by single spaces. */
export function joinLines(lines: TextLine[]): string {
  return lines.map((line) => line.words.map((word) => word.text).join(' ')).join('\n');
}

/** Mean confidence over words, longer words counting more; 0 without words. */
export function meanConfidence(words: Word[]): number {
  let sum = 0;
  let weight = 0;
  for (const word of words) {
    sum += word.confidence * word.text.length;
    weight += word.text.length;
  }
  return weight === 0 ? 0 : sum / weight;
}

function middle(word: Word): number {
  return word.box.y + word.box.h / 2;
}

/** A word that would lie on top of another of the line belongs to a line of its own. */
function isTaken(words: Word[], word: Word): boolean {
  return words.some((other) => {
    const overlap =
      Math.min(other.box.x + other.box.w, word.box.x + word.box.w) -
      Math.max(other.box.x, word.box.x);
    return overlap > 0.5 * Math.min(other.box.w, word.box.w);
  });
}
