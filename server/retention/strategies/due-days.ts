/** The day by which a return is due, when the case does not give it. */
import type { IsoDate } from '../../contract/dates.ts';
import { addMonths, endOfMonth, isEndOfMonth, nextFollowing } from '../dates.ts';
import { shiftToWorkingDay } from '../holidays.ts';
import type { DueRule } from '../rule-schema.ts';

/** The due day before any weekend shift, for a year (or a valuation date) that ends on `end`. */
export function findNominalDue(due: DueRule, end: IsoDate): IsoDate {
  switch (due.rule) {
    case 'next-month-day':
      return nextFollowing(end, due.monthDay);
    case 'months-after': {
      const day = addMonths(end, due.months);
      // A period that ends with a month is due with a month's end.
      return isEndOfMonth(end) ? endOfMonth(day) : day;
    }
    case 'fifteenth-of-fourth-month':
      return `${addMonths(`${end.slice(0, 8)}01`, 4).slice(0, 8)}15`;
    case 'gift-tax-october': {
      const thisYear = `${end.slice(0, 4)}-${due.monthDay}`;
      return end.slice(5) <= due.splitAfter ? thisYear : nextFollowing(thisYear, due.monthDay);
    }
  }
}

/** The due day as lateness is judged: given, or given before its shift, or worked out. */
export function findDue(
  due: DueRule,
  end: IsoDate,
  given: { dueOn?: IsoDate | null | undefined; nominalDueOn?: IsoDate | null | undefined },
): IsoDate {
  if (given.dueOn) return given.dueOn;
  const nominal = given.nominalDueOn ?? findNominalDue(due, end);
  return 'shift' in due && due.shift ? shiftToWorkingDay(nominal, due.shift) : nominal;
}
