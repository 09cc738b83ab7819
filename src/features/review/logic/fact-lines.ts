/** The facts of a paper as lines of text, with what the reader had seen where a person corrected it. */
import type { Paper } from '../../../../server/contract/papers.ts';
import { dateRoles, type Facts } from '../../../../server/contract/readings.ts';
import { dateRoleLabels } from './words.ts';

export interface FactLine {
  /** The same key as the fact's mark on the page. */
  key: string;
  label: string;
  value: string | null;
  /** The page it was seen on; null when it has no place. */
  page: number | null;
  /** Present when a person corrected it: what the reader had seen, null for nothing. */
  wasRead?: string | null;
}

interface RawFact {
  key: string;
  label: string;
  value: string | null;
  page: number | null;
}

function listRawFacts(facts: Facts, formatDay: (day: string) => string): RawFact[] {
  return [
    ...dateRoles.map((role) => {
      const fact = facts.dates[role];
      return {
        key: role,
        label: dateRoleLabels[role],
        value: fact ? formatDay(fact.value) : null,
        page: fact?.seenAt?.page ?? null,
      };
    }),
    { key: 'taxYear', label: 'Tax year', value: facts.taxYear, page: null },
    ...(
      [
        ['issuer', 'From', facts.issuer],
        ['addressee', 'To', facts.addressee],
        ['reference', 'Reference', facts.reference],
      ] as const
    ).map(([key, label, fact]) => ({
      key,
      label,
      value: fact?.value ?? null,
      page: fact?.seenAt?.page ?? null,
    })),
    ...facts.amounts.map((amount, index) => ({
      key: `amount-${index}`,
      label: amount.name,
      value: describeAmount(amount.value, amount.currency),
      page: amount.seenAt?.page ?? null,
    })),
  ];
}

/** The lines to show: what is known, and what the reader saw but a person took away. */
export function listFactLines(
  paper: Pick<Paper, 'facts' | 'read'>,
  formatDay: (day: string) => string,
): FactLine[] {
  const now = listRawFacts(paper.facts, formatDay);
  const read = new Map(
    paper.read ? listRawFacts(paper.read.facts, formatDay).map((fact) => [fact.key, fact]) : [],
  );
  return now.flatMap((fact): FactLine[] => {
    const seen = read.get(fact.key)?.value ?? null;
    const isCorrected =
      paper.read !== null && !fact.key.startsWith('amount-') && seen !== fact.value;
    if (fact.value === null && !isCorrected) return [];
    return [isCorrected ? { ...fact, wasRead: seen } : fact];
  });
}

/** An amount with its currency: "GBP 1,204.50". */
export function describeAmount(value: number, currency: string | null): string {
  const number = new Intl.NumberFormat('en-GB', {
    minimumFractionDigits: 2,
    maximumFractionDigits: 2,
  }).format(value);
  return currency ? `${currency} ${number}` : number;
}
