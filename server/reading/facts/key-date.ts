/** The date a paper's clock or reminder starts from, by what the paper is. */
import type { IsoDate } from '../../contract/dates.ts';
import type { ClassId } from '../../contract/document-classes.ts';
import type { DateRole, Facts } from '../../contract/readings.ts';
import { findTaxYearEnd } from './tax-year.ts';

type KeyKind = 'expiry' | 'cover' | 'period' | 'issue' | 'event' | 'none';

/**
 * expiry: the last day when the paper prints one, else its own date; cover: the end of the cover or term;
 * period: the last day of the period; event: the day of the event; issue: the date of the paper.
 */
const kinds: Partial<Record<ClassId, KeyKind>> = {
  passport: 'expiry',
  'driving-licence': 'expiry',
  'vehicle-registration': 'expiry',
  'immigration-paper': 'expiry',
  'insurance-policy': 'cover',
  warranty: 'cover',
  'tenancy-agreement': 'cover',
  'vehicle-service': 'expiry',
  'service-contract': 'expiry',
  membership: 'expiry',
  'loan-agreement': 'expiry',
  'payment-card': 'expiry',
  'tax-return': 'period',
  'tax-assessment': 'period',
  'annual-pay-statement': 'period',
  'investment-income-statement': 'period',
  'sales-tax-return': 'period',
  'bank-statement': 'period',
  'card-statement': 'period',
  'mortgage-statement': 'period',
  'pension-statement': 'period',
  'investment-statement': 'period',
  'property-tax-bill': 'period',
  'business-accounts': 'period',
  'payroll-record': 'period',
  'benefit-award': 'period',
  'death-certificate': 'event',
  'marriage-certificate': 'event',
  'loan-settlement': 'event',
  'employment-contract': 'event',
  unrecognised: 'none',
};

const order: Record<KeyKind, DateRole[]> = {
  expiry: ['expiry', 'issued', 'eventDate', 'periodEnd'],
  cover: ['expiry', 'periodEnd', 'issued', 'eventDate', 'periodStart'],
  period: ['periodEnd', 'issued', 'eventDate'],
  event: ['eventDate', 'issued', 'periodStart'],
  issue: ['issued', 'eventDate', 'periodEnd', 'periodStart'],
  none: [],
};

/** Whether the class counts from the end of a period, so that a tax year alone gives its date. */
export function isPeriodClass(classId: string): boolean {
  return findKind(classId) === 'period';
}

function findKind(classId: string): KeyKind {
  const known: Partial<Record<string, KeyKind>> = kinds;
  return known[classId] ?? 'issue';
}

/**
 * The key date of a paper, null when it has none. `country` is asked only where a tax year must be turned
 * into its last day.
 */
export function keyDateFor(
  classId: string,
  facts: Pick<Facts, 'dates' | 'taxYear'>,
  country: string | null = null,
): IsoDate | null {
  const kind = findKind(classId);
  if (kind === 'period' && !facts.dates.periodEnd && facts.taxYear) {
    const end = findTaxYearEnd(facts.taxYear, country);
    if (end) return end;
  }
  for (const role of order[kind]) {
    const fact = facts.dates[role];
    if (fact) return fact.value;
  }
  return null;
}
