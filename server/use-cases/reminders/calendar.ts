/** The calendar feed and its secret address, and the dates of one paper as a file. */
import { createHash, randomBytes } from 'node:crypto';
import { writeCalendarFeed } from '../../calendar/feed.ts';
import { type Membership, reaches, type Reach, reachOf } from '../../contract/permissions.ts';
import {
  findCalendarTokenUser,
  putCalendarToken,
  removeCalendarToken,
} from '../../db/repositories/calendar-token-repository.ts';
import { listDatedPapers } from '../../db/repositories/dated-paper-repository.ts';
import { appendEvent } from '../../db/repositories/event-repository.ts';
import { findHousehold } from '../../db/repositories/household-repository.ts';
import { findPaper } from '../../db/repositories/paper-repository.ts';
import { listMemberships } from '../../db/repositories/user-repository.ts';
import { inTransaction } from '../../db/transaction.ts';
import type { Deps } from '../../deps.ts';
import { ConflictError, NotFoundError } from '../../errors.ts';
import { type Actor, requireVisible } from '../papers/actor.ts';

interface By {
  householdId: string;
  practiceId: string;
  userId: string;
}
type CalendarDeps = Pick<Deps, 'clock' | 'config'>;

/** Makes a person's own address; their one before stops working. Only a hash of the token is kept. */
export async function makeCalendarAddress(
  by: By,
  { clock, config }: CalendarDeps,
): Promise<{ url: string }> {
  const token = randomBytes(24).toString('base64url');
  await inTransaction(async (transaction) => {
    await putCalendarToken(by, hashOf(token), transaction);
    await appendEvent(
      {
        ...by,
        at: clock.now(),
        action: 'calendar.address-made',
        sentence: 'Made a new calendar address; an earlier one stopped working.',
      },
      transaction,
    );
  });
  return {
    url: `${config.publicUrl}/api/households/${by.householdId}/calendar.ics?token=${token}`,
  };
}

/** Ends a person's own address; does nothing when there is none. */
export async function endCalendarAddress(
  by: By,
  { clock }: Pick<CalendarDeps, 'clock'>,
): Promise<void> {
  await inTransaction(async (transaction) => {
    if (!(await removeCalendarToken(by, transaction))) return;
    await appendEvent(
      {
        ...by,
        at: clock.now(),
        action: 'calendar.address-ended',
        sentence: 'Ended the calendar address.',
      },
      transaction,
    );
  });
}

/**
 * The feed behind an address: what its owner may see today.
 * @throws NotFoundError when the household, the token or the membership is not right: none is told apart
 */
export async function readCalendar(
  householdId: string,
  token: string,
  { clock, config }: CalendarDeps,
): Promise<string> {
  const gone = new NotFoundError('This calendar address does not work any more. Make a new one.');
  const household = await findHousehold(householdId);
  const userId = household && (await findCalendarTokenUser(householdId, hashOf(token)));
  if (!household || !userId) throw gone;
  const memberships = await listMemberships(userId, clock.todayIn(household.timeZone));
  const reach = findReach(memberships, household);
  if (!reaches(reach)) throw gone;
  const papers = (await listDatedPapers(householdId)).filter(
    (paper) => paper.eyesOnlyUserId === null || paper.eyesOnlyUserId === userId,
  );
  return writeCalendarFeed({
    papers,
    household,
    reach,
    stampedAt: clock.now(),
    paperUrl: (paperId) => addressOfPaper(config, householdId, paperId),
  });
}

/** The dates of one paper as a file for a calendar program. @throws ConflictError when it has none */
export async function readPaperCalendar(
  paperId: string,
  actor: Actor,
  { clock, config }: CalendarDeps,
): Promise<string> {
  requireVisible(actor, await findPaper(paperId));
  const household = await findHousehold(actor.householdId);
  const paper = (await listDatedPapers(actor.householdId)).find(({ id }) => id === paperId);
  if (!household) throw new NotFoundError();
  if (!paper) throw new ConflictError('This paper has no date that a calendar could show.');
  return writeCalendarFeed({
    papers: [paper],
    household,
    stampedAt: clock.now(),
    paperUrl: (id) => addressOfPaper(config, actor.householdId, id),
  });
}

function addressOfPaper(
  { publicUrl }: Pick<Deps['config'], 'publicUrl'>,
  householdId: string,
  paperId: string,
): string {
  return `${publicUrl}/households/${householdId}/review/${paperId}`;
}

/** How far the memberships that are in force reach in this household's calendar. */
function findReach(
  memberships: Membership[],
  household: { id: string; practiceId: string },
): Reach {
  const granting = memberships.find(
    (m) =>
      m.practiceId === household.practiceId &&
      (m.householdId === household.id || m.householdId === null) &&
      reaches(reachOf(m, 'calendar:read')),
  );
  return granting ? reachOf(granting, 'calendar:read') : 'none';
}

function hashOf(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
