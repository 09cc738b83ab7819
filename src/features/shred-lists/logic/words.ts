/** Plain words for shred lists. */
import type { ShredList, ShredRow } from '../../../../server/contract/shred-lists.ts';
import { classLabel } from '../../../../server/contract/document-classes.ts';
import { formatCount, formatGrams } from '../../../lib/format.ts';

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
  if (!row.rule) return 'No rule asks for it';
  const basis = row.ruleBasis ? (basisWords[row.ruleBasis] ?? row.ruleBasis) : 'Rule';
  return row.sourceNote ? `${basis} (${row.sourceNote})` : basis;
}

/** "12 papers, 34 sheets, about 170 g". */
export function describeAmount(papers: number, sheets: number, grams: number): string {
  return `${formatCount(papers, 'paper')}, ${formatCount(sheets, 'sheet')}, about ${formatGrams(grams)}`;
}

/** What the client says yes to. `who` is the household's member who speaks. */
export function describeConsent(papers: number, sheets: number): string {
  return `I have looked through this list. ${formatCount(papers, 'paper')} (${formatCount(sheets, 'sheet')}) may be shredded. What I keep back stays. Until the day I may change my mind; what is shredded cannot be brought back.`;
}
