/** Which pages of a file make one paper. */
import { loadVocabulary } from '../classify/vocabulary.ts';
import type { Vocabulary } from '../classify/vocabulary.ts';
import { isWithinEdits } from '../facts/month-names.ts';
import type { PageText, PaperSpan } from '../types.ts';
import { findPageEvidence } from './page-evidence.ts';
import type { PageEvidence } from './page-evidence.ts';

const separatorCode = 'SLACKWATER:SEPARATOR';
/** A file of so many printed pages or fewer is one paper unless the pages say otherwise. */
const fewPages = 4;

/** Whether a page is a separator sheet; it belongs to no paper. */
export function isSeparator(page: PageText): boolean {
  return page.code?.startsWith(separatorCode) ?? false;
}

/**
 * Spans of pages, one for each paper, in order; separator sheets are in none, a blank page belongs to
 * the paper before it.
 */
export function splitPages(
  pages: readonly PageText[],
  vocabulary: Vocabulary = loadVocabulary(),
): PaperSpan[] {
  const spans: PaperSpan[] = [];
  const isDuplex = looksDuplex(pages);
  const printed = pages.filter((page) => !page.blank && !isSeparator(page)).length;
  let open: OpenPaper | null = null;
  for (const page of pages) {
    if (isSeparator(page)) {
      open = null;
      continue;
    }
    const last = spans.at(-1);
    if (page.blank && open && last) {
      last.to = page.number;
      open.lastWasBlank = true;
      continue;
    }
    const evidence = page.blank ? null : findPageEvidence(page, vocabulary);
    const isBack = isDuplex && page.number % 2 === 0;
    if (open && last && evidence) {
      const points = open.previous
        ? scoreBegin(evidence, open.previous, {
            isBack,
            afterBlank: open.lastWasBlank,
            isShort: printed <= fewPages,
          })
        : -1;
      if (points <= 0) {
        last.to = page.number;
        open = { previous: evidence, lastWasBlank: false };
        continue;
      }
    }
    spans.push({ from: page.number, to: page.number });
    open = { previous: evidence, lastWasBlank: page.blank };
  }
  return spans;
}

interface OpenPaper {
  previous: PageEvidence | null;
  lastWasBlank: boolean;
}

/** Both sides of every sheet were scanned: blank pages are there and all of them are backs. */
function looksDuplex(pages: readonly PageText[]): boolean {
  if (pages.some((page) => isSeparator(page))) return false;
  const blanks = pages.filter((page) => page.blank);
  return (
    blanks.length >= 2 && pages.length % 2 === 0 && blanks.every((page) => page.number % 2 === 0)
  );
}

interface PageSetting {
  isBack: boolean;
  afterBlank: boolean;
  isShort: boolean;
}

/** Above 0 the page begins a paper. Points set by hand, tried on piles mixed from single papers. */
export function scoreBegin(
  page: PageEvidence,
  previous: PageEvidence,
  setting: PageSetting,
): number {
  const base = setting.isShort ? -2 : -0.4;
  return (
    base +
    (setting.isBack ? -7 : 0) +
    (setting.afterBlank ? 1.6 : 0) +
    scoreMarkers(page, previous) +
    Math.min(page.firstPoints, 4) +
    (page.beginsMidway ? -2 : 0) +
    (page.isSparse && !previous.isSparse ? 1.2 : 0) +
    (previous.sendsOn ? -2 : 0) +
    scoreClauses(page, previous) +
    scoreLikeness(page, previous)
  );
}

function scoreMarkers(page: PageEvidence, previous: PageEvidence): number {
  const own = page.marker;
  const before = previous.marker;
  if (own) {
    if (own.page === 1) return own.of === null ? 3 : 6;
    const follows = before !== null && before.page + 1 === own.page && before.of === own.of;
    if (follows) return -8;
    if (before && before.page >= own.page) return 1;
    return -4.5;
  }
  if (!before || before.of === null) return 0;
  return before.page < before.of ? -3 : 2.5;
}

/** Numbered clauses that go on where the page before stopped. */
function scoreClauses(page: PageEvidence, previous: PageEvidence): number {
  if (page.firstClause === null || page.firstClause < 2) return 0;
  return previous.lastClause !== null && page.firstClause === previous.lastClause + 1 ? -3 : -0.5;
}

type HeadMatch = 'same' | 'same form' | 'different';

/** Whether the heads say the same, or the same with other figures. */
function compareHeads(page: PageEvidence, previous: PageEvidence): HeadMatch {
  let same = 0;
  let differ = 0;
  const own = page.head.filter((line) => line.words.length > 0);
  for (const line of own) {
    const twin = previous.head.find((other) => shareOf(line.words, other.words) >= 0.7);
    if (!twin) continue;
    same += 1;
    if (differInFigures(line.figures, twin.figures)) differ += 1;
  }
  if (own.length < 3 || same / own.length < 0.5 || !startsAlike(page, previous)) return 'different';
  return differ === 0 ? 'same' : 'same form';
}

/** The letterhead itself recurs, and not just the person to whom both papers went. */
function startsAlike(page: PageEvidence, previous: PageEvidence): boolean {
  const top = previous.head.slice(0, 4);
  return page.head
    .slice(0, 2)
    .some((line) => top.some((other) => shareOf(line.words, other.words) >= 0.7));
}

/** Long numbers may be misread in one place; short ones (months, numbers of statements) must agree. */
function differInFigures(figures: readonly string[], others: readonly string[]): boolean {
  if (figures.length === 0 || figures.length !== others.length) return false;
  return figures.some((figure, index) => {
    const other = others[index] ?? '';
    return figure.length >= 5 ? !isWithinEdits(figure, other, 1) : figure !== other;
  });
}

/** One head, one kind, one reference speak for one paper; the same form filled in anew for two. */
function scoreLikeness(page: PageEvidence, previous: PageEvidence): number {
  const heads = compareHeads(page, previous);
  if (heads === 'same form') return 1.5 + scoreLinks(page, previous, false);
  return (
    (heads === 'same' ? -3.5 : 0) + scoreKinds(page, previous) + scoreLinks(page, previous, true)
  );
}

/** Pages that look like different kinds of paper, or like one. */
function scoreKinds(page: PageEvidence, previous: PageEvidence): number {
  if (!page.kind) return -0.6;
  if (!previous.kind) return page.kind.confidence;
  if (page.kind.classId === previous.kind.classId) return page.hasSender ? -0.6 : -1.8;
  return 3 * Math.min(page.kind.confidence, previous.kind.confidence);
}

function shareOf(words: readonly string[], others: readonly string[]): number {
  if (words.length === 0 || others.length === 0) return 0;
  const known = new Set(others);
  const hits = words.filter((word) => known.has(word)).length;
  return (2 * hits) / (words.length + others.length);
}

function scoreLinks(page: PageEvidence, previous: PageEvidence, byName: boolean): number {
  let points = 0;
  if ([...page.brought].some((sum) => previous.carried.has(sum))) points -= 2.5;
  if (!byName) return points;
  if (page.footCode !== null && page.footCode === previous.footCode) points -= 1.5;
  if ([...page.references].some((reference) => previous.references.has(reference))) points -= 0.8;
  const isNamed = previous.issuer.length >= 8 && page.words.includes(` ${previous.issuer} `);
  if (isNamed && !page.hasSender) points -= 1.2;
  return points;
}
