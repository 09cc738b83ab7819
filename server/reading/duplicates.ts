/** Papers of a household that are one paper twice: scanned again, photographed, printed and as a PDF. Pure. */
import type { IsoDate } from '../contract/dates.ts';
import { splitTokens } from './classify/tokens.ts';

export interface ComparedPaper {
  id: string;
  text: string;
  keyDate: IsoDate | null;
  /** All days that the paper is known to show, the key date among them. */
  dates: readonly IsoDate[];
  reference: string | null;
  /** How sure the reader of letters was, 0 to 1; 1 for a text layer. */
  legibility: number;
}

export interface DuplicatePair {
  /** The copy worth keeping: the more legible, else the fuller, else the one that was there first. */
  better: string;
  other: string;
  /** 0 to 1. */
  likeness: number;
}

/** Set on pairs of invented papers: the same bill of another month stays under it. */
const leastLikeness = 0.72;
const leastFigures = 0.6;
/** What is asked when one of two copies may have been read with the wrong date for its key date. */
const leastInDoubt = 0.9;
const fewestTokens = 12;

interface Prints {
  paper: ComparedPaper;
  order: number;
  words: Map<string, number>;
  figures: Map<string, number>;
  wordCount: number;
  figureCount: number;
}

function takePrints(paper: ComparedPaper, order: number): Prints {
  const words = new Map<string, number>();
  const figures = new Map<string, number>();
  let wordCount = 0;
  let figureCount = 0;
  // A sum or a number counts as one figure: 1,204.11 and 12-34-56 are not their parts.
  const text = paper.text.replace(/(?<=\d)[.,/:-](?=\d)/g, '');
  for (const token of splitTokens(text)) {
    const isFigure = /\d{2}/.test(token);
    if (!isFigure && token.length < 3) continue;
    const bag = isFigure ? figures : words;
    bag.set(token, (bag.get(token) ?? 0) + 1);
    if (isFigure) figureCount += 1;
    else wordCount += 1;
  }
  return { paper, order, words, figures, wordCount, figureCount };
}

/** Twice the shared tokens over all tokens; 1 for the same bag, 0 for nothing shared. */
function compareBags(
  a: ReadonlyMap<string, number>,
  b: ReadonlyMap<string, number>,
  total: number,
): number {
  let shared = 0;
  for (const [token, count] of a) shared += Math.min(count, b.get(token) ?? 0);
  return total === 0 ? 0 : (2 * shared) / total;
}

function sameReference(a: string | null, b: string | null): boolean {
  const plain = (text: string | null) => (text ?? '').replace(/[^A-Za-z0-9]/g, '').toLowerCase();
  return plain(a).length >= 4 && plain(a) === plain(b);
}

/** Doubtful: the key date of one is another date of the other, as when a copy lacks a line. */
function compareDates(
  a: ComparedPaper,
  b: ComparedPaper,
): 'same' | 'open' | 'doubtful' | 'conflict' {
  if (a.keyDate === null || b.keyDate === null) return 'open';
  if (a.keyDate === b.keyDate) return 'same';
  const isShown = a.dates.includes(b.keyDate) || b.dates.includes(a.keyDate);
  return isShown ? 'doubtful' : 'conflict';
}

/** How alike two papers are, 0 when their dates say that they are two. */
function compare(a: Prints, b: Prints): number {
  if (a.wordCount + a.figureCount < fewestTokens) return 0;
  if (b.wordCount + b.figureCount < fewestTokens) return 0;
  const { paper: first } = a;
  const { paper: second } = b;
  const dates = compareDates(first, second);
  if (dates === 'conflict') return 0;
  const words = compareBags(a.words, b.words, a.wordCount + b.wordCount);
  if (words < 0.5) return 0;
  const hasFigures = Math.min(a.figureCount, b.figureCount) >= 3;
  const figures = hasFigures ? compareBags(a.figures, b.figures, a.figureCount + b.figureCount) : 0;
  const bonus =
    (sameReference(first.reference, second.reference) ? 0.05 : 0) + (dates === 'same' ? 0.05 : 0);
  if (!hasFigures) return words >= 0.9 ? Math.min(1, words) : 0;
  if (figures + bonus < leastFigures) return 0;
  const likeness = Math.min(1, 0.5 * words + 0.5 * figures + bonus);
  return dates === 'doubtful' && likeness < leastInDoubt ? 0 : likeness;
}

function chooseBetter(a: Prints, b: Prints): [Prints, Prints] {
  const gap = a.paper.legibility - b.paper.legibility;
  if (Math.abs(gap) > 0.02) return gap > 0 ? [a, b] : [b, a];
  const size = a.wordCount + a.figureCount - (b.wordCount + b.figureCount);
  if (Math.abs(size) > 3) return size > 0 ? [a, b] : [b, a];
  return a.order < b.order ? [a, b] : [b, a];
}

/**
 * Pairs of papers that are likely the same, likeliest first. Papers with different key dates are never a
 * pair, so neither the bills of two months nor this year's policy and the last are.
 */
export function findDuplicates(papers: readonly ComparedPaper[]): DuplicatePair[] {
  const prints = papers.map((paper, order) => takePrints(paper, order));
  const pairs: DuplicatePair[] = [];
  prints.forEach((first, index) => {
    for (const second of prints.slice(index + 1)) {
      const likeness = compare(first, second);
      if (likeness < leastLikeness) continue;
      const [better, other] = chooseBetter(first, second);
      pairs.push({
        better: better.paper.id,
        other: other.paper.id,
        likeness: Math.round(likeness * 1000) / 1000,
      });
    }
  });
  return pairs.sort((a, b) => b.likeness - a.likeness);
}
