/** What papers were before each change. */
import type { Transaction } from 'sequelize';
import { PaperChangeModel, type PaperChangeRow } from '../models/paper-change-model.ts';

export type { PaperChangeRow } from '../models/paper-change-model.ts';

export async function insertPaperChange(
  change: Pick<
    PaperChangeRow,
    'householdId' | 'paperId' | 'version' | 'before' | 'sentence' | 'userId' | 'at'
  > & { undone?: boolean },
  transaction: Transaction,
): Promise<void> {
  await PaperChangeModel.create({ undone: false, ...change }, { transaction });
}

/** Newest first. */
export async function listPaperChanges(paperId: string): Promise<PaperChangeRow[]> {
  const rows = await PaperChangeModel.findAll({ where: { paperId }, order: [['id', 'DESC']] });
  return rows.map((row) => row.get({ plain: true }));
}

/** The last change that was not taken back; null when there is none. */
export async function findLastChange(
  paperId: string,
  transaction?: Transaction,
): Promise<PaperChangeRow | null> {
  const row = await PaperChangeModel.findOne({
    where: { paperId, undone: false },
    order: [['id', 'DESC']],
    transaction: transaction ?? null,
  });
  return row?.get({ plain: true }) ?? null;
}

export async function markUndone(id: string, transaction: Transaction): Promise<void> {
  await PaperChangeModel.update({ undone: true }, { where: { id }, transaction });
}
