import type { IsoDate } from '../contract/dates.ts';

const dayMs = 86_400_000;

/** The calendar day `days` after (or, negative, before) a day; both `yyyy-mm-dd`, Gregorian. */
export function addDays(day: IsoDate, days: number): IsoDate {
  return new Date(Date.parse(`${day}T00:00:00Z`) + days * dayMs).toISOString().slice(0, 10);
}

/**
 * The same day of the month `months` later; where that month is shorter, its last day.
 * Example: 2027-01-31 and one month give 2027-02-28.
 */
export function addMonths(day: IsoDate, months: number): IsoDate {
  const year = Number(day.slice(0, 4));
  const month = Number(day.slice(5, 7)) - 1 + months;
  const lastOfMonth = new Date(Date.UTC(year, month + 1, 0)).getUTCDate();
  const dayOfMonth = Math.min(Number(day.slice(8, 10)), lastOfMonth);
  return new Date(Date.UTC(year, month, dayOfMonth)).toISOString().slice(0, 10);
}
