/** Reasons not to destroy. */
import { Op, type Transaction } from 'sequelize';
import { HoldModel, type HoldRow } from '../models/hold-model.ts';

export type { HoldRow } from '../models/hold-model.ts';

export async function findHold(id: string, transaction?: Transaction): Promise<HoldRow | null> {
  const found = await HoldModel.findByPk(id, { transaction: transaction ?? null });
  return found?.get({ plain: true }) ?? null;
}

/** All holds of a household, those in force first, the newest of each first. */
export async function listHolds(
  householdId: string,
  transaction?: Transaction,
): Promise<HoldRow[]> {
  const rows = await HoldModel.findAll({
    where: { householdId },
    order: [['createdAt', 'DESC']],
    transaction: transaction ?? null,
  });
  const plain = rows.map((row) => row.get({ plain: true }));
  return [...plain.filter((h) => h.liftedOn === null), ...plain.filter((h) => h.liftedOn !== null)];
}

/** Holds of one paper and of its whole household, lifted ones included, oldest first. */
export async function listHoldsOfPaper(
  householdId: string,
  paperId: string,
  transaction?: Transaction,
): Promise<HoldRow[]> {
  const rows = await HoldModel.findAll({
    where: { householdId, paperId: { [Op.or]: [{ [Op.eq]: paperId }, { [Op.is]: null }] } },
    order: [['createdAt', 'ASC']],
    transaction: transaction ?? null,
  });
  return rows.map((row) => row.get({ plain: true }));
}

export async function insertHold(
  hold: Pick<
    HoldRow,
    'householdId' | 'paperId' | 'kind' | 'reason' | 'placedOn' | 'placedBy' | 'placedByRole'
  > &
    Partial<HoldRow>,
  transaction: Transaction,
): Promise<HoldRow> {
  const made = await HoldModel.create(hold, { transaction });
  await made.reload({ transaction });
  return made.get({ plain: true });
}

/** False when it was lifted already. */
export async function markLifted(
  id: string,
  values: { liftedOn: string; liftedBy: string; liftReason: string },
  transaction: Transaction,
): Promise<boolean> {
  const [changed] = await HoldModel.update(values, {
    where: { id, liftedOn: null },
    transaction,
  });
  return changed === 1;
}
