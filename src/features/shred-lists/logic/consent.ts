/** What goes and what stays when single rows are kept back, and when agreed papers may be shredded. */
import type { z } from 'zod';
import {
  approveShredListSchema,
  sheetGrams,
  type ShredList,
  type ShredRow,
} from '../../../../server/contract/shred-lists.ts';

export interface Amounts {
  papers: number;
  sheets: number;
  grams: number;
}

/** The rows that go: not kept back before, and not kept back now. */
export function listGoing(rows: readonly ShredRow[], keepBack: ReadonlySet<string>): ShredRow[] {
  return rows.filter((row) => !row.keptBack && !keepBack.has(row.paper));
}

/** How much paper the rows are. */
export function countAmounts(rows: readonly ShredRow[]): Amounts {
  const sheets = rows.reduce((sum, row) => sum + row.sheets, 0);
  return { papers: rows.length, sheets, grams: sheets * sheetGrams };
}

export type Readiness =
  | { kind: 'ready' }
  | { kind: 'waiting'; notBefore: string }
  | { kind: 'lapsed'; lapsedOn: string }
  | { kind: 'not-agreed' };

/** Whether an agreed list may be carried out on a day. With the client beside it the wait does not count. */
export function decideReadiness(
  approval: ShredList['approval'],
  today: string,
  clientPresent = false,
): Readiness {
  if (!approval) return { kind: 'not-agreed' };
  if (today > approval.lapsesOn) return { kind: 'lapsed', lapsedOn: approval.lapsesOn };
  if (!clientPresent && today < approval.notBefore) {
    return { kind: 'waiting', notBefore: approval.notBefore };
  }
  return { kind: 'ready' };
}

/** What is asked when consent is given; the instruction only when the practice records it. */
export const consentFormSchema = approveShredListSchema.pick({ waitDays: true, instruction: true });
export type ConsentForm = z.input<typeof consentFormSchema>;
