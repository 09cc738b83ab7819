import type { IsoDate } from '../contract/dates.ts';

const longDay = new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeZone: 'UTC' });

/** "3 March 2027": the month as a word, so that nobody reads day and month the wrong way round. */
export function sayDay(day: IsoDate): string {
  return longDay.format(new Date(`${day}T00:00:00Z`));
}

/** "1 paper", "12 papers". */
export function sayCount(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}
