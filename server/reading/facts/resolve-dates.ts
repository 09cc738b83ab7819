/** Chooses, of all dates on a paper, the one for each role, and adds what follows without being printed. */
import type { ClassId } from '../../contract/document-classes.ts';
import type { IsoDate } from '../../contract/dates.ts';
import type { DateFact, DateRole, Facts } from '../../contract/readings.ts';
import { countDaysInMonth, dayNumber, splitIsoDate } from './calendar-days.ts';
import { addTermDays, addWarrantyEnd, implied, round } from './implied-dates.ts';
import type { RoledDate } from './date-roles.ts';
import { isPeriodClass } from './key-date.ts';
import { findYearlessRange } from './parse-dates.ts';
import { letterConfidence } from './paper-lines.ts';
import type { PaperLine } from './paper-lines.ts';
import {
  findLoneYear,
  findPartOfYear,
  findPrintedTaxYear,
  findTaxYearSpan,
  taxYearOf,
} from './tax-year.ts';

type Dates = Facts['dates'];

/** Classes for which a tax year belongs to the paper. */
const taxYearClasses: ReadonlySet<string> = new Set<ClassId>([
  'tax-return',
  'tax-assessment',
  'annual-pay-statement',
  'investment-income-statement',
  'sales-tax-return',
  'donation-receipt',
  'property-tax-bill',
  'business-accounts',
  'payroll-record',
  'pension-statement',
  'benefit-award',
  'payslip',
  'mortgage-statement',
]);

/** Yearly slips that print nothing but the year. */
const yearlySlips: ReadonlySet<string> = new Set<ClassId>([
  'annual-pay-statement',
  'investment-income-statement',
  'tax-return',
]);

const runsToAnEnd: ReadonlySet<string> = new Set<ClassId>([
  'insurance-policy',
  'tenancy-agreement',
  'warranty',
]);

const statements: ReadonlySet<string> = new Set<ClassId>([
  'bank-statement',
  'card-statement',
  'investment-statement',
]);

const partOfYear: ReadonlySet<string> = new Set<ClassId>(['payroll-record', 'sales-tax-return']);

const oneDay: ReadonlySet<string> = new Set<ClassId>([
  'vehicle-service',
  'building-certificate',
  'trade-note',
  'death-certificate',
  'marriage-certificate',
]);

/** A month without a day ends a period or a term with its last day. */
function findDay(date: RoledDate): IsoDate {
  if (date.precision !== 'month') return date.value;
  if (date.role !== 'periodEnd' && date.role !== 'expiry') return date.value;
  const { year, month } = splitIsoDate(date.value);
  return `${year}-${pad(month)}-${pad(countDaysInMonth(year, month))}`;
}

function toFact(date: RoledDate, confidence: number): DateFact {
  return {
    value: findDay(date),
    confidence: round(confidence * letterConfidence(date.line, date.start, date.end)),
    seenAt: { page: date.line.page, box: date.box },
    printed: date.printed,
  };
}

/** How well a date answers a role: the label, then an early place on an early page. */
function weigh(date: RoledDate): number {
  let weight = date.strength - (date.line.page - 1) * 0.06 - date.line.index * 0.0004;
  if (date.isRow) weight -= 0.5;
  if (date.precision !== 'day') weight -= 0.25;
  return weight;
}

function pickBest(dates: readonly RoledDate[], role: DateRole): RoledDate | null {
  let best: RoledDate | null = null;
  for (const date of dates) {
    if (date.role !== role || weigh(date) <= 0.2) continue;
    if (!best || weigh(date) > weigh(best)) best = date;
  }
  return best;
}

/** A period is a pair where one is printed as a pair; single ends only otherwise. */
function pickPeriod(dates: readonly RoledDate[]): [RoledDate | null, RoledDate | null] {
  let best: [RoledDate, RoledDate] | null = null;
  dates.forEach((date, index) => {
    const next = dates[index + 1];
    if (date.range !== 'from' || next?.range !== 'to' || date.role !== 'periodStart') return;
    if (!best || weigh(date) > weigh(best[0]) + 0.05) best = [date, next];
  });
  if (best) return best;
  const start = pickBest(dates, 'periodStart');
  const end = pickBest(dates, 'periodEnd');
  return start && end && start.value > end.value ? [null, end] : [start, end];
}

/** A date alone near the top of the first page is the paper's own, as letters print it. */
function markLetterDates(dates: RoledDate[], classId: string): void {
  for (const date of dates) {
    if (date.role !== null || date.isRow || date.precision !== 'day') continue;
    if (!date.alone || date.line.page !== 1 || date.box.y > 0.45) continue;
    date.role = 'issued';
    date.strength = classId === 'personal-letter' ? 0.95 : 0.85;
  }
}

