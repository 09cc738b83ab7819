/** The lines of a paper as the fact finders see them: plain text, words with places, page within the paper. */
import type { Box, PlaceOnPage, Word } from '../../contract/readings.ts';
import type { PageText } from '../types.ts';

export interface PaperLine {
  /** Page within the paper, from 1. */
  page: number;
  /** Number of the line within the paper, from 0. */
  index: number;
  words: Word[];
  /** Words joined by single spaces. */
  text: string;
  /** Where each word begins in `text`. */
  starts: number[];
  box: Box;
  /** Height of the line against the median line of the paper; 1 is ordinary print. */
  relativeHeight: number;
}

/** The smallest rectangle round all of them; an empty list gives an empty rectangle. */
export function uniteBoxes(boxes: readonly Box[]): Box {
  if (boxes.length === 0) return { x: 0, y: 0, w: 0, h: 0 };
  const x = Math.min(...boxes.map((b) => b.x));
  const y = Math.min(...boxes.map((b) => b.y));
  const right = Math.max(...boxes.map((b) => b.x + b.w));
  const bottom = Math.max(...boxes.map((b) => b.y + b.h));
  return { x, y, w: right - x, h: bottom - y };
}

/** The middle value; 0 for an empty list. */
export function findMedian(values: readonly number[]): number {
  if (values.length === 0) return 0;
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? 0;
}

/** All lines of a paper's pages in reading order; empty lines are left out. */
export function listPaperLines(pages: readonly PageText[]): PaperLine[] {
  const lines: PaperLine[] = [];
  pages.forEach((page, pageIndex) => {
    for (const line of page.lines) {
      const words = line.words.filter((word) => word.text.trim() !== '');
      if (words.length === 0) continue;
      const starts: number[] = [];
      let text = '';
      for (const word of words) {
        if (text !== '') text += ' ';
        starts.push(text.length);
        text += word.text;
      }
      lines.push({
        page: pageIndex + 1,
        index: lines.length,
        words,
        text,
        starts,
        box: uniteBoxes(words.map((word) => word.box)),
        relativeHeight: 1,
      });
    }
  });
  const heights = lines.map((line) => findMedian(line.words.map((word) => word.box.h)));
  const usual = findMedian(heights.filter((height) => height > 0));
  lines.forEach((line, index) => {
    const height = heights[index] ?? 0;
    line.relativeHeight = usual > 0 && height > 0 ? height / usual : 1;
  });
  return lines;
}

/** The words of a line that a stretch of its text touches. */
export function wordsBetween(line: PaperLine, start: number, end: number): Word[] {
  return line.words.filter((word, index) => {
    const from = line.starts[index] ?? 0;
    return from < end && from + word.text.length > start;
  });
}

/** Where a stretch of a line's text stands on the page. */
export function placeOf(line: PaperLine, start: number, end: number): PlaceOnPage {
  return {
    page: line.page,
    box: uniteBoxes(wordsBetween(line, start, end).map((word) => word.box)),
  };
}

/** How sure the reader of the letters was of a stretch, 0 to 1. */
export function letterConfidence(line: PaperLine, start: number, end: number): number {
  const words = wordsBetween(line, start, end);
  if (words.length === 0) return 0;
  return words.reduce((sum, word) => sum + word.confidence, 0) / words.length;
}
