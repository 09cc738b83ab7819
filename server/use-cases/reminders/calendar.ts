/** The calendar feed and its secret address. */
import { createHash, randomBytes, timingSafeEqual } from 'node:crypto';
import { writeCalendarFeed } from '../../calendar/feed.ts';
import { listDatedPapers } from '../../db/repositories/dated-paper-repository.ts';
import { appendEvent } from '../../db/repositories/event-repository.ts';
import { findHousehold, setCalendarTokenHash } from '../../db/repositories/household-repository.ts';
import { inTransaction } from '../../db/transaction.ts';
import type { Deps } from '../../deps.ts';
import { NotFoundError } from '../../errors.ts';

/** Makes a new address; the one before stops working. Only a hash of the token is kept. */
export async function makeCalendarAddress(
  by: { householdId: string; practiceId: string; userId: string },
  { clock, config }: Pick<Deps, 'clock' | 'config'>,
): Promise<{ url: string }> {
  const token = randomBytes(24).toString('base64url');
  await inTransaction(async (transaction) => {
    await setCalendarTokenHash(by.householdId, hashOf(token), transaction);
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

/** @throws NotFoundError when the household or the token is not right: neither is told apart */
export async function readCalendar(
  householdId: string,
  token: string,
  { clock, config }: Pick<Deps, 'clock' | 'config'>,
): Promise<string> {
  const household = await findHousehold(householdId);
  const expected = Buffer.from(household?.calendarTokenHash ?? '');
  const given = Buffer.from(hashOf(token));
  if (!household || expected.length !== given.length || !timingSafeEqual(expected, given)) {
    throw new NotFoundError('This calendar address does not work any more. Make a new one.');
  }
  const papers = (await listDatedPapers(householdId)).filter((p) => p.eyesOnlyUserId === null);
  return writeCalendarFeed({
    papers,
    household,
    stampedAt: clock.now(),
    paperUrl: (paperId) => `${config.publicUrl}/households/${householdId}/review/${paperId}`,
  });
}

function hashOf(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
