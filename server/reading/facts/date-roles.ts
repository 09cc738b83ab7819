/** Gives each printed date its role from the words beside, before or above it. */
import type { Box } from '../../contract/readings.ts';
import { findDateLabels } from './date-labels.ts';
import type { DateLabel, LabelRole } from './date-labels.ts';
import { parseDates } from './parse-dates.ts';
import type { DateReadingOptions, PrintedDate } from './parse-dates.ts';
import { placeOf } from './paper-lines.ts';
import type { PaperLine } from './paper-lines.ts';

export interface RoledDate extends PrintedDate {
  line: PaperLine;
  box: Box;
  role: LabelRole | null;
  /** How plainly the role was named, 0 to about 1; 0 without a label. */
  strength: number;
  /** The label as printed, null without one. */
  label: string | null;
  /** Whether the line holds hardly more than the date. */
  alone: boolean;
  /** Whether it opens one row of a table of dated entries. */
  isRow: boolean;
}

interface LabelSpot extends DateLabel {
  line: PaperLine;
  box: Box;
  text: string;
}

function overlap(aFrom: number, aTo: number, bFrom: number, bTo: number): number {
  return Math.min(aTo, bTo) - Math.max(aFrom, bFrom);
}

/** The label nearest before the date on its own line, with no other date between. */
function scoreSameLine(date: RoledDate, label: LabelSpot, dates: readonly RoledDate[]): number {
  if (label.end > date.start) return 0;
  const between = dates.some((other) => other.start >= label.end && other.end <= date.start);
  const gapText = date.line.text.slice(label.end, date.start);
  const gap = gapText.replace(/[\s:.-]/g, '').length;
  if (between || gap > (label.isNear ? 2 : 45)) return 0;
  const isProse = label.role === 'issued' && isInProse(date, label);
  return label.strength - gap * 0.02 - (isProse ? 0.4 : 0);
}

/** Whether the label stands inside a sentence: "the agreement dated 2 March, and that neither". */
function isInProse(date: RoledDate, label: LabelSpot): boolean {
  const lead = date.line.text.slice(0, label.start).trim().split(/\s+/);
  const small = lead.filter((word) => /^[a-z]{2,}/.test(word)).length;
  const tail = date.line.text.slice(date.end).trim();
  return small >= 3 || (lead.length >= 2 && /^[,;]?\s*[a-z]{2,}\s[a-z]{2,}/.test(tail));
}

/** A label further left on the same level, or above in the same column. */
function scoreByPlace(date: RoledDate, label: LabelSpot): number {
  if (label.line.page !== date.line.page || label.isNear) return 0;
  const height = Math.max(label.box.h, date.box.h, 0.006);
  const sameLevel =
    overlap(label.box.y, label.box.y + label.box.h, date.box.y, date.box.y + date.box.h) >
    0.4 * Math.min(label.box.h, date.box.h);
  if (sameLevel && label.line.index !== date.line.index) {
    const gap = date.box.x - (label.box.x + label.box.w);
    if (gap < -0.01 || gap > 0.5) return 0;
    return label.strength * 0.97 - gap * 0.6;
  }
  const dateX = findColumnEdge(date);
  const drop = date.box.y - (label.box.y + label.box.h);
  if (drop < -0.3 * height || drop > 2.4 * height) return 0;
  const shared = overlap(label.box.x, label.box.x + label.box.w, dateX, date.box.x + date.box.w);
  const leftEdges = Math.abs(label.box.x - dateX);
  if (shared <= 0 && leftEdges > 0.02) return 0;
  const weak = label.end - label.start <= 4 && label.strength < 1 ? 0.1 : 0;
  return label.strength * 0.85 - Math.max(drop, 0) * 3 - Math.min(leftEdges, 0.2) * 0.6 - weak;
}

/** "Midnight on 30 June" hangs under its label with its first word. */
function findColumnEdge(date: RoledDate): number {
  const lead = date.line.text.slice(0, date.start);
  const isShort = /^(?:\d{1,2}[:.]\d{2}\s*)?(?:midnight|noon|hours|hrs|[ap]m|on|at|\s)+$/i.test(
    lead,
  );
  return isShort ? date.line.box.x : date.box.x;
}

/** A label at the end of the line before, when the date begins its line (running text). */
function scoreWrapped(date: RoledDate, label: LabelSpot): number {
  if (label.line.index !== date.line.index - 1) return 0;
  const lead = date.line.text.slice(0, date.start);
  if (date.start > 2 && !/^[£$€]\s?[\d,.]+\s*$/.test(lead)) return 0;
  const rest = label.line.text.length - label.end;
  return rest <= 3 ? label.strength * 0.9 : 0;
}

/** All dates of a paper with their roles, in reading order. */
export function findRoledDates(
  lines: readonly PaperLine[],
  options: DateReadingOptions,
): RoledDate[] {
  const byLine = lines.map((line, index) => findLineDates(line, lines[index + 1], options));
  const labels: LabelSpot[] = lines.flatMap((line) =>
    findDateLabels(line.text).map((label) => ({
      ...label,
      line,
      text: line.text.slice(label.start, label.end),
      box: placeOf(line, label.start, label.end).box,
    })),
  );
  const labelsByPage = new Map<number, LabelSpot[]>();
  for (const label of labels) {
    const list = labelsByPage.get(label.line.page) ?? [];
    list.push(label);
    labelsByPage.set(label.line.page, list);
  }
  markRows(lines, byLine);
  for (const dates of byLine) {
    for (const date of dates) {
      assignRole(date, labelsByPage.get(date.line.page) ?? [], dates);
    }
    joinPairs(dates);
    splitColumns(dates);
  }
  return byLine.flat();
}

