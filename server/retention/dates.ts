/**
 * Civil calendar days as `yyyy-mm-dd` text: no time zone, no `Date`, any year from 0001 to 9999 in the
 * proleptic Gregorian calendar. Text of this shape sorts as the days do, so days are compared with `<`.
 */
import type { IsoDate } from '../contract/dates.ts';

const monthNames = [
  'Jan',
  'Feb',
  'Mar',
  'Apr',
  'May',
  'Jun',
  'Jul',
  'Aug',
  'Sep',
  'Oct',
  'Nov',
  'Dec',
];
const monthLengths = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
const twoDigits = Array.from({ length: 100 }, (_, n) => String(n).padStart(2, '0'));
const lastYear = 9999;

/** Year of an ISO day, 1 to 9999. */
export function yearOf(day: IsoDate): number {
  return (
    (day.charCodeAt(0) - 48) * 1000 +
    (day.charCodeAt(1) - 48) * 100 +
    (day.charCodeAt(2) - 48) * 10 +
    (day.charCodeAt(3) - 48)
  );
}

/** Month of an ISO day, 1 to 12. */
export function monthOf(day: IsoDate): number {
  return (day.charCodeAt(5) - 48) * 10 + (day.charCodeAt(6) - 48);
}

/** Day of the month, 1 to 31. */
export function dayOfMonth(day: IsoDate): number {
  return (day.charCodeAt(8) - 48) * 10 + (day.charCodeAt(9) - 48);
}

/** Whether a Gregorian year has a 29 February. */
export function isLeapYear(year: number): boolean {
  return (year & 3) === 0 && (year % 100 !== 0 || year % 400 === 0);
}

/** Length of a month (1 to 12) in days. */
export function lengthOfMonth(year: number, month: number): number {
  return month === 2 && isLeapYear(year) ? 29 : (monthLengths[month - 1] ?? 31);
}

function yearText(year: number): string {
  if (year >= 1000) return String(year);
  return String(Math.max(year, 1)).padStart(4, '0');
}

/** The ISO day of a year, month (1 to 12) and day; a year past 9999 gives the last day there is. */
export function makeDay(year: number, month: number, day: number): IsoDate {
  if (year > lastYear) return '9999-12-31';
  return `${yearText(year)}-${twoDigits[month] ?? '01'}-${twoDigits[day] ?? '01'}`;
}

/** Whether the text is a day that exists, for example not 2023-02-29. */
export function isRealDay(text: string): boolean {
  if (!/^\d{4}-\d{2}-\d{2}$/.test(text)) return false;
  const month = monthOf(text);
  const day = dayOfMonth(text);
  if (yearOf(text) < 1 || month < 1 || month > 12) return false;
  return day >= 1 && day <= lengthOfMonth(yearOf(text), month);
}

/** Adds whole months. The day of the month stays; where it does not exist, the last day of the month. */
export function addMonths(day: IsoDate, months: number): IsoDate {
  const index = yearOf(day) * 12 + (monthOf(day) - 1) + months;
  const year = Math.floor(index / 12);
  const month = index - year * 12 + 1;
  return makeDay(year, month, Math.min(dayOfMonth(day), lengthOfMonth(year, month)));
}

/** Adds whole years; 29 February becomes 28 February in a year that has none, never the other way. */
export function addYears(day: IsoDate, years: number): IsoDate {
  const year = yearOf(day) + years;
  if (year > lastYear) return '9999-12-31';
  const rest = day.slice(4);
  if (rest === '-02-29' && !isLeapYear(year)) return `${yearText(year)}-02-28`;
  return yearText(year) + rest;
}

/** Days since 1970-01-01, negative before. Arithmetic of eras of 400 years, from memory. */
export function toDayNumber(day: IsoDate): number {
  const month = monthOf(day);
  const year = yearOf(day) - (month <= 2 ? 1 : 0);
  const era = Math.floor(year / 400);
  const yearOfEra = year - era * 400;
  const dayOfYear =
    Math.floor((153 * (month + (month > 2 ? -3 : 9)) + 2) / 5) + dayOfMonth(day) - 1;
  const dayOfEra =
    yearOfEra * 365 + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100) + dayOfYear;
  return era * 146_097 + dayOfEra - 719_468;
}

/** The ISO day of a number of days since 1970-01-01. */
export function fromDayNumber(number: number): IsoDate {
  const shifted = number + 719_468;
  const era = Math.floor(shifted / 146_097);
  const dayOfEra = shifted - era * 146_097;
  const yearOfEra = Math.floor(
    (dayOfEra -
      Math.floor(dayOfEra / 1460) +
      Math.floor(dayOfEra / 36_524) -
      Math.floor(dayOfEra / 146_096)) /
      365,
  );
  const dayOfYear =
    dayOfEra - (365 * yearOfEra + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100));
  const monthIndex = Math.floor((5 * dayOfYear + 2) / 153);
  const day = dayOfYear - Math.floor((153 * monthIndex + 2) / 5) + 1;
  const month = monthIndex < 10 ? monthIndex + 3 : monthIndex - 9;
  return makeDay(yearOfEra + era * 400 + (month <= 2 ? 1 : 0), month, day);
}

