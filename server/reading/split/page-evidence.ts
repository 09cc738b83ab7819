/** What a printed page shows of being the first of a paper, and of going on with the page before. */
import type { Candidate } from '../../contract/readings.ts';
import { classifyPaper } from '../classify/classify-paper.ts';
import { findTermHits } from '../classify/page-terms.ts';
import { splitTokens } from '../classify/tokens.ts';
import type { Vocabulary } from '../classify/vocabulary.ts';
import { findIssuer } from '../facts/issuer.ts';
import { findMrz } from '../facts/mrz.ts';
import { listPaperLines } from '../facts/paper-lines.ts';
import type { PaperLine } from '../facts/paper-lines.ts';
import type { PageText } from '../types.ts';
import { findPageMarker } from './page-marker.ts';
import type { PageMarker } from './page-marker.ts';

/** A line of a page's head: its words, and its figures without sums of money. */
export interface HeadLine {
  words: string[];
  figures: string[];
}

export interface PageEvidence {
  marker: PageMarker | null;
  /** Points for a first page that it shows by itself, and what gave them. */
  firstPoints: number;
  /** A sender's address or numbers stand at the top. */
  hasSender: boolean;
  /** The issuer's name as words, and all words of the page, to see whether a page names another's issuer. */
  issuer: string;
  words: string;
  /** Hardly any words: a card, a picture, a ticket. */
  isSparse: boolean;
  /** Begins in the middle of a sentence or of numbered clauses. */
  beginsMidway: boolean;
  /** The last printed words send the reader on: "continued overleaf". */
  sendsOn: boolean;
  /** Number of the last clause that begins a line, null without one. */
  lastClause: number | null;
  firstClause: number | null;
  /** The first lines of the page, without its own number. */
  head: HeadLine[];
  /** What kind of paper the page alone looks like, null when it does not show it. */
  kind: { classId: Candidate['class']; confidence: number } | null;
  /** Form number or print code at the foot, without its page part. */
  footCode: string | null;
  /** Account numbers and the like, letters and digits only. */
  references: Set<string>;
  /** Sums carried to the next page, and brought from the one before. */
  carried: Set<string>;
  brought: Set<string>;
}

const postal =
  /\b[A-Z]{1,2}\d[A-Z\d]?\s?\d[A-Z]{2}\b|\b[A-Z]{2}\.?\s\d{5}(?:-\d{4})?\b|\b[A-Z]\d[A-Z]\s?\d[A-Z]\d\b|\b(?:NSW|VIC|QLD|SA|WA|TAS|ACT|NT)\s\d{4}\b|\b[A-Z]\d{2}\s[A-Z0-9]{4}\b|(?:^|, )\d{5}\s[A-ZÄÖÜ][a-zäöü]{2}/m;
const contact =
  /\b(?:tel|phone|telephone|fax|email)\b|www\.|@|\bhttps?:|\(?\d{3}\)?[ -]\d{3}-\d{4}|\b0\d{4}\s\d{6}\b|\b0\d{3}\s\d{3}\s\d{4}\b|\b1[38]00\s\d{3}\s\d{3}\b/i;
const salutation = /^(?:dear|to whom it may concern|sehr geehrte)\b/i;
const addressee = /^(?:mr|mrs|ms|miss|mx|dr|messrs|the executors? of|estate of)\b\.?\s+\S/i;
const dateLike =
  /\b(?:\d{1,2}[./-]\d{1,2}[./-]\d{2,4}|\d{1,2}(?:st|nd|rd|th)?\s+[A-Z][a-z]{2,8}\.?,?\s+\d{4}|[A-Z][a-z]{2,8}\.?\s+\d{1,2},?\s+\d{4}|\d{4}-\d{2}-\d{2})\b/;
