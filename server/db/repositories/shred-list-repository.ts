/** Shred lists and their rows. */
import { Op, type Transaction } from 'sequelize';
import { ShredListModel, type ShredListRow } from '../models/shred-list-model.ts';
import { ShredRowModel, type ShredRowRow } from '../models/shred-row-model.ts';
import { selectRows } from './sql.ts';

export type { ShredListRow } from '../models/shred-list-model.ts';
export type { ShredRowRow } from '../models/shred-row-model.ts';

export async function findShredList(
  id: string,
  transaction?: Transaction,
): Promise<ShredListRow | null> {
  const found = await ShredListModel.findByPk(id, { transaction: transaction ?? null });
  return found?.get({ plain: true }) ?? null;
}

export async function lockShredList(
  id: string,
  transaction: Transaction,
): Promise<ShredListRow | null> {
  const found = await ShredListModel.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE });
  return found?.get({ plain: true }) ?? null;
}

/** Newest first. */
export async function listShredLists(householdId: string): Promise<ShredListRow[]> {
  const rows = await ShredListModel.findAll({
    where: { householdId },
    order: [['number', 'DESC']],
  });
  return rows.map((row) => row.get({ plain: true }));
}

export async function insertShredList(
  list: Pick<ShredListRow, 'householdId' | 'number' | 'on' | 'leftOut'> & Partial<ShredListRow>,
  paperIds: string[],
  transaction: Transaction,
): Promise<ShredListRow> {
  const made = await ShredListModel.create(list, { transaction });
  await ShredRowModel.bulkCreate(
    paperIds.map((paperId, index) => ({
      shredListId: made.id,
      paperId,
      householdId: list.householdId,
      position: index + 1,
    })),
    { transaction },
  );
  await made.reload({ transaction });
  return made.get({ plain: true });
}

export async function updateShredList(
  id: string,
  values: Partial<ShredListRow>,
  transaction: Transaction,
): Promise<void> {
  await ShredListModel.update(values, { where: { id }, transaction });
}

export async function listRows(listId: string, transaction?: Transaction): Promise<ShredRowRow[]> {
  const rows = await ShredRowModel.findAll({
    where: { shredListId: listId },
    order: [['position', 'ASC']],
    transaction: transaction ?? null,
  });
  return rows.map((row) => row.get({ plain: true }));
}

export async function updateRow(
  listId: string,
  paperId: string,
  values: Partial<ShredRowRow>,
  transaction: Transaction,
): Promise<void> {
  await ShredRowModel.update(values, { where: { shredListId: listId, paperId }, transaction });
}

/** Takes a row off a list; false when it was not on it. */
export async function removeRow(
  listId: string,
  paperId: string,
  transaction: Transaction,
): Promise<boolean> {
  const removed = await ShredRowModel.destroy({
    where: { shredListId: listId, paperId },
    transaction,
  });
  return removed === 1;
}

const liveStatuses = ['draft', 'sent', 'approved'];

/** The live lists that papers are on, by paper id. Rows kept back have left their list already. */
export async function listLiveListsOf(
  paperIds: string[],
  transaction?: Transaction,
): Promise<Map<string, { listId: string; number: number; status: ShredListRow['status'] }>> {
  if (paperIds.length === 0) return new Map();
  const rows = await selectRows<{
    paperId: string;
    listId: string;
    number: number;
    status: ShredListRow['status'];
  }>(
    `select r.paper_id as "paperId", l.id as "listId", l.number, l.status
     from shred_rows r join shred_lists l on l.id = r.shred_list_id
     where r.paper_id = any($paperIds::uuid[]) and not r.kept_back
       and l.status = any($statuses::text[])`,
    { paperIds, statuses: liveStatuses },
    transaction,
  );
  return new Map(rows.map(({ paperId, ...list }) => [paperId, list]));
}

/** Whether a paper stands on a list that is finished or given up, where its row must stay. */
export async function isOnPastList(paperId: string, transaction: Transaction): Promise<boolean> {
  const lists = await ShredRowModel.findAll({
    where: { paperId },
    attributes: ['shredListId'],
    transaction,
  });
  if (lists.length === 0) return false;
  const past = await ShredListModel.count({
    where: {
      id: { [Op.in]: lists.map((row) => row.shredListId) },
      status: { [Op.notIn]: ['draft', 'sent'] },
    },
    transaction,
  });
  return past > 0;
}