/** A deed's own day is the day it was recorded, stamped at its head; the signing is the event. */
function markRecordingStamp(dates: RoledDate[]): void {
  const stamp = dates.find(
    (date) =>
      date.line.page === 1 &&
      (date.box.y < 0.25 || /record|filed/i.test(date.label ?? '')) &&
      (date.role === null || date.role === 'issued') &&
      /\d{1,2}:\d{2}|record|register|filed|stamp/i.test(date.line.text),
  );
  if (!stamp) return;
  for (const date of dates) {
    if (date !== stamp && date.role === 'issued' && /dated|signed|made/i.test(date.label ?? '')) {
      date.role = 'eventDate';
    }
  }
  stamp.role = 'issued';
  stamp.strength = 1.05;
}

/** The words in a sentence that tell of the day the paper is about, by class. */
const eventWords: Partial<Record<ClassId, RegExp>> = {
  'loan-settlement':
    /final payment|in full|paid off|repaid|settled|satisfied|cleared|closed|discharged|redeemed|paid out/i,
  'employment-contract': /start|begin|commence|join|first day|employ/i,
  'death-certificate': /died|death|passed away/i,
  'marriage-certificate': /married|marriage|solemni|ceremony|wed|civil partner/i,
};

/** Days in running text that tell of the event, where no label names one. */
function markEventsInText(dates: RoledDate[], lines: readonly PaperLine[], classId: string): void {
  const known: Partial<Record<string, RegExp>> = eventWords;
  const words = known[classId];
  if (!words || dates.some((date) => date.role === 'eventDate' && date.strength > 0.6)) return;
  for (const date of dates) {
    if (date.role === 'issued' && date.alone) continue;
    if (date.role !== null && date.role !== 'other' && date.role !== 'periodStart') continue;
    if (date.role === 'other' && date.strength > 0.8) continue;
    const before = lines[date.line.index - 1];
    const lead = before && before.page === date.line.page ? before.text : '';
    if (!words.test(date.line.text) && !words.test(lead)) continue;
    const just = date.line.text.slice(Math.max(0, date.start - 40), date.start);
    if (/(?:registered|recorded|dated|made|opened|granted)\b[^.]*$/i.test(just)) continue;
    date.role = 'eventDate';
    date.strength = words.test(date.line.text) ? 0.8 : 0.6;
  }
}

/** A certificate is as old as its making out, not as the entry that it copies. */
function markCertifiedDay(dates: RoledDate[]): void {
  for (const date of dates) {
    if (date.role === 'issued' && /regist/i.test(date.label ?? '')) date.strength -= 0.1;
  }
}

/** A loan runs to its last payment. */
function markLastPayment(dates: RoledDate[]): void {
  for (const date of dates) {
    const lead = date.line.text.slice(0, date.start);
    if (!/\b(?:last|final)\s+(?:re)?(?:payment|instal+ment)[^.]{0,25}$/i.test(lead)) continue;
    date.role = 'expiry';
    date.strength = 1;
  }
}

/** A date without a label that reads as the paper's own: alone near the top, else alone, else the first. */
function pickUnlabelled(dates: readonly RoledDate[]): RoledDate | null {
  const free = dates.filter(
    (date) =>
      (date.role === null || (date.role === 'other' && date.strength <= 0.5)) && !date.isRow,
  );
  const days = free.filter((date) => date.precision === 'day');
  const top = days.find((date) => date.alone && date.line.page === 1 && date.box.y < 0.5);
  const first = days.find((date) => date.line.page === 1);
  return top ?? days.find((date) => date.alone) ?? first ?? days[0] ?? free[0] ?? null;
}

/** Places the years of a stretch such as `18 Aug to 17 Sep` as near to a known day as they can be. */
function placeYearlessRange(
  lines: readonly PaperLine[],
  near: IsoDate,
): [DateFact, DateFact] | null {
  for (const line of lines) {
    const range = findYearlessRange(line.text);
    if (!range) continue;
    const { year } = splitIsoDate(near);
    const options = [year - 1, year, year + 1].map((endYear) => {
      const startYear = range.from.month > range.to.month ? endYear - 1 : endYear;
      return {
        start: `${startYear}-${pad(range.from.month)}-${pad(range.from.day)}`,
        end: `${endYear}-${pad(range.to.month)}-${pad(range.to.day)}`,
      };
    });
    options.sort((a, b) => distance(a.end, near) - distance(b.end, near));
    const best = options[0];
    if (!best) continue;
    const shared = {
      confidence: round(0.7 * letterConfidence(line, range.start, range.end)),
      seenAt: { page: line.page, box: line.box },
      printed: line.text.slice(range.start, range.end),
    };
    return [
      { value: best.start, ...shared },
      { value: best.end, ...shared },
    ];
  }
  return null;
}

function pad(value: number): string {
  return String(value).padStart(2, '0');
}

function distance(a: IsoDate, b: IsoDate): number {
  return Math.abs(dayNumber(a) - dayNumber(b));
}

