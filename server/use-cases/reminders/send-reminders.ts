/**
 * The daily job: one digest a person with what is due. It may run twice, or die between: a reminder is
 * taken up, its message written and its sending queued in one transaction, once per person and date.
 */
import { listDatedPapers } from '../../db/repositories/dated-paper-repository.ts';
import { listAllHouseholds } from '../../db/repositories/all-households-repository.ts';
import type { HouseholdRow } from '../../db/models/household-model.ts';
import {
  claimReminders,
  linkReminders,
  listTakenKeys,
} from '../../db/repositories/mail-repository.ts';
import { listMembers, practiceNames } from '../../db/repositories/user-repository.ts';
import { inTransaction, type Transaction } from '../../db/transaction.ts';
import type { Deps } from '../../deps.ts';
import { composeReminderDigest, type DigestHousehold } from '../../mail/reminder-digest.ts';
import { dueReminders, type ReminderCandidate } from '../../reminders/due-reminders.ts';
import { queueMail } from '../mail/queue-mail.ts';

export type ReminderDeps = Pick<Deps, 'clock' | 'config' | 'queue'>;

interface DueHere {
  household: HouseholdRow;
  practiceName: string;
  candidates: ReminderCandidate[];
  address: string;
}

/** Not before this hour where the household lives: nobody is written to at night. */
const earliestHour = 7;

/** Sends what is due now in every household whose morning has come; answers the number of messages. */
export async function sendReminders(deps: ReminderDeps): Promise<number> {
  const byPerson = new Map<string, DueHere[]>();
  for (const household of await listAllHouseholds()) {
    if (hourIn(deps.clock.now(), household.timeZone) < earliestHour) continue;
    for (const [userId, due] of await findDue(household, deps)) {
      byPerson.set(userId, [...(byPerson.get(userId) ?? []), due]);
    }
  }
  let messages = 0;
  for (const [userId, due] of byPerson) {
    // A digest never mixes practices: each writes in its own name.
    for (const practiceId of new Set(due.map((d) => d.household.practiceId))) {
      const mine = due.filter((d) => d.household.practiceId === practiceId);
      const isWritten = await inTransaction((transaction) =>
        writeDigest(userId, practiceId, mine, deps, transaction),
      );
      if (isWritten) messages += 1;
    }
  }
  return messages;
}

async function findDue(
  household: HouseholdRow,
  { clock }: ReminderDeps,
): Promise<Map<string, DueHere>> {
  const today = clock.todayIn(household.timeZone);
  const [papers, members, names, taken] = await Promise.all([
    listDatedPapers(household.id),
    listMembers(household, today),
    practiceNames([household.practiceId]),
    listTakenKeys(household.id),
  ]);
  const candidates = dueReminders({
    papers,
    household,
    today,
    people: members.map((member) => ({
      userId: member.user.id,
      name: member.user.name,
      membership: member.membership,
    })),
  }).filter(
    (candidate) =>
      mayBeTold(candidate, papers) && !taken.has(`${candidate.userId} ${candidate.key}`),
  );
  const due = new Map<string, DueHere>();
  for (const candidate of candidates) {
    const entry = due.get(candidate.userId) ?? {
      household,
      practiceName: names.get(household.practiceId) ?? '',
      candidates: [],
      address: members.find((m) => m.user.id === candidate.userId)?.user.email ?? '',
    };
    entry.candidates.push(candidate);
    due.set(candidate.userId, entry);
  }
  return due;
}

/** A paper for one person's eyes is mentioned to that person alone. */
function mayBeTold(
  candidate: ReminderCandidate,
  papers: { id: string; eyesOnlyUserId: string | null }[],
): boolean {
  const eyes = papers.find((paper) => paper.id === candidate.paperId)?.eyesOnlyUserId ?? null;
  return eyes === null || eyes === candidate.userId;
}

async function writeDigest(
  userId: string,
  practiceId: string,
  due: DueHere[],
  deps: ReminderDeps,
  transaction: Transaction,
): Promise<boolean> {
  const claimed = await claimReminders(
    due.flatMap(({ household, candidates }) =>
      candidates.map((c) => ({
        householdId: household.id,
        userId,
        paperId: c.paperId,
        key: c.key,
        kind: c.kind,
        on: c.on,
        about: c.about,
      })),
    ),
    transaction,
  );
  if (claimed.size === 0) return false;
  const households: DigestHousehold[] = due.map(({ household, practiceName, candidates }) => ({
    householdName: household.name,
    practiceName,
    url: `${deps.config.publicUrl}/households/${household.id}/reminders`,
    items: candidates.filter((candidate) => claimed.has(candidate.key)),
  }));
  const first = due[0];
  if (!first) return false;
  const mailId = await queueMail(
    { practiceId, userId, address: first.address },
    composeReminderDigest({ personName: first.candidates[0]?.personName ?? '', households }),
    deps,
    transaction,
  );
  await linkReminders(userId, [...claimed], mailId, transaction);
  return true;
}

function hourIn(instant: Date, timeZone: string): number {
  return Number(
    new Intl.DateTimeFormat('en-GB', { timeZone, hour: '2-digit', hourCycle: 'h23' }).format(
      instant,
    ),
  );
}
