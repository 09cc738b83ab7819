/** Which answer about a tax return belongs to a paper, and what it tells the retention sum. */
import type { CaseInputs } from '../../contract/cases.ts';
import type { IsoDate } from '../../contract/dates.ts';
import type { Facts } from '../../contract/readings.ts';
import type { FilingRow } from '../../db/repositories/filing-repository.ts';
import { findTaxYearSpan, taxYearOf } from '../../reading/facts/tax-year.ts';
import { addDays, nextFollowing } from '../../retention/dates.ts';
import { shiftToWorkingDay } from '../../retention/holidays.ts';

/** The tax year to which a paper belongs in a country; null when it has no date. */
export function findTaxYearOfPaper(facts: Facts, country: string): string | null {
  if (facts.taxYear && isYearOf(facts.taxYear, country)) return facts.taxYear;
  const on = facts.keyDate ?? facts.dates.issued?.value ?? null;
  return on ? taxYearOf(on, country) : null;
}

/** Years are written `2024-25` in GB and AU and `2024` elsewhere. */
function isYearOf(taxYear: string, country: string): boolean {
  return taxYear.includes('-') === (country === 'GB' || country === 'AU');
}

/**
 * The answer for the paper's tax year: of the person it is addressed to, else the one given for the whole
 * household. An answer of another person says nothing about it.
 */
export function findFiling(
  filings: FilingRow[],
  { country, facts, people }: { country: string; facts: Facts; people: { name: string }[] },
): FilingRow | null {
  const taxYear = findTaxYearOfPaper(facts, country);
  const ofYear = filings.filter((f) => f.country === country && f.taxYear === taxYear);
  const addressee = normaliseName(facts.addressee?.value ?? '');
  const ofPerson = ofYear.find(
    (f) => f.person !== null && addressee !== '' && isSamePerson(addressee, f.person),
  );
  const shared = ofYear.find((f) => f.person === null);
  if (ofPerson ?? shared) return ofPerson ?? shared ?? null;
  return people.length <= 1 && ofYear.length === 1 ? (ofYear[0] ?? null) : null;
}

function normaliseName(name: string): string {
  return name
    .toLowerCase()
    .replace(/[^\p{L}\s'-]/gu, ' ')
    .replace(/\s+/g, ' ')
    .trim();
}

/** Whether an addressee line names the person: all parts of the name, or first letter and last name. */
function isSamePerson(addressee: string, person: string): boolean {
  const parts = normaliseName(person).split(' ');
  const words = new Set(addressee.split(' '));
  const last = parts.at(-1) ?? '';
  const first = parts[0] ?? '';
  return words.has(last) && (words.has(first) || words.has(first.charAt(0)));
}

/** What the sum is told. Not answered stays not known, which counts as whatever keeps longer. */
export function answerOfFiling(filing: FilingRow): CaseInputs {
  switch (filing.answer) {
    case 'unknown':
      return {};
    case 'never':
      return { filedOn: null, lodgedOn: null, returnDeliveredOn: null };
    case 'on-day':
      return sentOn(filing.filedOn);
    case 'on-time':
      return sentOn(findLastDayOnTime(filing.taxYear, filing.country));
  }
}

function sentOn(day: IsoDate | null): CaseInputs {
  return day === null ? {} : { filedOn: day, lodgedOn: day, returnDeliveredOn: day };
}

/**
 * The last day on which an individual's return of a tax year was on time without an extension: "on time" counts
 * as that day, because a period must not be counted short. Days: retention-facts, due days per country (GB TMA
 * 1970 s.8; US 26 USC 6072, 7503; AU own lodgement; CA, IE, DE from memory). Postponed in the US: 2019 to
 * 15 Jul 2020, 2020 to 17 May 2021 (from memory).
 */
export function findLastDayOnTime(taxYear: string, country: string): IsoDate | null {
  const span = findTaxYearSpan(taxYear, country);
  if (!span) return null;
  switch (country) {
    case 'GB':
      return nextFollowing(span.end, '01-31');
    case 'US':
      if (taxYear === '2019') return '2020-07-15';
      if (taxYear === '2020') return '2021-05-17';
      return shiftToWorkingDay(nextFollowing(span.end, '04-15'), 'us-dc');
    case 'CA':
      return shiftToWorkingDay(nextFollowing(span.end, '04-30'), 'ca');
    case 'AU':
    case 'IE':
      return nextFollowing(span.end, '10-31');
    case 'DE':
      return nextFollowing(span.end, '07-31');
    default:
      return addDays(span.end, 366);
  }
}
