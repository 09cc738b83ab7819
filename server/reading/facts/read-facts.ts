/** All facts of one paper, once its class is known. */
import type { Facts, TextFact } from '../../contract/readings.ts';
import { findAddressee } from './addressee.ts';
import { findAmounts } from './amounts.ts';
import { findRoledDates } from './date-roles.ts';
import { findEmployer, findIssuer, findUsualIssuer } from './issuer.ts';
import { keyDateFor } from './key-date.ts';
import { findMrz } from './mrz.ts';
import type { PaperLine } from './paper-lines.ts';
import { findReference } from './reference.ts';
import { resolveDates } from './resolve-dates.ts';

/** Countries that print the month first in figures. */
const monthFirst: ReadonlySet<string> = new Set(['US']);

/**
 * Whether figures such as 03/06 mean day, then month: a date on the paper that can only be read one way
 * decides, else the country's custom.
 */
export function decideDayFirst(lines: readonly PaperLine[], country: string | null): boolean {
  let dayFirst = 0;
  let monthFirstCount = 0;
  for (const line of lines) {
    for (const match of line.text.matchAll(
      /(?<!\d)(\d{1,2})([/.-])(\d{1,2})\2(?:\d{4}|\d{2})(?!\d)/g,
    )) {
      const first = Number(match[1]);
      const second = Number(match[3]);
      if (first > 12 && first <= 31 && second <= 12) dayFirst += 1;
      if (second > 12 && second <= 31 && first <= 12) monthFirstCount += 1;
    }
  }
  if (dayFirst !== monthFirstCount) return dayFirst > monthFirstCount;
  return !monthFirst.has(country ?? '');
}

/** Printed names first, but for papers that only one authority issues and yearly slips of an employer. */
function decideIssuer(
  lines: readonly PaperLine[],
  classId: string,
  country: string | null,
): TextFact | null {
  const printed = findIssuer(lines);
  if (classId === 'annual-pay-statement') return findEmployer(lines) ?? printed;
  if (printed && printed.confidence > 0.85) return printed;
  return findUsualIssuer(classId, country) ?? printed;
}

/**
 * The facts of a paper.
 * @param country the issuer's country, or null
 * @param homeCountry the household's, for the order of day and month when the paper's is unknown
 */
export function readFacts(
  lines: readonly PaperLine[],
  classId: string,
  country: string | null,
  homeCountry: string,
): Facts {
  const mrz = findMrz(lines.map((line) => line.text));
  const dayFirst = decideDayFirst(lines, country ?? homeCountry);
  const roled = findRoledDates(lines, { dayFirst });
  const { dates, taxYear } = resolveDates(roled, lines, classId, country ?? homeCountry);
  if (mrz?.expiryDate && mrz.checks.some((check) => check.field === 'expiryDate' && check.valid)) {
    const seen = roled.find((date) => date.value === mrz.expiryDate);
    dates.expiry = {
      value: mrz.expiryDate,
      confidence: 0.99,
      seenAt: seen ? { page: seen.line.page, box: seen.box } : null,
      printed: seen?.printed ?? null,
    };
  }
  const facts: Facts = {
    dates,
    keyDate: null,
    taxYear,
    reference: findReference(lines),
    issuer: decideIssuer(lines, classId, country),
    addressee: findAddressee(lines),
    amounts: findAmounts(lines, country ?? homeCountry),
    mrz,
  };
  if (mrz?.documentNumber && !facts.reference) {
    facts.reference = { value: mrz.documentNumber, confidence: 0.9, seenAt: null };
  }
  facts.keyDate = keyDateFor(classId, facts, country ?? homeCountry);
  return facts;
}
