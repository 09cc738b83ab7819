/** Arithmetic on calendar days as ISO text; no clock and no time zone. */
import type { IsoDate } from '../../contract/dates.ts';

const earliestYear = 1850;
const latestYear = 2099;

/** Days in a month, 1 to 12. */
export function countDaysInMonth(year: number, month: number): number {
  return new Date(Date.UTC(year, month, 0)).getUTCDate();
}

/** The ISO day, or null when there is no such day or the year is no year of a household paper. */
export function findIsoDate(year: number, month: number, day: number): IsoDate | null {
  if (!Number.isInteger(year) || year < earliestYear || year > latestYear) return null;
  if (!Number.isInteger(month) || month < 1 || month > 12) return null;
  if (!Number.isInteger(day) || day < 1 || day > countDaysInMonth(year, month)) return null;
  return `${year}-${String(month).padStart(2, '0')}-${String(day).padStart(2, '0')}`;
}

/** Year, month and day of an ISO day as numbers. */
export function splitIsoDate(on: IsoDate): { year: number; month: number; day: number } {
  return {
    year: Number(on.slice(0, 4)),
    month: Number(on.slice(5, 7)),
    day: Number(on.slice(8, 10)),
  };
}

/** Days since 1 January 1970, for differences. */
export function dayNumber(on: IsoDate): number {
  const { year, month, day } = splitIsoDate(on);
  return Math.round(Date.UTC(year, month - 1, day) / 86_400_000);
}

/** The day so many days later (or earlier when negative). */
export function addDays(on: IsoDate, days: number): IsoDate {
  return new Date((dayNumber(on) + days) * 86_400_000).toISOString().slice(0, 10);
}

/** The day so many months later; the last day of the month where the day does not exist. */
export function addMonths(on: IsoDate, months: number): IsoDate {
  const { year, month, day } = splitIsoDate(on);
  const index = year * 12 + (month - 1) + months;
  const toYear = Math.floor(index / 12);
  const toMonth = (index % 12) + 1;
  const toDay = Math.min(day, countDaysInMonth(toYear, toMonth));
  return `${toYear}-${String(toMonth).padStart(2, '0')}-${String(toDay).padStart(2, '0')}`;
}

/**
 * Four digits for a year printed with two: 00 to 45 are this century, the rest the last. Papers reach
 * back further than they reach forward (own judgement).
 */
export function expandYear(year: number): number {
  if (year >= 100) return year;
  return year <= 45 ? 2000 + year : 1900 + year;
}
