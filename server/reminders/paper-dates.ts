/** The dates of a paper that somebody should be told about; the mail and the calendar share them. */
import type { IsoDate } from '../contract/dates.ts';
import { defaultLeadDays } from '../contract/households.ts';
import type { PaperRow } from '../contract/papers.ts';
import type { Reminder } from '../contract/reminders.ts';
import { addDays } from './days.ts';

/** What is known of a paper here: a row of the register, and whether its longer date was stepped down. */
export type DatedPaper = Pick<
  PaperRow,
  | 'id'
  | 'number'
  | 'boxCode'
  | 'place'
  | 'class'
  | 'status'
  | 'keptBecause'
  | 'expiresOn'
  | 'keepUntil'
  | 'shredFrom'
  | 'advisedUntil'
  | 'permanent'
  | 'open'
  | 'held'
> & {
  /** A person stepped down from "advised until"; the rule's own date counts then. */
  isSteppedDown?: boolean;
  /** The paper is for this person's eyes only. */
  eyesOnlyUserId?: string | null;
};

export interface PaperDate {
  kind: Reminder['kind'];
  /** Day on which it becomes worth saying. */
  from: IsoDate;
  /** The date itself: the day of expiry, or the last day on which the paper is kept. */
  about: IsoDate;
  /** After this day it is too late to be of use; null when it never is. */
  until: IsoDate | null;
}

/** Days of notice for classes that carry an expiry but stand in no table (common practice, no source). */
export const otherLeadDays = 30;

/** Days of notice before a paper of a class expires; the household's own number wins. */
export function findLeadDays(classId: string, householdLeadDays: Record<string, number>): number {
  return householdLeadDays[classId] ?? defaultLeadDays[classId] ?? otherLeadDays;
}

/**
 * The dates of one paper, whatever today is.
 * - `expiry`: for every paper with an expiry that has not left.
 * - `keep-until`: only for papers a person looked at and still has, that are neither permanent, open nor
 *   held, and not kept for use or love. It opens on the day after the last day of keeping, or after
 *   "advised until" where that is later and nobody stepped down from it.
 */
export function listPaperDates(
  paper: DatedPaper,
  householdLeadDays: Record<string, number> = {},
): PaperDate[] {
  const dates: PaperDate[] = [];
  if (paper.status !== 'left' && paper.expiresOn) {
    dates.push({
      kind: 'expiry',
      from: addDays(paper.expiresOn, -findLeadDays(paper.class, householdLeadDays)),
      about: paper.expiresOn,
      until: paper.expiresOn,
    });
  }
  const lastKeptOn = findLastDayOfKeeping(paper);
  if (lastKeptOn) {
    dates.push({
      kind: 'keep-until',
      from: addDays(lastKeptOn, 1),
      about: lastKeptOn,
      until: null,
    });
  }
  return dates;
}

/** Null when the end of keeping is not known, never comes, or is nothing to speak of. */
function findLastDayOfKeeping(paper: DatedPaper): IsoDate | null {
  const isDecided = paper.status === 'kept' || paper.status === 'undecided';
  const isKeptByChoice = paper.keptBecause === 'use' || paper.keptBecause === 'dear';
  if (!isDecided || isKeptByChoice) return null;
  if (paper.permanent || paper.open || paper.held) return null;
  // Without a date to keep it until, or a day from which it may go, no time is running out.
  if (!paper.keepUntil || !paper.shredFrom) return null;
  const lastByRule = addDays(paper.shredFrom, -1);
  const advised = paper.isSteppedDown ? null : paper.advisedUntil;
  return advised && advised > lastByRule ? advised : lastByRule;
}
