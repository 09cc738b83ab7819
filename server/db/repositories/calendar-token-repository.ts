/** Secret calendar addresses: one for each person and household. Only hashes of tokens are kept. */
import type { Transaction } from 'sequelize';
import { selectRows } from './sql.ts';

interface Owner {
  householdId: string;
  userId: string;
}

/** Keeps a new token; the one before stops working. */
export async function putCalendarToken(
  { householdId, userId }: Owner,
  tokenHash: string,
  transaction: Transaction,
): Promise<void> {
  await selectRows(
    `insert into calendar_tokens (household_id, user_id, token_hash)
     values ($householdId, $userId, $tokenHash)
     on conflict (household_id, user_id)
     do update set token_hash = excluded.token_hash, created_at = now()
     returning user_id`,
    { householdId, userId, tokenHash },
    transaction,
  );
}

/** Ends the token; false when there was none. */
export async function removeCalendarToken(
  { householdId, userId }: Owner,
  transaction: Transaction,
): Promise<boolean> {
  const rows = await selectRows(
    `delete from calendar_tokens where household_id = $householdId and user_id = $userId
     returning user_id`,
    { householdId, userId },
    transaction,
  );
  return rows.length > 0;
}

/** Whose token it is; null when it is nobody's in this household. */
export async function findCalendarTokenUser(
  householdId: string,
  tokenHash: string,
): Promise<string | null> {
  const rows = await selectRows<{ userId: string }>(
    `select user_id as "userId" from calendar_tokens
     where household_id = $householdId and token_hash = $tokenHash`,
    { householdId, tokenHash },
  );
  return rows[0]?.userId ?? null;
}