export interface ResolvedDates {
  dates: Dates;
  taxYear: string | null;
}

/** The dates of a paper of this class in this country, printed ones first, then what follows from them. */
export function resolveDates(
  found: readonly RoledDate[],
  lines: readonly PaperLine[],
  classId: string,
  country: string | null,
): ResolvedDates {
  const usable = found.map((date) =>
    date.role === 'birth' && classId === 'birth-certificate'
      ? { ...date, role: 'eventDate' as const }
      : { ...date },
  );
  markLetterDates(usable, classId);
  if (classId === 'birth-certificate') markCertifiedDay(usable);
  if (classId === 'property-deed') markRecordingStamp(usable);
  markEventsInText(usable, lines, classId);
  if (classId === 'loan-agreement') markLastPayment(usable);
  const [start, end] = pickPeriod(usable);
  const dates: Dates = {
    issued: factOf(pickBest(usable, 'issued')),
    due: factOf(pickBest(usable, 'due')),
    periodStart: factOf(start),
    periodEnd: factOf(end),
    expiry: factOf(pickBest(usable, 'expiry')),
    eventDate: factOf(pickBest(usable, 'eventDate')),
  };
  if (!dates.issued) {
    const spare = pickUnlabelled(usable);
    if (spare) dates.issued = toFact(spare, 0.45);
  }
  addYearlessPeriod(dates, lines);
  const taxYear = taxYearClasses.has(classId)
    ? decideTaxYear(dates, lines, classId, country)
    : null;
  addImplied(dates, lines, classId, country, taxYear);
  return { dates, taxYear };
}

function factOf(date: RoledDate | null): DateFact | null {
  return date ? toFact(date, Math.min(1, date.strength)) : null;
}

function addYearlessPeriod(dates: Dates, lines: readonly PaperLine[]): void {
  if (dates.periodEnd || dates.periodStart || !dates.issued) return;
  const pair = placeYearlessRange(lines, dates.issued.value);
  if (pair) [dates.periodStart, dates.periodEnd] = pair;
}

function decideTaxYear(
  dates: Dates,
  lines: readonly PaperLine[],
  classId: string,
  country: string | null,
): string | null {
  const printed = findPrintedTaxYear(lines, country);
  if (printed && classId !== 'payslip') return printed;
  if (classId === 'payslip') return dates.issued ? taxYearOf(dates.issued.value, country) : printed;
  if (country !== 'GB' && country !== 'AU') {
    const lone = findYearlyTitle(lines, classId);
    if (lone) return lone;
  }
  if (dates.periodEnd && isPeriodClass(classId)) return taxYearOf(dates.periodEnd.value, country);
  return null;
}

/** The year on a form that is made out once a year, where nothing else names it. */
function findYearlyTitle(lines: readonly PaperLine[], classId: string): string | null {
  if (yearlySlips.has(classId)) return findLoneYear(lines);
  const forms: Partial<Record<string, RegExp>> = {
    'mortgage-statement': /\b1098\b|interest statement/i,
    'payroll-record': /form|return|quarter/i,
    'property-tax-bill': /tax/i,
    'pension-statement': /\b5498\b/,
  };
  const pattern = forms[classId];
  if (!pattern) return null;
  return findLoneYear(lines.filter((line) => pattern.test(line.text)));
}

function addImplied(
  dates: Dates,
  lines: readonly PaperLine[],
  classId: string,
  country: string | null,
  taxYear: string | null,
): void {
  if (runsToAnEnd.has(classId)) {
    dates.expiry ??= dates.periodEnd;
    dates.periodEnd ??= dates.expiry;
  }
  if (taxYear && isPeriodClass(classId)) {
    const part = partOfYear.has(classId) ? findPartOfYear(lines, taxYear, country) : null;
    const span = part ?? findTaxYearSpan(taxYear, country);
    if (span && !dates.periodEnd) {
      dates.periodEnd = implied(span.end, null, 0.7);
      dates.periodStart ??= implied(span.start, null, 0.7);
    } else if (span && dates.periodEnd?.value === span.end) {
      dates.periodStart ??= implied(span.start, dates.periodEnd, 0.7);
    }
  }
  if (classId === 'payslip' && dates.issued) {
    const { year, month } = splitIsoDate(dates.issued.value);
    const first = `${year}-${pad(month)}-01`;
    const last = `${year}-${pad(month)}-${pad(countDaysInMonth(year, month))}`;
    dates.periodStart ??= implied(first, dates.issued, 0.5);
    dates.periodEnd ??= implied(last, dates.issued, 0.5);
  }
  if (statements.has(classId)) dates.issued ??= dates.periodEnd;
  if (oneDay.has(classId)) dates.issued ??= dates.eventDate;
  if (!dates.due && dates.issued) addTermDays(dates, lines, dates.issued);
  if (classId === 'warranty' && !dates.expiry) addWarrantyEnd(dates, lines);
}
