import type { IsoDate } from './contract/dates.ts';

/** The one place that knows what time it is. Everything else is given a clock, or the day itself. */
export interface Clock {
  now(): Date;
  /** The calendar day at this moment where the household lives; `timeZone` is an IANA name. */
  todayIn(timeZone: string): IsoDate;
}

/** A clock for tests and simulations, which stands still until it is set. */
export interface FixedClock extends Clock {
  set(instant: Date | string): void;
  advance(durationMs: number): void;
}

/**
 * The calendar day of an instant in a time zone, as `yyyy-mm-dd`.
 * @throws RangeError when the time zone is not an IANA name
 */
export function dayIn(instant: Date, timeZone: string): IsoDate {
  const parts = new Intl.DateTimeFormat('en-CA', {
    timeZone,
    calendar: 'iso8601',
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
  }).formatToParts(instant);
  const pick = (type: Intl.DateTimeFormatPartTypes) =>
    parts.find((part) => part.type === type)?.value ?? '';
  return `${pick('year').padStart(4, '0')}-${pick('month')}-${pick('day')}`;
}

export const systemClock: Clock = {
  now: () => new Date(),
  todayIn: (timeZone) => dayIn(new Date(), timeZone),
};

/** @throws RangeError when `start` is not an instant */
export function createFixedClock(start: Date | string): FixedClock {
  let current = parseInstant(start);
  return {
    now: () => new Date(current),
    todayIn: (timeZone) => dayIn(current, timeZone),
    set: (instant) => {
      current = parseInstant(instant);
    },
    advance: (durationMs) => {
      current = new Date(current.getTime() + durationMs);
    },
  };
}

function parseInstant(value: Date | string): Date {
  const instant = new Date(value);
  if (Number.isNaN(instant.getTime())) throw new RangeError(`Not an instant: ${String(value)}`);
  return instant;
}
