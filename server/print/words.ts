import type { IsoDate } from '../contract/dates.ts';

const shortDay = new Intl.DateTimeFormat('en-US', {
  day: 'numeric',
  month: 'short',
  year: 'numeric',
  timeZone: 'UTC',
});

/** "3 Mar 2027": the month as a word, so that nobody reads day and month the wrong way round. */
export function sayDay(day: IsoDate): string {
  const parts = shortDay.formatToParts(new Date(`${day}T00:00:00Z`));
  const pick = (type: Intl.DateTimeFormatPartTypes) =>
    parts.find((part) => part.type === type)?.value ?? '';
  return `${pick('day')} ${pick('month')} ${pick('year')}`;
}

/** "1 sheet", "12 sheets". */
export function sayCount(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}

/** Grams below a kilogram, else kilograms with one decimal: "about 0.6 kg" would hide a thin list. */
export function sayWeight(grams: number): string {
  return grams < 1000 ? `${Math.round(grams)} g` : `${(grams / 1000).toFixed(1)} kg`;
}

const basisWords: Record<string, string> = {
  law: 'set by law',
  guidance: "an authority's guidance",
  practice: 'common practice',
};

/** What a rule rests on. */
export function sayBasis(basis: string): string {
  return basisWords[basis] ?? basis;
}
