/** Forgotten and changed passwords, and where one is signed in. */
import type { Device } from '../../contract/accounts.ts';
import { checkPassword, demoPassword, hashPassword } from '../../auth/passwords.ts';
import {
  countTokensSince,
  endTokensOf,
  insertToken,
  lockToken,
  markTokenUsed,
} from '../../db/repositories/account-token-repository.ts';
import { endSessionsOf, listSessionsOf } from '../../db/repositories/session-repository.ts';
import {
  findUser,
  findUserByEmail,
  findFirstPracticeOf,
  updateUser,
} from '../../db/repositories/user-repository.ts';
import { inTransaction, type Transaction } from '../../db/transaction.ts';
import type { Deps } from '../../deps.ts';
import { ConflictError, InvalidInputError } from '../../errors.ts';
import { composePasswordChanged, composePasswordReset } from '../../mail/account-letters.ts';
import { queueMail } from '../mail/queue-mail.ts';
import { describeDevice } from './describe-device.ts';
import { after, hashToken, newToken, resetValidMs } from './tokens.ts';

type AccountDeps = Pick<Deps, 'clock' | 'config' | 'queue'>;

const hourMs = 60 * 60 * 1000;
/** Messages an hour to one account, whoever asks: nobody's mailbox is filled by a stranger. */
const resetsAnHour = 3;

export const linkIsOver = 'This link was used already or has run out. Ask for a new one.';

/** Sends a link when the address has an account; answers nothing either way. */
export async function requestPasswordReset(email: string, deps: AccountDeps): Promise<void> {
  const user = await findUserByEmail(email);
  if (!user) return;
  const now = deps.clock.now();
  const recent = await countTokensSince(user.id, 'password-reset', after(now, -hourMs));
  const practiceId = await findFirstPracticeOf(user.id);
  if (recent >= resetsAnHour || !practiceId) return;
  const { token, tokenHash } = newToken();
  await inTransaction(async (transaction) => {
    await insertToken(
      {
        kind: 'password-reset',
        tokenHash,
        userId: user.id,
        householdId: null,
        email: user.email,
        payload: {},
        createdAt: now,
        expiresAt: after(now, resetValidMs),
      },
      transaction,
    );
    await queueMail(
      { practiceId, userId: user.id, address: user.email },
      composePasswordReset({
        name: user.name,
        url: `${deps.config.publicUrl}/new-password#${token}`,
      }),
      deps,
      transaction,
    );
  });
}

/** @throws ConflictError when the link was used or has run out */
export async function resetPassword(
  input: { token: string; password: string },
  deps: AccountDeps,
): Promise<void> {
  requireOwnPassword(input.password, deps);
  const passwordHash = await hashPassword(input.password);
  const userId = await inTransaction(async (transaction) => {
    const now = deps.clock.now();
    const link = await lockToken('password-reset', hashToken(input.token), now, transaction);
    if (!link?.userId) throw new ConflictError(linkIsOver);
    await markTokenUsed(link.id, now, transaction);
    await setPassword(link.userId, passwordHash, deps, transaction);
    return link.userId;
  });
  await endSessionsOf(userId, null);
}

/** @throws InvalidInputError when the present password is not right */
export async function changePassword(
  userId: string,
  input: { current: string; next: string },
  sid: string,
  deps: AccountDeps,
): Promise<void> {
  const user = await findUser(userId);
  if (!(await checkPassword(user?.passwordHash ?? null, input.current))) {
    throw new InvalidInputError([
      { field: 'current', message: 'This is not your present password. Check it and try again.' },
    ]);
  }
  requireOwnPassword(input.next, deps, 'next');
  const passwordHash = await hashPassword(input.next);
  await inTransaction((transaction) => setPassword(userId, passwordHash, deps, transaction));
  await endSessionsOf(userId, sid);
}

/** Where somebody is signed in; `sid` is the session that asks. */
export async function listDevices(
  userId: string,
  sid: string,
): Promise<{ items: Device[]; total: number }> {
  const items = (await listSessionsOf(userId)).map((session) => ({
    // The id of a session is its key: only a hash leaves the server.
    id: hashToken(session.sid).slice(0, 16),
    description: describeDevice(session.userAgent ?? ''),
    signedInAt: session.signedInAt,
    isThis: session.sid === sid,
  }));
  return { items, total: items.length };
}

/** @throws InvalidInputError for the demo's password in production */
export function requireOwnPassword(
  password: string,
  { config }: Pick<Deps, 'config'>,
  field = 'password',
): void {
  if (config.isProduction && password === demoPassword) {
    throw new InvalidInputError([
      { field, message: 'Everybody knows this password. Choose one of your own.' },
    ]);
  }
}

async function setPassword(
  userId: string,
  passwordHash: string,
  deps: AccountDeps,
  transaction: Transaction,
): Promise<void> {
  const user = await findUser(userId);
  const practiceId = await findFirstPracticeOf(userId);
  await updateUser(userId, { passwordHash }, transaction);
  await endTokensOf(userId, 'password-reset', deps.clock.now(), transaction);
  if (!user || !practiceId) return;
  await queueMail(
    { practiceId, userId, address: user.email },
    composePasswordChanged({ name: user.name }),
    deps,
    transaction,
  );
}
