import { listBoxCodes } from '../../db/repositories/box-repository.ts';
import type { StoredPaper } from '../../db/repositories/paper-repository.ts';
import {
  type ShredListRow,
  type ShredRowRow,
  updateRow,
} from '../../db/repositories/shred-list-repository.ts';
import type { Transaction } from '../../db/transaction.ts';
import { describeRow } from './view-list.ts';

/** Notes each row as it was approved, so that a later change of the paper shows. */
export async function keepWhatWasSeen(
  rows: ShredRowRow[],
  leaving: StoredPaper[],
  list: ShredListRow,
  transaction: Transaction,
): Promise<void> {
  const boxCodes = await listBoxCodes(list.householdId);
  for (const paper of leaving) {
    const row = rows.find((r) => r.paperId === paper.id);
    if (!row) continue;
    const snapshot = {
      ...describeRow(row, paper, boxCodes.get(paper.boxId ?? '') ?? null),
      firstPageId: null,
      blocked: [],
    };
    await updateRow(list.id, paper.id, { snapshot }, transaction);
  }
}
