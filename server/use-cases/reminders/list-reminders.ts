import type { z } from 'zod';
import type { mailSchema, Reminder } from '../../contract/reminders.ts';
import { listDatedPapers } from '../../db/repositories/dated-paper-repository.ts';
import { findHousehold } from '../../db/repositories/household-repository.ts';
import { listMails, listTakenReminders } from '../../db/repositories/mail-repository.ts';
import type { Deps } from '../../deps.ts';
import { NotFoundError } from '../../errors.ts';
import { comingReminders } from '../../reminders/due-reminders.ts';
import { type Actor, visibilityOf } from '../papers/actor.ts';

/** What is coming within two years, soonest first, then what was sent, newest first. */
export async function listReminders(
  householdId: string,
  viewer: Pick<Actor, 'user' | 'reach' | 'seeReach'>,
  { clock }: Pick<Deps, 'clock'>,
): Promise<{ items: Reminder[]; total: number }> {
  const household = await findHousehold(householdId);
  if (!household) throw new NotFoundError();
  const papers = (await listDatedPapers(householdId)).filter(
    (paper) => paper.eyesOnlyUserId === null || paper.eyesOnlyUserId === viewer.user.id,
  );
  const taken = await listTakenReminders(householdId, visibilityOf(viewer, viewer.reach));
  const takenKeys = new Set(taken.map((reminder) => reminder.key));
  const coming = comingReminders({
    papers,
    household,
    today: clock.todayIn(household.timeZone),
    reach: viewer.reach,
  }).filter((reminder) => !takenKeys.has(reminder.key));
  const sent = taken.map((reminder): Reminder => {
    // Of a paper that left, its place in time is told, no detail.
    const isHere = reminder.paperStatus !== 'left';
    return {
      key: `${reminder.key}:${reminder.personName}`,
      kind: reminder.kind,
      state: reminder.state ?? 'queued',
      on: reminder.on,
      about: reminder.about,
      paperId: isHere ? reminder.paperId : null,
      paperNumber: isHere ? reminder.paperNumber : null,
      class: isHere ? reminder.class : null,
      personName: reminder.personName,
      sentAt: reminder.sentAt ? new Date(reminder.sentAt).toISOString() : null,
      lastError: reminder.lastError,
    };
  });
  const items = [...coming, ...sent];
  return { items, total: items.length };
}

/** Messages of a practice, newest first. */
export async function listPracticeMail(
  practiceId: string,
  page: { page: number; pageSize: number },
): Promise<{ items: z.infer<typeof mailSchema>[]; total: number }> {
  const { rows, total } = await listMails(practiceId, {
    offset: (page.page - 1) * page.pageSize,
    limit: page.pageSize,
  });
  return {
    total,
    items: rows.map((row) => ({
      id: row.id,
      toName: row.toName,
      subject: row.subject,
      state: row.state,
      attempts: row.attempts,
      createdAt: row.createdAt.toISOString(),
      sentAt: row.sentAt?.toISOString() ?? null,
      nextAttemptAt: row.nextAttemptAt?.toISOString() ?? null,
      lastError: row.lastError,
    })),
  };
}