const midway = /^(?:[a-z]{2,}|\(?[b-h]\)\s|\(?(?:ii|iii|iv|v)\)\s)/;
const clause = /^(?:section |clause |part )?(\d{1,2})(?:\.\d{1,2})*[.)]?\s+[A-Z(]/i;
const onwards =
  /\b(?:continued(?: overleaf| on (?:the )?(?:next|page))?|please turn over|turn over|see over(?:leaf)?|p\.?t\.?o\.?|carried forward|over\s*(?:>|→))\W*$/i;
const money = /\d{1,3}(?:,\d{3})*\.\d{2}\b/g;

function listReferences(lines: readonly PaperLine[]): Set<string> {
  const references = new Set<string>();
  for (const line of lines) {
    for (const token of line.text.match(/\b[A-Z0-9][A-Z0-9/-]{4,}\b/g) ?? []) {
      const plain = token.replace(/[^A-Z0-9]/g, '');
      const digits = plain.replace(/\D/g, '').length;
      if (digits >= 4 && plain.length >= 5 && !/^(?:19|20)\d{2}/.test(plain)) references.add(plain);
    }
  }
  return references;
}

function listSums(lines: readonly PaperLine[], pattern: RegExp): Set<string> {
  const sums = new Set<string>();
  for (const line of lines) {
    if (pattern.test(line.text)) for (const sum of line.text.match(money) ?? []) sums.add(sum);
  }
  return sums;
}

function listTop(lines: readonly PaperLine[]): PaperLine[] {
  return lines.filter((line, order) => line.box.y < 0.3 || order < 5);
}

function scoreFirst(lines: readonly PaperLine[], vocabulary: Vocabulary): number {
  const top = listTop(lines);
  const upper = lines.filter((line, order) => line.box.y < 0.5 || order < 8);
  const topText = top.map((line) => line.text).join('\n');
  let points = 0;
  if (upper.some((line) => salutation.test(line.text))) points += 1.5;
  if (upper.some((line) => addressee.test(line.text))) points += 0.6;
  if (postal.test(topText)) points += 0.8;
  if (contact.test(topText)) points += 0.6;
  if (dateLike.test(topText)) points += 0.5;
  if (top.some((line) => line.relativeHeight >= 1.6 && /[A-Za-z]{4}/.test(line.text)))
    points += 0.7;
  const titles = findTermHits(top, vocabulary).filter(
    (hit) => hit.term.tier === 'title' && hit.inTitle && hit.term.tokens.length >= 2,
  );
  if (titles.length > 0) points += 1.2;
  return points;
}

function listClauses(lines: readonly PaperLine[]): number[] {
  return lines
    .map((line) => Number(clause.exec(line.text)?.[1] ?? Number.NaN))
    .filter((number) => number >= 1 && number <= 40);
}

function findFootCode(lines: readonly PaperLine[]): string | null {
  for (const line of lines.slice(-3).reverse()) {
    const match = /\b([A-Z]{2,}[A-Z0-9]*[ -]?[A-Z]{0,3}\/?\d{1,5})\b/.exec(line.text);
    if (match?.[1]) return match[1].replace(/[^A-Z0-9]/g, '').replace(/O/g, '0');
  }
  return null;
}

function listHead(texts: readonly string[]): HeadLine[] {
  return texts
    .slice(0, 9)
    .filter((text) => findPageMarker([text]) === null)
    .map((text) => {
      const tokens = splitTokens(text.replace(money, ' '));
      return {
        words: tokens.filter((token) => !/\d/.test(token)),
        figures: tokens.filter((token) => /\d/.test(token)),
      };
    });
}

function findKind(lines: readonly PaperLine[], vocabulary: Vocabulary): PageEvidence['kind'] {
  const mrz = findMrz(lines.map((line) => line.text));
  const cues = { mrz, isOwnBusiness: false, isToBusiness: false };
  const [best] = classifyPaper(lines, cues, vocabulary).candidates;
  return best && best.confidence >= 0.2
    ? { classId: best.class, confidence: best.confidence }
    : null;
}

/** Reads the evidence of one printed page. */
export function findPageEvidence(page: PageText, vocabulary: Vocabulary): PageEvidence {
  const lines = listPaperLines([page]);
  const texts = lines.map((line) => line.text);
  const clauses = listClauses(lines);
  const topText = listTop(lines)
    .map((line) => line.text)
    .join('\n');
  const firstText = texts.find((text) => text.replace(/[^A-Za-z]/g, '').length >= 3) ?? '';
  return {
    marker: findPageMarker(texts),
    firstPoints: scoreFirst(lines, vocabulary),
    hasSender: postal.test(topText) || contact.test(topText),
    issuer: splitTokens(findIssuer(lines)?.value ?? '').join(' '),
    words: ` ${splitTokens(page.text).join(' ')} `,
    isSparse: lines.reduce((sum, line) => sum + line.words.length, 0) < 40,
    beginsMidway: midway.test(firstText),
    sendsOn: texts.slice(-3).some((text) => onwards.test(text)),
    lastClause: clauses.at(-1) ?? null,
    firstClause: clauses[0] ?? null,
    head: listHead(texts),
    kind: findKind(lines, vocabulary),
    footCode: findFootCode(lines),
    references: listReferences(lines),
    carried: listSums(lines.slice(-8), /carried|forward|balance|total|c\/f/i),
    brought: listSums(lines.slice(0, 14), /brought|forward|balance|previous|b\/f/i),
  };
}
