/** Tax years in words, and their first and last days. */
import type { IsoDate } from '../../contract/dates.ts';
import { addDays, addMonths, findIsoDate, splitIsoDate } from './calendar-days.ts';
import type { PaperLine } from './paper-lines.ts';

/** `2025-26` for the year that begins in 2025. */
export function formatSplitYear(startYear: number): string {
  return `${startYear}-${String((startYear + 1) % 100).padStart(2, '0')}`;
}

/**
 * First and last day of a tax year. GB 6 April to 5 April, AU 1 July to 30 June, all others here the
 * calendar year (IE since 2002). Null when the text is no tax year.
 */
export function findTaxYearSpan(
  taxYear: string,
  country: string | null,
): { start: IsoDate; end: IsoDate } | null {
  const match = /^(\d{4})(?:-(\d{2}))?$/.exec(taxYear);
  if (!match) return null;
  const first = Number(match[1]);
  if (match[2] === undefined) return { start: `${first}-01-01`, end: `${first}-12-31` };
  if (country === 'AU') return { start: `${first}-07-01`, end: `${first + 1}-06-30` };
  return { start: `${first}-04-06`, end: `${first + 1}-04-05` };
}

/** The last day of a tax year, null when the text is none. */
export function findTaxYearEnd(taxYear: string, country: string | null): IsoDate | null {
  return findTaxYearSpan(taxYear, country)?.end ?? null;
}

/** The tax year of a country in which a day lies. */
export function taxYearOf(on: IsoDate, country: string | null): string {
  const { year, month, day } = splitIsoDate(on);
  if (country === 'GB') {
    return formatSplitYear(month > 4 || (month === 4 && day >= 6) ? year : year - 1);
  }
  if (country === 'AU') return formatSplitYear(month >= 7 ? year : year - 1);
  return String(year);
}

const splitYear = '((?:19|20)\\d{2})\\s?(?:to|-|–|—|/)\\s?((?:19|20)?\\d{2})(?!\\d)';
const named =
  '(?:tax(?:ation)? year|income year|financial year|fiscal year|year of assessment|assessment year|year ended|years?|(?:tax|self) assessment|tax return|steuerjahr|veranlagungszeitraum)';

const splitNamed = new RegExp(`${named}[^\\d\\n]{0,25}${splitYear}`, 'i');
const splitBare = new RegExp(`(?<![\\d/£$€.,-])${splitYear}(?![\\d/-])`, 'i');
const singleNamed = new RegExp(
  `(?:tax(?:ation)? year|for (?:the )?(?:calendar |tax )?year|calendar year|income year|year of assessment|tax period|steuerjahr|année)[^\\d\\n]{0,25}((?:19|20)\\d{2})(?![\\d/-]\\d|\\d)`,
  'i',
);
const singleNear = new RegExp(
  `(?<![\\d/.,$€£-])((?:19|20)\\d{2})\\s+(?:tax year|form 1040|form w-?2|form 1099|w-?2\\b|t4\\b|1099\\b|tax return|income tax|t1\\b|t5\\b|federal|u\\.?s\\.? individual|individual income)`,
  'i',
);
const formNear =
  /\b(?:form\s+)?(?:w-?2|1099(?:-[a-z]+)?|t4a?|t5|1040(?:-sr)?|t1|1098|p21|form 11|5498|sa302|sa100)\b[^\d\n]{0,40}((?:19|20)\d{2})(?!\d|[/-]\d)/i;

function readSplit(match: RegExpExecArray | null): string | null {
  if (!match) return null;
  const first = Number(match[1]);
  const secondText = match[2] ?? '';
  const second =
    secondText.length === 2
      ? Math.floor(first / 100) * 100 + Number(secondText)
      : Number(secondText);
  const follows = second === first + 1 || (first % 100 === 99 && second % 100 === 0);
  return follows ? formatSplitYear(first) : null;
}

/** The tax year printed on a paper, in its country's form; null when none is named. */
export function findPrintedTaxYear(
  lines: readonly PaperLine[],
  country: string | null,
): string | null {
  const usesSplit = country === 'GB' || country === 'AU';
  const texts = lines
    .map((line) => line.text)
    .filter((text) => !/\brev(?:\.|ised|ision)/i.test(text));
  const rounds: ((text: string) => string | null)[] = usesSplit
    ? [
        (text) => readSplit(splitNamed.exec(text)),
        (text) => readSplit(splitBare.exec(text)),
        (text) => readYearEnd(singleNamed.exec(text), country),
      ]
    : [
        (text) => singleNamed.exec(text)?.[1] ?? null,
        (text) => singleNear.exec(text)?.[1] ?? null,
        (text) => formNear.exec(text)?.[1] ?? null,
      ];
  for (const read of rounds) {
    for (const text of texts) {
      const year = read(text);
      if (year) return year;
    }
  }
  return null;
}

/** A single year in a split-year country names the year that ends in it. */
function readYearEnd(match: RegExpExecArray | null, country: string | null): string | null {
  const year = Number(match?.[1]);
  if (!match || !findIsoDate(year, 1, 1)) return null;
  return country === 'GB' || country === 'AU' ? formatSplitYear(year - 1) : String(year);
}

/** A year standing by itself near the top of a form, as yearly slips print it; null when there is none. */
export function findLoneYear(lines: readonly PaperLine[]): string | null {
  const top = lines.filter((line) => line.page === 1).slice(0, 12);
  for (const line of top) {
    const match = /(?:^|\s)((?:19|20)\d{2})(?=\s|$)/.exec(line.text);
    if (match?.[1] && line.text.length <= 60) return match[1];
  }
  return null;
}

/**
 * The last day of a part of a tax year that a payroll or sales tax paper names: "quarter 2", "month 7".
 * GB tax quarters and months run from the 6th to the 5th; elsewhere they are those of the tax year's
 * calendar. Null when none is named.
 */
export function findPartOfYear(
  lines: readonly PaperLine[],
  taxYear: string,
  country: string | null,
): { start: IsoDate; end: IsoDate } | null {
  const span = findTaxYearSpan(taxYear, country);
  if (!span) return null;
  for (const line of lines.slice(0, 30)) {
    const match =
      /\b(?:tax )?(quarter|month|qtr|q)\s*(?:no\.?\s*|number\s*)?([1-9]|1[0-2])\b(?!\s*(?:to|-|–))/i.exec(
        line.text,
      );
    if (!match) continue;
    const isQuarter = /^q/i.test(match[1] ?? '');
    const count = Number(match[2]);
    if (isQuarter && count > 4) continue;
    const length = isQuarter ? 3 : 1;
    const start = addMonths(span.start, (count - 1) * length);
    return { start, end: addDays(addMonths(start, length), -1) };
  }
  return null;
}
