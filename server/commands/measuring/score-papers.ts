/** What the reader made of the samples, beside what they are. */
import { requireClass } from '../../contract/document-classes.ts';
import type { PageText, PaperReading } from '../../reading/types.ts';
import { Tally } from './tally.ts';
import type { TruePaper, TrueStack } from './truth.ts';
import { countFound, listWords } from './words.ts';

export interface Scores {
  classes: Tally;
  groups: Tally;
  countries: Tally;
  keyDates: Tally;
  expiries: Tally;
  words: Tally;
  /** Papers by how sure the reader was: `0.8` and so on, for the reliability table. */
  reliability: Tally;
  sure: { right: number; of: number; all: number };
  boundaries: { right: number; found: number; wanted: number };
  /** One line for each wrong answer. */
  mistakes: string[];
}

export function startScores(): Scores {
  return {
    classes: new Tally(),
    groups: new Tally(),
    countries: new Tally(),
    keyDates: new Tally(),
    expiries: new Tally(),
    words: new Tally(),
    reliability: new Tally(),
    sure: { right: 0, of: 0, all: 0 },
    boundaries: { right: 0, found: 0, wanted: 0 },
    mistakes: [],
  };
}

/** Scores class, country, key date and expiry of one paper; `reading` is null when it was not found. */
export function scorePaper(
  scores: Scores,
  name: string,
  quality: string,
  paper: Pick<TruePaper, 'class' | 'country' | 'keyDate' | 'dates'>,
  reading: PaperReading | null,
): void {
  const isRight = reading?.class === paper.class;
  scores.classes.add(quality, isRight ? 1 : 0, 1);
  scores.groups.add(findGroup(paper.class), isRight ? 1 : 0, 1);
  const confidence = reading?.confidence ?? 0;
  if (paper.class !== 'unrecognised') {
    scores.sure.all++;
    if (confidence >= 0.8) {
      scores.sure.of++;
      if (isRight) scores.sure.right++;
    }
    scores.reliability.add(
      (Math.floor(Math.min(confidence, 0.99) * 10) / 10).toFixed(1),
      isRight ? 1 : 0,
      1,
    );
  }
  if (!isRight) {
    scores.mistakes.push(
      `${name}: ${paper.class}, read as ${reading?.class ?? 'nothing'} (${confidence.toFixed(2)})`,
    );
  }
  if (paper.class === 'unrecognised') return;
  const sameCountry = reading?.country === paper.country;
  scores.countries.add(paper.country, sameCountry ? 1 : 0, 1);
  if (!sameCountry) {
    scores.mistakes.push(`${name}: country ${paper.country}, read ${reading?.country ?? 'none'}`);
  }
  const keyDate = reading?.facts.keyDate ?? null;
  const sameDate = keyDate === (paper.keyDate ?? null);
  scores.keyDates.add(quality, sameDate ? 1 : 0, 1);
  if (!sameDate) {
    scores.mistakes.push(
      `${name}: ${paper.class}, key date ${paper.keyDate ?? 'none'}, read ${keyDate ?? 'none'}`,
    );
  }
  if (findGroup(paper.class) === 'identity' && paper.dates?.expiry) {
    const read = reading?.facts.dates.expiry?.value;
    scores.expiries.add('identity papers', read === paper.dates.expiry ? 1 : 0, 1);
  }
}

function findGroup(classId: string): string {
  try {
    return requireClass(classId).group;
  } catch {
    return 'unknown';
  }
}

/** Scores the words of one paper, handwriting left out. */
export function scoreWords(
  scores: Scores,
  quality: string,
  paper: Pick<TruePaper, 'handwritten' | 'text'>,
  pages: PageText[],
): void {
  if (paper.handwritten || !paper.text) return;
  const wanted = listWords(paper.text.flat().join(' '));
  const found = listWords(pages.map((page) => page.text).join(' '));
  scores.words.add(quality, countFound(wanted, found), wanted.length);
}

/** Scores where a pile was split: a boundary is the first page of a paper, the pile's first page left out. */
export function scoreBoundaries(scores: Scores, stack: TrueStack, readings: PaperReading[]): void {
  const wanted = new Set(stack.documents.map((paper) => paper.from).filter((page) => page > 1));
  const found = new Set(readings.map((paper) => paper.from).filter((page) => page > 1));
  const right = [...found].filter((page) => wanted.has(page)).length;
  scores.boundaries.right += right;
  scores.boundaries.found += found.size;
  scores.boundaries.wanted += wanted.size;
  for (const page of found) {
    if (!wanted.has(page)) scores.mistakes.push(`${stack.file}: split before page ${page}`);
  }
  for (const page of wanted) {
    if (!found.has(page)) scores.mistakes.push(`${stack.file}: not split before page ${page}`);
  }
}
