/** Invented papers with dates. */
import type { DatedPaper } from '../../server/reminders/paper-dates.ts';

export function makePaper(changes: Partial<DatedPaper> = {}): DatedPaper {
  return {
    id: '00000000-0000-4000-8000-000000000012',
    number: 12,
    boxCode: 'B-03',
    place: null,
    class: 'bank-statement',
    status: 'kept',
    keptBecause: 'duty',
    expiresOn: null,
    keepUntil: null,
    shredFrom: null,
    advisedUntil: null,
    permanent: false,
    open: false,
    held: false,
    ...changes,
  };
}

/** Kept until the end of January 2027, so that it may go from 1 February. */
export const statement = makePaper({ keepUntil: '2027-01-31', shredFrom: '2027-02-01' });
export const passport = makePaper({
  id: '00000000-0000-4000-8000-000000000013',
  number: 13,
  class: 'passport',
  expiresOn: '2027-10-01',
});
