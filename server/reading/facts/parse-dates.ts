/** Finds calendar days in a line of print, in the styles of the countries the papers come from. */
import type { IsoDate } from '../../contract/dates.ts';
import { expandYear, findIsoDate } from './calendar-days.ts';
import { findMonth } from './month-names.ts';
import { findOrdinalDay, findYearInWords } from './number-words.ts';

export interface PrintedDate {
  value: IsoDate;
  /** Where it stands in the text, `end` not included. */
  start: number;
  end: number;
  printed: string;
  /** A month or season without a day stands for its first day. */
  precision: 'day' | 'month' | 'season';
  /** Day and month could be exchanged; the paper's order decided. */
  ambiguous: boolean;
  /** Partner in a range: `from` before a joining word, `to` after it. */
  range: 'from' | 'to' | null;
}

export interface DateReadingOptions {
  /** Whether 03/06 is the 3rd of June. */
  dayFirst: boolean;
}

const digit = '[0-9OoIl|SB]';
const twoDigits = `(?:\\d${digit}?|[OoIl|SB]\\d|[Il|](?=\\s))`;
const day = `(${twoDigits})(?:st|nd|rd|th|er|\\.)?`;
const month = '([A-Za-zÀ-ÿ0|]{3,10})\\.?';
const year = '((?:[12l|I][90O]' + digit + "{2})|'?\\d{2}(?![\\d:]))";
const fullYear = '([12l|I][90O]' + digit + '{2})';
const before = '(?<![A-Za-z0-9£$€/.,-])';
const after = '(?![A-Za-z0-9]|[/-][0-9]|[.,][0-9])';
const join = '\\s*(?:to|through|thru|until|till|and|bis|au|-|–|—)\\s*';
const sep = '\\s*[,.]?\\s*';

const patterns = {
  iso: new RegExp(
    `${before}${fullYear}\\s?([-/.])\\s?(${digit}{1,2})\\s?\\2\\s?(${digit}{1,2})${after}`,
    'g',
  ),
  numeric: new RegExp(
    `(?<![A-Za-z0-9£$€/,]|\\d[.-])(${digit}{1,2})\\s?([/.-])\\s?(${digit}{1,2})\\s?\\2\\s?(${digit}{4}|${digit}{2})(?![A-Za-z0-9]|[/-][0-9]|[.,][0-9])`,
    'g',
  ),
  spaced: new RegExp(
    `(?<![A-Za-z0-9£$€/.,-]|\\d )(\\d{2})(?:\\s(\\d{2})\\s?|(\\d{2})\\s)((?:19|20)\\d{2})(?![A-Za-z0-9]| ?\\d)`,
    'g',
  ),
  dayMonthYear: new RegExp(
    `${before}${day}[\\s-]*(?:day\\s+)?(?:of\\s*)?${month}(?:\\s?/\\s?[A-Za-zÀ-ÿ]{3,9}\\.?)?${sep}-?\\s?${year}${after}`,
    'gi',
  ),
  monthDayYear: new RegExp(
    `(?<![A-Za-z])${month}\\s*${day}(?:\\s*[,.]\\s*|\\s+)${year}${after}`,
    'gi',
  ),
  yearMonthDay: new RegExp(`${before}${fullYear}[\\s-]+${month}[\\s-]+${day}${after}`, 'gi'),
  rangeDayFirst: new RegExp(
    `${before}${day}\\s*(?:([A-Za-z]{3,9})\\.?)?${join}${day}\\s*(?:of\\s+)?${month}${sep}${fullYear}${after}`,
    'gi',
  ),
  rangeMonthFirst: new RegExp(
    `(?<![A-Za-z])${month}\\s*${day}${join}(?:([A-Za-z]{3,9})\\.?\\s*)?${day}\\s*,?\\s*${fullYear}${after}`,
    'gi',
  ),
  words:
    /\b((?:(?:twenty|thirty)[\s-])?[a-z]{2,11}(?:st|nd|rd|th))\s+(?:day\s+)?(?:of\s*)?([A-Za-z]{3,9}),?\s+(?:in the year\s+)?(?:of our Lord\s+)?(?:A\.?\s?D\.?\s+)?((?:[12]\d{3})|(?:(?:one|two|nineteen|twenty)[\sA-Za-z-]{0,40}))/gi,
  monthYear: new RegExp(
    `(?<![A-Za-z0-9]|(?:^|[\\s(])\\d{1,2} )([A-Za-zÀ-ÿ]{3,10})\\.?,?\\s+((?:19|20)\\d{2})(?![\\d/-]\\d|\\d)`,
    'g',
  ),
  season: /\b(spring|summer|autumn|fall|winter)\s+((?:19|20)\d{2})\b/gi,
};