/** Lines that open with a date and carry figures, two or more near each other, are entries of a table. */
function markRows(lines: readonly PaperLine[], byLine: readonly RoledDate[][]): void {
  const opens = byLine.map((dates, index) => {
    const [first] = dates;
    const text = lines[index]?.text ?? '';
    return first !== undefined && first.start <= 3 && text.length - first.end > 8;
  });
  byLine.forEach((dates, index) => {
    const near = [index - 2, index - 1, index + 1, index + 2].some((other) => opens[other]);
    for (const date of dates) date.isRow = (opens[index] ?? false) && near;
  });
}

function assignRole(
  date: RoledDate,
  labels: readonly LabelSpot[],
  sameLine: readonly RoledDate[],
): void {
  for (const label of labels) {
    if (Math.abs(label.line.index - date.line.index) > 60) continue;
    if (isInsideDate(label, sameLine)) continue;
    const score =
      label.line.index === date.line.index
        ? scoreSameLine(date, label, sameLine)
        : Math.max(scoreByPlace(date, label), scoreWrapped(date, label));
    if (score > date.strength && score > 0.2) {
      const isOther = namesAnotherPaper(label);
      date.strength = isOther ? Math.max(score, 0.6) : score;
      date.role = isOther ? 'other' : label.role;
      date.label = label.text;
    }
  }
}

const otherPaper =
  /(?:^|\s)(?:the|my|your|our|an?|said|by|under|in|separation|tenancy|registered|previous|former)\s+(?:agreement|will|lease|deed|letter|order|charge|mortgage|contract|policy|transfer|conveyance|codicil)s?\s+(?:dated|made on|of)$/i;

/** "the agreement dated 2 March 1993": the day of a paper that this one speaks of. */
function namesAnotherPaper(label: LabelSpot): boolean {
  return otherPaper.test(label.line.text.slice(0, label.end).trim());
}

function isInsideDate(label: LabelSpot, dates: readonly RoledDate[]): boolean {
  return dates.some(
    (date) =>
      date.line.index === label.line.index && label.start >= date.start && label.end <= date.end,
  );
}

function findLineDates(
  line: PaperLine,
  next: PaperLine | undefined,
  options: DateReadingOptions,
): RoledDate[] {
  const own = parseDates(line.text, options);
  const dates: PrintedDate[] = [...own];
  if (
    next &&
    next.page === line.page &&
    /(?:\d(?:st|nd|rd|th)?|of|[a-z]{3,9},?|and|year)$/i.test(line.text)
  ) {
    const tail = line.text.slice(-60);
    const base = line.text.length - tail.length;
    const joined = `${tail} ${next.text.slice(0, 60)}`;
    for (const found of parseDates(joined, options)) {
      const straddles = found.start < tail.length && found.end > tail.length + 1;
      const start = found.start + base;
      if (!straddles || own.some((date) => date.end > start && date.precision === 'day')) continue;
      if (found.precision !== 'day') continue;
      dates.push({ ...found, start, end: line.text.length });
    }
  }
  return dates.map((date) => ({
    ...date,
    line,
    box: placeOf(line, date.start, date.end).box,
    role: null,
    strength: 0,
    label: null,
    alone: line.text.length - (date.end - date.start) <= 14,
    isRow: false,
  }));
}

/** Two dates side by side under one heading for a term: the later one is its end. */
function splitColumns(dates: RoledDate[]): void {
  const [first, second] = dates;
  if (!first || !second || second.range !== null || first.value >= second.value) return;
  if (first.role === 'periodStart' && second.role === 'periodStart') {
    second.role = 'periodEnd';
    first.range = 'from';
    second.range = 'to';
  }
}

/** Two dates with a joining word between them are the ends of a period. */
function joinPairs(dates: RoledDate[]): void {
  for (let index = 0; index + 1 < dates.length; index += 1) {
    const first = dates[index];
    const second = dates[index + 1];
    if (!first || !second || first.value > second.value) continue;
    const between = first.line.text.slice(first.end, second.start);
    const joined =
      /^[\s,.;]*(?:\d{1,2}[:.]\d{2}\s*(?:a\.?m\.?|p\.?m\.?)?\s*)?(?:to|through|thru|until|till|(?:and\s)?(?:ends?|ending|expires|terminates)(?: on)?|and|bis|au|-|–|—|up to)(?:\s+(?:midnight|noon))?(?:\s+on)?[\s,.;]*$/i.test(
        between,
      ) ||
      (first.range === 'from' && second.range === 'to');
    if (!joined) continue;
    const isBetween = /\band\b/i.test(between) && !/between|from|period/i.test(first.line.text);
    if (isBetween) continue;
    const eventful = first.role === 'eventDate' && first.strength > 0.8;
    if (first.role === 'birth' || first.role === 'due') continue;
    const strength = Math.max(first.strength, second.strength, 0.6);
    if (!eventful) {
      first.role = 'periodStart';
      first.strength = strength;
    }
    second.label = first.label ?? second.label;
    second.role = 'periodEnd';
    second.strength = strength;
    first.range = 'from';
    second.range = 'to';
  }
}
