/** Weekends and public holidays that move a day on which something can still be done in time. */
import type { IsoDate } from '../contract/dates.ts';
import { addDays, makeDay, toDayNumber, weekdayOf, yearOf } from './dates.ts';

/** Calendars that rule tables may name: `us-dc` (legal holidays of the District of Columbia), `ca`. */
export const holidayCalendars = ['us-dc', 'ca'] as const;
export type HolidayCalendar = (typeof holidayCalendars)[number];

/** The nth weekday (0 = Sunday) of a month; n = -1 is the last one. */
function findNthWeekday(year: number, month: number, weekday: number, n: number): IsoDate {
  if (n > 0) {
    const first = makeDay(year, month, 1);
    return addDays(first, ((weekday - weekdayOf(first) + 7) % 7) + (n - 1) * 7);
  }
  const nextMonth = month === 12 ? makeDay(year + 1, 1, 1) : makeDay(year, month + 1, 1);
  const last = addDays(nextMonth, -1);
  return addDays(last, -((weekdayOf(last) - weekday + 7) % 7));
}

/** Where a fixed holiday is observed: Saturday on Friday, Sunday on Monday. */
function observeNearby(day: IsoDate): IsoDate {
  const weekday = weekdayOf(day);
  if (weekday === 6) return addDays(day, -1);
  return weekday === 0 ? addDays(day, 1) : day;
}

/**
 * Legal holidays in the District of Columbia that fall in a year, as observed. DC law is the list
 * (26 USC 7503; IRS Notice 2011-17 for Emancipation Day); the list itself is from memory.
 */
function listDistrictOfColumbia(year: number): Set<IsoDate> {
  const days = [
    observeNearby(makeDay(year, 1, 1)),
    // New Year's Day of a year that starts on a Saturday is observed on 31 December before it.
    observeNearby(makeDay(year + 1, 1, 1)),
    findNthWeekday(year, 1, 1, 3),
    findNthWeekday(year, 2, 1, 3),
    // Emancipation Day, a legal holiday of the District since 2005; counted before as well, which is longer.
    observeNearby(makeDay(year, 4, 16)),
    findNthWeekday(year, 5, 1, -1),
    observeNearby(makeDay(year, 7, 4)),
    findNthWeekday(year, 9, 1, 1),
    findNthWeekday(year, 10, 1, 2),
    observeNearby(makeDay(year, 11, 11)),
    findNthWeekday(year, 11, 4, 4),
    observeNearby(makeDay(year, 12, 25)),
  ];
  if (year >= 2021) days.push(observeNearby(makeDay(year, 6, 19)));
  // Inauguration day, after a presidential election; on a Sunday it is held on the Monday.
  if (year >= 1937 && year % 4 === 1) days.push(observeNearby(makeDay(year, 1, 20)));
  return new Set(days);
}

/** Easter Sunday of the Gregorian calendar (anonymous algorithm, from memory). */
function findEaster(year: number): IsoDate {
  const a = year % 19;
  const b = Math.floor(year / 100);
  const c = year % 100;
  const h =
    (19 * a + b - Math.floor(b / 4) - Math.floor((b - Math.floor((b + 8) / 25) + 1) / 3) + 15) % 30;
  const l = (32 + 2 * (b % 4) + 2 * Math.floor(c / 4) - h - (c % 4)) % 7;
  const m = Math.floor((a + 11 * h + 22 * l) / 451);
  const sum = h + l - 7 * m + 114;
  return makeDay(year, Math.floor(sum / 31), (sum % 31) + 1);
}

/** Canadian federal public holidays that a filing day can meet (Interpretation Act s.35, from memory). */
function listCanada(year: number): Set<IsoDate> {
  const easter = findEaster(year);
  const beforeVictoriaDay = makeDay(year, 5, 25);
  const victoriaDay = addDays(beforeVictoriaDay, -(((weekdayOf(beforeVictoriaDay) + 5) % 7) + 1));
  const moveSunday = (day: IsoDate): IsoDate => (weekdayOf(day) === 0 ? addDays(day, 1) : day);
  const days = [
    moveSunday(makeDay(year, 1, 1)),
    addDays(easter, -2),
    addDays(easter, 1),
    victoriaDay,
    moveSunday(makeDay(year, 7, 1)),
    findNthWeekday(year, 9, 1, 1),
    findNthWeekday(year, 10, 1, 2),
    moveSunday(makeDay(year, 11, 11)),
    moveSunday(makeDay(year, 12, 25)),
    makeDay(year, 12, 26),
  ];
  if (year >= 2021) days.push(moveSunday(makeDay(year, 9, 30)));
  return new Set(days);
}

const cache = new Map<string, Set<IsoDate>>();

function holidaysOf(calendar: HolidayCalendar, year: number): Set<IsoDate> {
  const key = `${calendar}${year}`;
  let days = cache.get(key);
  if (!days) {
    days = calendar === 'us-dc' ? listDistrictOfColumbia(year) : listCanada(year);
    cache.set(key, days);
  }
  return days;
}

/** Whether the day is a Saturday, a Sunday or a holiday of the calendar. */
export function isDayOff(day: IsoDate, calendar: HolidayCalendar): boolean {
  const weekday = (((toDayNumber(day) + 4) % 7) + 7) % 7;
  return weekday === 0 || weekday === 6 || holidaysOf(calendar, yearOf(day)).has(day);
}

/** The day itself, or the next one that is neither a weekend day nor a holiday. */
export function shiftToWorkingDay(day: IsoDate, calendar: HolidayCalendar): IsoDate {
  let moved = day;
  while (isDayOff(moved, calendar) && moved < '9999-12-31') moved = addDays(moved, 1);
  return moved;
}
