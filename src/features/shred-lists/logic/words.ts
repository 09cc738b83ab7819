/** Plain words for shred lists. */
import type { ShredList, ShredRow } from '../../../../server/contract/shred-lists.ts';
import { classLabel } from '../../../../server/contract/document-classes.ts';
import { formatCount, formatGrams, formatShortDay } from '../../../lib/format.ts';

type Status = ShredList['status'];

export const statusWords: Record<Status, string> = {
  draft: 'Gathered',
  sent: 'Waiting for consent',
  approved: 'Agreed',
  done: 'Shredded',
  void: 'Given up',
};

export const outcomeWords = {
  destroyed: 'Shredded',
  'kept-back': 'Kept back',
  'not-found': 'Not found',
} as const;

export const instructionWords = {
  'in-person': 'In person',
  phone: 'By telephone',
  letter: 'By letter',
  'e-mail': 'By e-mail',
} as const;

const basisWords: Record<string, string> = {
  law: 'Set by law',
  guidance: 'Official guidance',
  practice: 'Common practice',
};

/** What a row is, in one line: "Bank statement, Harbour Bank". */
export function describeRow(row: Pick<ShredRow, 'class' | 'title' | 'issuer'>): string {
  return [row.title ?? classLabel(row.class), row.issuer].filter(Boolean).join(', ');
}

/** The rule a row rests on, with how far its source was checked. */
export function describeRule(row: Pick<ShredRow, 'rule' | 'ruleBasis' | 'sourceNote'>): string {
  if (!row.rule) return 'No rule asks to keep it';
  const basis = row.ruleBasis ? (basisWords[row.ruleBasis] ?? row.ruleBasis) : 'Rule';
  return row.sourceNote ? `${basis} (${row.sourceNote})` : basis;
}

/** "12 papers, 34 sheets, about 170 g". */
export function describeAmount(papers: number, sheets: number, grams: number): string {
  return `${formatCount(papers, 'paper')}, ${formatCount(sheets, 'sheet')}, about ${formatGrams(grams)}`;
}

/** What the client says yes to. */
export function describeConsent(papers: number, sheets: number): string {
  return `I have looked through this list. ${formatCount(papers, 'paper')} (${formatCount(sheets, 'sheet')}) may be shredded. What I keep back stays. What is shredded cannot be brought back.`;
}

/** What a person cannot tell from the title alone: "Paper 12, box A3, dated 3 Jun 2015, 2 sheets". */
export function describePlace(
  row: Pick<ShredRow, 'paperNumber' | 'boxCode' | 'paperOn' | 'sheets'>,
): string {
  return [
    `Paper ${row.paperNumber}`,
    row.boxCode ? `box ${row.boxCode}` : null,
    row.paperOn ? `dated ${formatShortDay(row.paperOn)}` : 'no date on it',
    formatCount(row.sheets, 'sheet'),
  ]
    .filter(Boolean)
    .join(' · ');
}

/** When the paper was to be kept until, and on whose word. */
export function describeTerm(
  row: Pick<ShredRow, 'keepUntil' | 'rule' | 'ruleBasis' | 'sourceNote'>,
): string {
  if (!row.rule) return describeRule(row);
  if (!row.keepUntil) return `No set time to keep it · ${describeRule(row)}`;
  return `To be kept until ${formatShortDay(row.keepUntil)} · ${describeRule(row)}`;
}
