/** A change of e-mail address, confirmed at both addresses. */
import { randomUUID } from 'node:crypto';
import { checkPassword } from '../../auth/passwords.ts';
import {
  countTokensSince,
  endTokensOf,
  insertToken,
  listTokensOfChange,
  lockToken,
  markTokenUsed,
} from '../../db/repositories/account-token-repository.ts';
import {
  findFirstPracticeOf,
  findUser,
  findUserByEmail,
  updateUser,
} from '../../db/repositories/user-repository.ts';
import { inTransaction } from '../../db/transaction.ts';
import type { Deps } from '../../deps.ts';
import { ConflictError, InvalidInputError, TooManyError } from '../../errors.ts';
import { composeEmailChange } from '../../mail/account-letters.ts';
import { queueMail } from '../mail/queue-mail.ts';
import { linkIsOver } from './passwords.ts';
import { after, emailChangeValidMs, hashToken, newToken } from './tokens.ts';

type AccountDeps = Pick<Deps, 'clock' | 'config' | 'queue'>;

const hourMs = 60 * 60 * 1000;
/** Two links a change. */
const linksAnHour = 6;

/** @throws InvalidInputError when the password is not right */
export async function requestEmailChange(
  userId: string,
  input: { email: string; password: string },
  deps: AccountDeps,
): Promise<void> {
  const user = await findUser(userId);
  if (!user || !(await checkPassword(user.passwordHash, input.password))) {
    throw new InvalidInputError([
      { field: 'password', message: 'This is not your password. Check it and try again.' },
    ]);
  }
  const now = deps.clock.now();
  if ((await countTokensSince(userId, 'email-change', after(now, -hourMs))) >= linksAnHour) {
    throw new TooManyError('Several changes were asked for already. Try again in an hour.');
  }
  const practiceId = await findFirstPracticeOf(userId);
  // An address of somebody else is answered like any other: nobody learns whose it is.
  if (!practiceId || (await findUserByEmail(input.email))) return;
  const changeId = randomUUID();
  await inTransaction(async (transaction) => {
    await endTokensOf(userId, 'email-change', now, transaction);
    for (const address of [user.email, input.email]) {
      const { token, tokenHash } = newToken();
      await insertToken(
        {
          kind: 'email-change',
          tokenHash,
          userId,
          householdId: null,
          email: address,
          payload: { changeId, nextEmail: input.email, isConfirmed: false },
          createdAt: now,
          expiresAt: after(now, emailChangeValidMs),
        },
        transaction,
      );
      await queueMail(
        { practiceId, userId, address },
        composeEmailChange({
          name: user.name,
          url: `${deps.config.publicUrl}/confirm-address#${token}`,
          isNewAddress: address === input.email,
        }),
        deps,
        transaction,
      );
    }
  });
}

/** Confirms from one address; the change is made when both have. */
export async function confirmEmail(
  token: string,
  { clock }: Pick<Deps, 'clock'>,
): Promise<{ isChanged: boolean }> {
  return inTransaction(async (transaction) => {
    const now = clock.now();
    const link = await lockToken('email-change', hashToken(token), now, transaction);
    const changeId = link?.payload.changeId;
    const nextEmail = link?.payload.nextEmail;
    if (!link?.userId || typeof changeId !== 'string' || typeof nextEmail !== 'string') {
      throw new ConflictError(linkIsOver);
    }
    await markTokenUsed(link.id, now, transaction);
    const both = await listTokensOfChange(link.userId, changeId, transaction);
    if (both.some((other) => other.id !== link.id && other.usedAt === null)) {
      return { isChanged: false };
    }
    if (await findUserByEmail(nextEmail)) {
      throw new ConflictError(
        'This address has an account of its own meanwhile. Choose another one.',
      );
    }
    await updateUser(link.userId, { email: nextEmail }, transaction);
    return { isChanged: true };
  });
}
