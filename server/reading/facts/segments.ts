/** Columns that a reader of letters ran together into one line, taken apart at wide gaps. */
import type { Box } from '../../contract/readings.ts';
import { findMedian, uniteBoxes } from './paper-lines.ts';
import type { PaperLine } from './paper-lines.ts';

export interface Segment {
  line: PaperLine;
  text: string;
  start: number;
  end: number;
  box: Box;
  relativeHeight: number;
}

/** Stretches of a line between gaps wider than `gap` of the page's width (default 3.5 %). */
export function splitSegments(line: PaperLine, gap = 0.035): Segment[] {
  const segments: Segment[] = [];
  let from = 0;
  for (let index = 1; index <= line.words.length; index += 1) {
    const previous = line.words[index - 1];
    const word = line.words[index];
    if (!previous) continue;
    const isBreak = word === undefined || word.box.x - (previous.box.x + previous.box.w) > gap;
    if (!isBreak) continue;
    const words = line.words.slice(from, index);
    const start = line.starts[from] ?? 0;
    const end = (line.starts[index - 1] ?? 0) + previous.text.length;
    const lineHeight = findMedian(line.words.map((item) => item.box.h));
    const height = findMedian(words.map((item) => item.box.h));
    segments.push({
      line,
      text: line.text.slice(start, end),
      start,
      end,
      box: uniteBoxes(words.map((item) => item.box)),
      relativeHeight: lineHeight > 0 ? (line.relativeHeight * height) / lineHeight : 1,
    });
    from = index;
  }
  return segments;
}
