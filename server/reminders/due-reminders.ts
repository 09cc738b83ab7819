/** Which reminders are due on a day, and which are coming. Pure: the day is given. */
import type { IsoDate } from '../contract/dates.ts';
import { requireClass } from '../contract/document-classes.ts';
import type { Membership, Reach } from '../contract/permissions.ts';
import { reaches, reachOf } from '../contract/permissions.ts';
import type { Reminder } from '../contract/reminders.ts';
import { addMonths } from './days.ts';
import type { DatedPaper, PaperDate } from './paper-dates.ts';
import { listPaperDates } from './paper-dates.ts';

/** Somebody who may be told, with the membership that ties them to the household. */
export interface ReminderPerson {
  userId: string;
  name: string;
  membership: Pick<Membership, 'role' | 'rights' | 'sharedGroups' | 'startsOn' | 'endsOn'>;
}

/** One thing to tell one person. The pair of `key` and `userId` is told once, ever. */
export interface ReminderCandidate {
  key: string;
  userId: string;
  personName: string;
  kind: Reminder['kind'];
  /** Day from which it was due. */
  on: IsoDate;
  about: IsoDate;
  paperId: string;
  paperNumber: number;
  class: DatedPaper['class'];
  boxCode: string | null;
  place: string | null;
}

/** How far ahead the screen looks. */
export const comingMonths = 24;

/** Stable name of a reminder: a date that moves makes a new one, the same date never does. */
export function reminderKey(kind: Reminder['kind'], paperId: string, about: IsoDate): string {
  return `${kind}:${paperId}:${about}`;
}

/**
 * What is due on `today`, a line a person and paper, oldest date first. The caller leaves out those whose
 * key that person was sent before.
 *
 * Those told are the clients whose rights let them see the paper. Where no client can be told of a paper,
 * the owners of the practice are, so that no date passes unseen. Assistants and advisers are never told.
 * A paper for one person's eyes is told to that person or to nobody.
 */
export function dueReminders(input: {
  papers: readonly DatedPaper[];
  people: readonly ReminderPerson[];
  household: { leadDays: Record<string, number> };
  today: IsoDate;
}): ReminderCandidate[] {
  const { papers, household, today } = input;
  const people = input.people.filter((person) => isMemberOn(person, today));
  const due = papers.flatMap((paper) => {
    const dates = listPaperDates(paper, household.leadDays).filter((date) => isDue(date, today));
    if (dates.length === 0) return [];
    const told = choosePeople(people, paper);
    return dates.flatMap((date) => told.map((person) => describeCandidate(person, paper, date)));
  });
  return due.sort(
    (a, b) =>
      compareText(a.about, b.about) ||
      a.paperNumber - b.paperNumber ||
      compareText(a.userId, b.userId),
  );
}

/**
 * What the screen foresees from `today` on for the next 24 months, soonest first. A date that is due already
 * stands under today; the caller leaves out keys that are on record as queued or sent.
 * @param input.reach the class groups that the person who looks may see
 */
export function comingReminders(input: {
  papers: readonly DatedPaper[];
  household: { leadDays: Record<string, number> };
  today: IsoDate;
  reach?: Reach;
}): Reminder[] {
  const { papers, household, today, reach = 'all' } = input;
  const last = addMonths(today, comingMonths);
  return papers
    .filter((paper) => reaches(reach, requireClass(paper.class).group))
    .flatMap((paper) =>
      listPaperDates(paper, household.leadDays)
        .filter((date) => date.from <= last && !isOver(date, today))
        .map((date) => describeComing(paper, date, today)),
    )
    .sort(
      (a, b) => compareText(a.on, b.on) || compareText(a.about, b.about) || compareNumbers(a, b),
    );
}

function describeCandidate(
  person: ReminderPerson,
  paper: DatedPaper,
  date: PaperDate,
): ReminderCandidate {
  return {
    key: reminderKey(date.kind, paper.id, date.about),
    userId: person.userId,
    personName: person.name,
    kind: date.kind,
    on: date.from,
    about: date.about,
    paperId: paper.id,
    paperNumber: paper.number,
    class: paper.class,
    boxCode: paper.boxCode,
    place: paper.place,
  };
}

function describeComing(paper: DatedPaper, date: PaperDate, today: IsoDate): Reminder {
  return {
    key: reminderKey(date.kind, paper.id, date.about),
    kind: date.kind,
    state: 'coming',
    on: date.from > today ? date.from : today,
    about: date.about,
    paperId: paper.id,
    paperNumber: paper.number,
    class: paper.class,
    personName: null,
    sentAt: null,
    lastError: null,
  };
}

function isOver(date: PaperDate, today: IsoDate): boolean {
  return date.until !== null && date.until < today;
}

function isDue(date: PaperDate, today: IsoDate): boolean {
  return date.from <= today && !isOver(date, today);
}

function isMemberOn({ membership }: ReminderPerson, today: IsoDate): boolean {
  return membership.startsOn <= today && (membership.endsOn === null || today <= membership.endsOn);
}

function choosePeople(people: readonly ReminderPerson[], paper: DatedPaper): ReminderPerson[] {
  const group = requireClass(paper.class).group;
  const eyes = paper.eyesOnlyUserId ?? null;
  const readers = people.filter(
    (person) =>
      (eyes === null || eyes === person.userId) &&
      reaches(reachOf(person.membership, 'reminder:read'), group),
  );
  const clients = readers.filter((person) => person.membership.role === 'client');
  const told =
    clients.length > 0 ? clients : readers.filter((person) => person.membership.role === 'owner');
  // Two memberships of one person make one message.
  return [...new Map(told.map((person) => [person.userId, person])).values()];
}

function compareText(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

function compareNumbers(a: Reminder, b: Reminder): number {
  return (a.paperNumber ?? 0) - (b.paperNumber ?? 0);
}