/** Adds days (negative goes back). */
export function addDays(day: IsoDate, days: number): IsoDate {
  const moved = dayOfMonth(day) + days;
  if (moved >= 1 && moved <= 28) return day.slice(0, 8) + (twoDigits[moved] ?? '01');
  return fromDayNumber(toDayNumber(day) + days);
}

/** The day after. */
export function nextDay(day: IsoDate): IsoDate {
  return addDays(day, 1);
}

/** Weekday, 0 = Sunday to 6 = Saturday. */
export function weekdayOf(day: IsoDate): number {
  return (((toDayNumber(day) + 4) % 7) + 7) % 7;
}

/** The later of two days. */
export function laterOf(a: IsoDate, b: IsoDate): IsoDate {
  return a < b ? b : a;
}

/** The latest of the days that are known; null when none is. */
export function findLatest(days: readonly (IsoDate | null | undefined)[]): IsoDate | null {
  let latest: IsoDate | null = null;
  for (const day of days) if (day && (latest === null || day > latest)) latest = day;
  return latest;
}

/** 31 December of the day's year. */
export function endOfCalendarYear(day: IsoDate): IsoDate {
  return `${day.slice(0, 4)}-12-31`;
}

/** Last day of the day's month. */
export function endOfMonth(day: IsoDate): IsoDate {
  return makeDay(yearOf(day), monthOf(day), lengthOfMonth(yearOf(day), monthOf(day)));
}

/** Whether the day is the last of its month. */
export function isEndOfMonth(day: IsoDate): boolean {
  return dayOfMonth(day) === lengthOfMonth(yearOf(day), monthOf(day));
}

/**
 * Last day of the year that ends on `monthDay` (`mm-dd`) and holds the day: a paper of 5 April 2024
 * belongs to the British tax year ending that day, one of 6 April to the next.
 */
export function endOfYearEnding(day: IsoDate, monthDay: string): IsoDate {
  const sameYear = `${day.slice(0, 4)}-${monthDay}`;
  return day <= sameYear ? sameYear : addYears(sameYear, 1);
}

/** The first `mm-dd` after the day (never the day itself): "the 31 January next following". */
export function nextFollowing(day: IsoDate, monthDay: string): IsoDate {
  const sameYear = `${day.slice(0, 4)}-${monthDay}`;
  return day < sameYear ? sameYear : addYears(sameYear, 1);
}

/** The first of several `mm-dd` days (ascending) after the day, never the day itself. */
export function nextFollowingOf(day: IsoDate, monthDays: readonly string[]): IsoDate {
  const tail = day.slice(5);
  for (const monthDay of monthDays) if (monthDay > tail) return `${day.slice(0, 4)}-${monthDay}`;
  return addYears(`${day.slice(0, 4)}-${monthDays[0] ?? '12-31'}`, 1);
}

/** The birthday at an age; somebody born on 29 February has it on 1 March in other years. */
export function birthdayAt(birthDate: IsoDate, age: number): IsoDate {
  const year = yearOf(birthDate) + age;
  if (birthDate.endsWith('-02-29') && !isLeapYear(year)) return makeDay(year, 3, 1);
  return addYears(birthDate, age);
}

/** A length of time; one of the parts is usually zero. */
export interface Period {
  readonly years: number;
  readonly months: number;
  readonly days: number;
}

/** Parses ISO 8601 date periods such as P6Y, P18M, P1Y6M, P60D; throws RangeError on other text. */
export function parsePeriod(text: string): Period {
  const match = /^P(?=\d)(?:(\d{1,3})Y)?(?:(\d{1,4})M)?(?:(\d{1,5})D)?$/.exec(text);
  if (!match) {
    throw new RangeError(`"${text}" is not a period. Write it like P6Y, P18M or P60D.`);
  }
  return {
    years: Number(match[1] ?? 0),
    months: Number(match[2] ?? 0),
    days: Number(match[3] ?? 0),
  };
}

/** Adds a period: years and months first, then days. */
export function addPeriod(day: IsoDate, period: Period): IsoDate {
  let result = day;
  if (period.months === 0) {
    if (period.years !== 0) result = addYears(day, period.years);
  } else result = addMonths(day, period.years * 12 + period.months);
  return period.days === 0 ? result : addDays(result, period.days);
}

/** A period in words: "6 years", "1 year and 6 months". */
export function wordPeriod(period: Period): string {
  const parts: string[] = [];
  if (period.years) parts.push(period.years === 1 ? '1 year' : `${period.years} years`);
  if (period.months) parts.push(period.months === 1 ? '1 month' : `${period.months} months`);
  if (period.days) parts.push(period.days === 1 ? '1 day' : `${period.days} days`);
  return parts.length === 0 ? 'no further time' : parts.join(' and ');
}

/** A day in words for sentences: "31 Jan 2026". */
export function wordDay(day: IsoDate): string {
  return `${dayOfMonth(day)} ${monthNames[monthOf(day) - 1] ?? ''} ${Number(day.slice(0, 4))}`;
}
