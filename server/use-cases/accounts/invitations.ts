/** Inviting somebody to a household, and taking the invitation up. */
import type { z } from 'zod';
import { checkPassword, hashPassword } from '../../auth/passwords.ts';
import {
  type Invitation,
  type inviteSchema,
  type MembershipTerms,
  membershipTermsSchema,
  type openInvitationSchema,
  type updateMembershipSchema,
} from '../../contract/accounts.ts';
import type { AccountTokenRow } from '../../db/models/account-token-model.ts';
import {
  insertToken,
  listOpenInvitations,
  lockToken,
  markTokenUsed,
  withdrawInvitation as withdrawInvitationRow,
} from '../../db/repositories/account-token-repository.ts';
import { appendEvent } from '../../db/repositories/event-repository.ts';
import { findHousehold, findPracticeName } from '../../db/repositories/household-repository.ts';
import {
  findMember,
  findMembershipOf,
  findUserByEmail,
  insertMembership,
  insertUser,
  type Member,
  updateMembershipRow,
} from '../../db/repositories/user-repository.ts';
import { inTransaction } from '../../db/transaction.ts';
import type { Deps } from '../../deps.ts';
import { ConflictError, InvalidInputError, NotFoundError } from '../../errors.ts';
import { composeInvitation } from '../../mail/account-letters.ts';
import { queueMail } from '../mail/queue-mail.ts';
import { linkIsOver, requireOwnPassword } from './passwords.ts';
import { after, hashToken, invitationValidMs, newToken } from './tokens.ts';

type AccountDeps = Pick<Deps, 'clock' | 'config' | 'queue'>;
interface By {
  userId: string;
  userName: string;
  practiceId: string;
  householdId: string;
}

/** Rights of a client of whom nothing else was said: sees and decides everything, approves too. */
const usualRights = { see: 'all', decide: 'all', approve: 'all', export: 'all' } as const;

/** @throws InvalidInputError when role and terms do not go together */
export async function invite(
  input: z.infer<typeof inviteSchema>,
  by: By,
  deps: AccountDeps,
): Promise<Invitation> {
  const { email, name, ...given } = input;
  const terms = completeTerms(given);
  const now = deps.clock.now();
  const { token, tokenHash } = newToken();
  const practiceName = await findPracticeName(by.practiceId);
  const row = await inTransaction(async (transaction) => {
    const made = await insertToken(
      {
        kind: 'invitation',
        tokenHash,
        userId: null,
        householdId: by.householdId,
        email,
        payload: { name, terms },
        createdAt: now,
        expiresAt: after(now, invitationValidMs),
      },
      transaction,
    );
    await queueMail(
      { practiceId: by.practiceId, userId: null, address: email },
      composeInvitation({
        name,
        inviterName: by.userName,
        practiceName,
        url: `${deps.config.publicUrl}/invitation#${token}`,
      }),
      deps,
      transaction,
    );
    await appendEvent(
      { ...by, at: now, action: 'member.invited', sentence: `Invited ${name} as ${terms.role}.` },
      transaction,
    );
    return made;
  });
  return viewInvitation(row, now);
}

export async function listInvitations(householdId: string, { clock }: Pick<Deps, 'clock'>) {
  const items = (await listOpenInvitations(householdId)).map((row) =>
    viewInvitation(row, clock.now()),
  );
  return { items, total: items.length };
}

/** @throws NotFoundError */
export async function withdrawInvitation(
  id: string,
  by: By,
  { clock }: Pick<Deps, 'clock'>,
): Promise<void> {
  await inTransaction(async (transaction) => {
    if (!(await withdrawInvitationRow(by.householdId, id, clock.now(), transaction))) {
      throw new NotFoundError('This invitation was taken up or withdrawn already.');
    }
    await appendEvent(
      {
        ...by,
        at: clock.now(),
        action: 'member.invitation-withdrawn',
        sentence: 'Withdrew an invitation.',
      },
      transaction,
    );
  });
}

/** What a link leads to. @throws ConflictError when it was used or has run out */
export async function openInvitation(
  token: string,
  { clock }: Pick<Deps, 'clock'>,
): Promise<z.infer<typeof openInvitationSchema>> {
  const { link, terms, name } = await inTransaction(async (transaction) =>
    readLink(await lockToken('invitation', hashToken(token), clock.now(), transaction)),
  );
  const household = await findHousehold(link.householdId ?? '');
  if (!household) throw new ConflictError(linkIsOver);
  return {
    email: link.email,
    name,
    practiceName: await findPracticeName(household.practiceId),
    householdName: household.name,
    role: terms.role,
    hasAccount: (await findUserByEmail(link.email)) !== null,
  };
}

