import type { IsoDate } from '../contract/dates.ts';

const monthNames = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
] as const;

/** "3 March 2027": the month as a word, so that nobody reads day and month the wrong way round. */
export function sayDay(day: IsoDate): string {
  const [year = '', month = '', dayOfMonth = ''] = day.split('-');
  const name = monthNames[Number(month) - 1];
  if (!name) throw new RangeError(`"${day}" is not a calendar day written yyyy-mm-dd.`);
  return `${Number(dayOfMonth)} ${name} ${year}`;
}

/** "1 paper", "12 papers". */
export function sayCount(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}