function readDigits(text: string): number {
  const plain = text
    .replace(/[Oo]/g, '0')
    .replace(/[Il|]/g, '1')
    .replace(/S/g, '5')
    .replace(/B/g, '8')
    .replace(/'/g, '');
  return /^\d+$/.test(plain) ? Number(plain) : Number.NaN;
}

function hasDigits(text: string, atLeast: number): boolean {
  return text.replace(/\D/g, '').length >= atLeast;
}

interface Found {
  value: IsoDate | null;
  start: number;
  end: number;
  precision?: PrintedDate['precision'];
  ambiguous?: boolean;
  range?: PrintedDate['range'];
}

/** A slashed zero is read as 6, 8 or 9: 61 stands for 01. */
function healLeadingZero(number: number): number {
  return number > 60 && number < 100 ? number % 10 : number;
}

/** Day and month in the order that is possible, else in the paper's. */
function decideDayMonth(
  firstPrinted: number,
  secondPrinted: number,
  yearNumber: number,
  dayFirst: boolean,
): { value: IsoDate | null; ambiguous: boolean } {
  const first = healLeadingZero(firstPrinted);
  const second = healLeadingZero(secondPrinted);
  const asDayFirst = findIsoDate(yearNumber, second, first);
  const asMonthFirst = findIsoDate(yearNumber, first, second);
  const preferred = dayFirst ? asDayFirst : asMonthFirst;
  return {
    value: preferred ?? asDayFirst ?? asMonthFirst,
    ambiguous: asDayFirst !== null && asMonthFirst !== null && asDayFirst !== asMonthFirst,
  };
}

function collectRanges(text: string, found: Found[]): void {
  for (const match of text.matchAll(patterns.rangeDayFirst)) {
    const [all, d1 = '', m1, d2 = '', m2 = '', y = ''] = match;
    pushRange(found, match.index, all, [d1, m1 ?? m2, d2, m2, y]);
  }
  for (const match of text.matchAll(patterns.rangeMonthFirst)) {
    const [all, m1 = '', d1 = '', m2, d2 = '', y = ''] = match;
    pushRange(found, match.index, all, [d1, m1, d2, m2 ?? m1, y]);
  }
}

function pushRange(
  found: Found[],
  at: number,
  all: string,
  [d1, m1, d2, m2, y]: [string, string, string, string, string],
): void {
  const from = findMonth(m1);
  const to = findMonth(m2);
  const endYear = readDigits(y);
  if (from === null || to === null) return;
  const startYear = from > to ? endYear - 1 : endYear;
  const start = findIsoDate(startYear, from, readDigits(d1));
  const end = findIsoDate(endYear, to, readDigits(d2));
  if (!start || !end || start > end) return;
  const joint = all.slice(1).search(/\s*(?:\b(?:to|through|thru|until|till|and|bis|au)\b|[-–—])/i);
  const middle = at + 1 + Math.max(joint, 0);
  found.push({ value: start, start: at, end: middle, range: 'from' });
  const gap = /^\s*(?:to|through|thru|until|till|and|bis|au|-|–|—)\s*/i.exec(
    all.slice(middle - at),
  )?.[0].length;
  found.push({ value: end, start: middle + (gap ?? 0), end: at + all.length, range: 'to' });
}

function collectWritten(text: string, found: Found[]): void {
  const add = (match: RegExpMatchArray, d: number, m: string, y: string): void => {
    const monthNumber = findMonth(m);
    if (monthNumber === null || match.index === undefined) return;
    const value = findIsoDate(expandYear(readDigits(y)), monthNumber, d);
    found.push({ value, start: match.index, end: match.index + match[0].length });
  };
  for (const match of text.matchAll(patterns.dayMonthYear)) {
    add(match, readDigits(match[1] ?? ''), match[2] ?? '', match[3] ?? '');
  }
  for (const match of text.matchAll(patterns.monthDayYear)) {
    add(match, readDigits(match[2] ?? ''), match[1] ?? '', match[3] ?? '');
  }
  for (const match of text.matchAll(patterns.yearMonthDay)) {
    add(match, readDigits(match[3] ?? ''), match[2] ?? '', match[1] ?? '');
  }
  for (const match of text.matchAll(patterns.words)) {
    const [all, ordinal = '', monthWord = '', yearText = ''] = match;
    const dayNumber = findOrdinalDay(ordinal.trim());
    const monthNumber = findMonth(monthWord);
    if (dayNumber === null || monthNumber === null) continue;
    const { years, length } = readLeadingYear(yearText);
    if (years === null) continue;
    const end = match.index + all.length - (yearText.length - length);
    found.push({ value: findIsoDate(years, monthNumber, dayNumber), start: match.index, end });
  }
}

/** The longest run of words at the beginning that reads as a year. */
function readLeadingYear(text: string): { years: number | null; length: number } {
  if (/^\d{4}/.test(text)) return { years: Number(text.slice(0, 4)), length: 4 };
  const words = text.split(/(?<=\s)/);
  for (let count = Math.min(words.length, 6); count > 0; count -= 1) {
    const part = words.slice(0, count).join('');
    const years = findYearInWords(part.trim());
    if (years !== null) return { years, length: part.trimEnd().length };
  }
  return { years: null, length: 0 };
}

function collectNumeric(text: string, dayFirst: boolean, found: Found[]): void {
  for (const match of text.matchAll(patterns.iso)) {
    const [all, y = '', , m = '', d = ''] = match;
    if (!hasDigits(all, 5)) continue;
    found.push({
      value: findIsoDate(readDigits(y), readDigits(m), readDigits(d)),
      start: match.index,
      end: match.index + all.length,
    });
  }
  const lower = text.toLowerCase();
  for (const match of text.matchAll(patterns.numeric)) {
    const [all, a = '', separator, b = '', y = ''] = match;
    if (!hasDigits(all, y.length === 4 ? 5 : 4)) continue;
    const isShort = y.length === 2;
    if (isShort && separator !== '/' && (a.length < 2 || b.length < 2)) continue;
    const lead = lower.slice(Math.max(0, match.index - 24), match.index);
    if (isShort && separator === '-' && /sort|code|tel|phone|konto/.test(lead)) continue;
    const decided = decideDayMonth(
      readDigits(a),
      readDigits(b),
      expandYear(readDigits(y)),
      dayFirst,
    );
    found.push({ ...decided, start: match.index, end: match.index + all.length });
  }
  for (const match of text.matchAll(patterns.spaced)) {
    const [all, a = '', spacedB, gluedB, y = ''] = match;
    const b = spacedB ?? gluedB ?? '';
    const decided = decideDayMonth(Number(a), Number(b), Number(y), dayFirst);
    found.push({ ...decided, start: match.index, end: match.index + all.length });
  }
}

const seasonMonths: Record<string, number> = {
  spring: 3,
  summer: 6,
  autumn: 9,
  fall: 9,
  winter: 12,
};

function collectVague(text: string, found: Found[]): void {
  for (const match of text.matchAll(patterns.monthYear)) {
    const monthNumber = findMonth(match[1] ?? '');
    if (monthNumber === null) continue;
    found.push({
      value: findIsoDate(Number(match[2]), monthNumber, 1),
      start: match.index,
      end: match.index + match[0].length,
      precision: 'month',
    });
  }
  for (const match of text.matchAll(patterns.season)) {
    found.push({
      value: findIsoDate(Number(match[2]), seasonMonths[(match[1] ?? '').toLowerCase()] ?? 0, 1),
      start: match.index,
      end: match.index + match[0].length,
      precision: 'season',
    });
  }
}

/**
 * All dates of a line from left to right; impossible days are refused, of two readings that overlap the
 * more complete one stays.
 */
export function parseDates(text: string, options: DateReadingOptions): PrintedDate[] {
  const found: Found[] = [];
  collectRanges(text, found);
  collectWritten(text, found);
  collectNumeric(text, options.dayFirst, found);
  collectVague(text, found);
  const kept: PrintedDate[] = [];
  for (const item of found) {
    if (item.value === null) continue;
    if (kept.some((other) => other.start < item.end && other.end > item.start)) continue;
    kept.push({
      value: item.value,
      start: item.start,
      end: item.end,
      printed: text.slice(item.start, item.end).trim(),
      precision: item.precision ?? 'day',
      ambiguous: item.ambiguous ?? false,
      range: item.range ?? null,
    });
  }
  return kept.sort((a, b) => a.start - b.start);
}

const rangePattern = new RegExp(
  `${before}${day}\\s*${month}${join}${day}\\s*${month}(?!\\s*,?\\s*['\\d])`,
  'i',
);
const rangePatternMonthFirst = new RegExp(
  `(?<![A-Za-z])${month}\\s*${day}${join}${month}\\s*${day}(?!\\s*,?\\s*['\\d])`,
  'i',
);

export interface YearlessRange {
  from: { month: number; day: number };
  to: { month: number; day: number };
  start: number;
  end: number;
}

/** A stretch such as `18 Aug to 17 Sep` whose year stands elsewhere on the paper; null when there is none. */
export function findYearlessRange(text: string): YearlessRange | null {
  const dayFirst = rangePattern.exec(text);
  const monthFirst = rangePatternMonthFirst.exec(text);
  const parts = dayFirst
    ? [dayFirst[1], dayFirst[2], dayFirst[3], dayFirst[4]]
    : monthFirst
      ? [monthFirst[2], monthFirst[1], monthFirst[4], monthFirst[3]]
      : null;
  const match = dayFirst ?? monthFirst;
  if (!parts || !match) return null;
  const [d1, m1, d2, m2] = parts;
  const fromMonth = findMonth(m1 ?? '');
  const toMonth = findMonth(m2 ?? '');
  const fromDay = readDigits(d1 ?? '');
  const toDay = readDigits(d2 ?? '');
  if (fromMonth === null || toMonth === null) return null;
  if (!findIsoDate(2024, fromMonth, fromDay) || !findIsoDate(2024, toMonth, toDay)) return null;
  return {
    from: { month: fromMonth, day: fromDay },
    to: { month: toMonth, day: toDay },
    start: match.index,
    end: match.index + match[0].length,
  };
}