/**
 * Makes the membership, and the account where the address has none.
 * @returns the id of the user, to be signed in
 * @throws InvalidInputError when the address has an account and the password is not its own
 */
export async function acceptInvitation(
  input: { token: string; name: string; password: string },
  deps: AccountDeps,
): Promise<string> {
  const passwordHash = await hashPassword(input.password);
  return inTransaction(async (transaction) => {
    const now = deps.clock.now();
    const { link, terms } = readLink(
      await lockToken('invitation', hashToken(input.token), now, transaction),
    );
    const household = await findHousehold(link.householdId ?? '', transaction);
    if (!household) throw new ConflictError(linkIsOver);
    const known = await findUserByEmail(link.email);
    if (known && !(await checkPassword(known.passwordHash, input.password))) {
      throw new InvalidInputError([
        { field: 'password', message: 'This address has an account already. Enter its password.' },
      ]);
    }
    if (!known) requireOwnPassword(input.password, deps);
    const user =
      known ??
      (await insertUser({ email: link.email, name: input.name, passwordHash }, transaction));
    await markTokenUsed(link.id, now, transaction);
    const { evidence, startsOn, ...rest } = terms;
    await insertMembership(
      {
        ...rest,
        userId: user.id,
        practiceId: household.practiceId,
        householdId: household.id,
        evidence: evidence ? { words: evidence } : null,
        startsOn: startsOn ?? deps.clock.todayIn('UTC'),
      },
      transaction,
    );
    await appendEvent(
      {
        practiceId: household.practiceId,
        householdId: household.id,
        userId: user.id,
        at: now,
        action: 'member.joined',
        sentence: `Joined as ${terms.role}.`,
      },
      transaction,
    );
    return user.id;
  });
}

/** @throws NotFoundError when the membership is not one of the household */
export async function updateMembership(
  membershipId: string,
  changes: z.infer<typeof updateMembershipSchema>,
  by: By,
  { clock }: Pick<Deps, 'clock'>,
): Promise<Member> {
  await inTransaction(async (transaction) => {
    const before = await findMembershipOf(by.householdId, membershipId, transaction);
    if (!before) throw new NotFoundError();
    const { evidence, ...rest } = changes;
    const startsOn = rest.startsOn ?? before.startsOn;
    const endsOn = rest.endsOn === undefined ? before.endsOn : rest.endsOn;
    if (endsOn && endsOn < startsOn) {
      throw new InvalidInputError([
        { field: 'endsOn', message: 'A membership cannot end before it begins.' },
      ]);
    }
    await updateMembershipRow(
      membershipId,
      {
        ...rest,
        ...(evidence === undefined ? {} : { evidence: evidence ? { words: evidence } : null }),
      },
      transaction,
    );
    await appendEvent(
      {
        ...by,
        at: clock.now(),
        action: 'member.changed',
        sentence: `Changed a membership: ${Object.keys(changes).join(', ')}.`,
        detail: { membershipId },
      },
      transaction,
    );
  });
  const member = await findMember(by.householdId, membershipId);
  if (!member) throw new NotFoundError();
  return member;
}

function completeTerms(given: MembershipTerms): MembershipTerms {
  const problems = [];
  if (given.role === 'client' && !given.standing) {
    problems.push({ field: 'standing', message: 'Say what this person is to the household.' });
  }
  if (given.role === 'adviser' && (!given.sharedGroups || given.sharedGroups === 'none')) {
    problems.push({ field: 'sharedGroups', message: 'Choose which kinds of paper are shared.' });
  }
  if (problems.length > 0) throw new InvalidInputError(problems);
  return {
    ...given,
    standing: given.role === 'client' ? given.standing : null,
    rights: given.role === 'client' ? (given.rights ?? usualRights) : null,
    sharedGroups: given.role === 'adviser' ? given.sharedGroups : null,
  };
}

function readLink(link: AccountTokenRow | null) {
  const terms = membershipTermsSchema.safeParse(link?.payload.terms);
  if (!link || !terms.success) throw new ConflictError(linkIsOver);
  const { name } = link.payload;
  return { link, terms: terms.data, name: typeof name === 'string' ? name : '' };
}

function viewInvitation(row: AccountTokenRow, now: Date): Invitation {
  const { terms, name } = readLink(row);
  return {
    id: row.id,
    email: row.email,
    name,
    terms,
    createdAt: row.createdAt.toISOString(),
    expiresAt: row.expiresAt.toISOString(),
    isExpired: row.expiresAt <= now,
  };
}
