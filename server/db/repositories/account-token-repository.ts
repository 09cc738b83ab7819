/** Single-use links on record. */
import { Op, type Transaction } from 'sequelize';
import {
  AccountTokenModel,
  type AccountTokenRow,
  type TokenKind,
} from '../models/account-token-model.ts';

export type NewToken = Pick<
  AccountTokenRow,
  'kind' | 'tokenHash' | 'userId' | 'householdId' | 'email' | 'payload' | 'createdAt' | 'expiresAt'
>;

export async function insertToken(
  values: NewToken,
  transaction: Transaction,
): Promise<AccountTokenRow> {
  const made = await AccountTokenModel.create(values, { transaction });
  return made.get({ plain: true });
}

/** An unused link that has not run out, locked until the transaction ends. */
export async function lockToken(
  kind: TokenKind,
  tokenHash: string,
  now: Date,
  transaction: Transaction,
): Promise<AccountTokenRow | null> {
  const found = await AccountTokenModel.findOne({
    where: { kind, tokenHash, usedAt: null, expiresAt: { [Op.gt]: now } },
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  return found?.get({ plain: true }) ?? null;
}

export async function markTokenUsed(
  id: string,
  now: Date,
  transaction: Transaction,
): Promise<void> {
  await AccountTokenModel.update({ usedAt: now }, { where: { id }, transaction });
}

/** Ends all unused links of a kind for a user: an older message is worth nothing then. */
export async function endTokensOf(
  userId: string,
  kind: TokenKind,
  now: Date,
  transaction: Transaction,
): Promise<void> {
  await AccountTokenModel.update(
    { usedAt: now },
    { where: { userId, kind, usedAt: null }, transaction },
  );
}

/** How many links of a kind were made for a user since an instant. */
export async function countTokensSince(
  userId: string,
  kind: TokenKind,
  since: Date,
): Promise<number> {
  return AccountTokenModel.count({ where: { userId, kind, createdAt: { [Op.gte]: since } } });
}

/** Links of one change of address, used or not. */
export async function listTokensOfChange(
  userId: string,
  changeId: string,
  transaction: Transaction,
): Promise<AccountTokenRow[]> {
  const rows = await AccountTokenModel.findAll({
    where: { userId, kind: 'email-change' },
    transaction,
  });
  return rows
    .map((row) => row.get({ plain: true }))
    .filter((row) => row.payload.changeId === changeId);
}

export async function listOpenInvitations(householdId: string): Promise<AccountTokenRow[]> {
  const rows = await AccountTokenModel.findAll({
    where: { householdId, kind: 'invitation', usedAt: null },
    order: [['createdAt', 'DESC']],
  });
  return rows.map((row) => row.get({ plain: true }));
}

/** Withdraws an open invitation of a household; false when there is none. */
export async function withdrawInvitation(
  householdId: string,
  id: string,
  now: Date,
  transaction: Transaction,
): Promise<boolean> {
  const [count] = await AccountTokenModel.update(
    { usedAt: now },
    { where: { id, householdId, kind: 'invitation', usedAt: null }, transaction },
  );
  return count === 1;
}
