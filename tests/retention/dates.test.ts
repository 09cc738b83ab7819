import Holidays from 'date-holidays';
import { add, addDays as addDaysElsewhere, formatISO, parseISO } from 'date-fns';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  addDays,
  addMonths,
  addYears,
  birthdayAt,
  endOfYearEnding,
  fromDayNumber,
  nextFollowing,
  nextFollowingOf,
  parsePeriod,
  toDayNumber,
  weekdayOf,
} from '../../server/retention/dates.ts';
import { isDayOff, shiftToWorkingDay } from '../../server/retention/holidays.ts';

const anyDay = fc.integer({ min: -120_000, max: 220_000 }).map(fromDayNumber);

describe('adding to a day', () => {
  it.each([
    ['2020-02-29', 6, '2026-02-28'],
    ['2023-02-28', 5, '2028-02-28'],
    ['2020-02-29', 4, '2024-02-29'],
    ['1896-02-29', 4, '1900-02-28'],
    ['2096-02-29', 4, '2100-02-28'],
    ['1931-05-04', 100, '2031-05-04'],
  ])('%s plus %i years is %s', (day, years, expected) => {
    expect(addYears(day, years)).toBe(expected);
  });

  it.each([
    ['2024-08-31', 6, '2025-02-28'],
    ['2023-08-31', 6, '2024-02-29'],
    ['2024-04-30', 15, '2025-07-30'],
    ['2024-01-15', -2, '2023-11-15'],
  ])('%s plus %i months is %s', (day, months, expected) => {
    expect(addMonths(day, months)).toBe(expected);
  });

  it('agrees with a date library on every day and length', () => {
    fc.assert(
      fc.property(
        anyDay,
        fc.integer({ min: 0, max: 40 }),
        fc.integer({ min: 0, max: 40 }),
        (day, n, m) => {
          const text = (date: Date): string => formatISO(date, { representation: 'date' });
          expect(addYears(day, n)).toBe(text(add(parseISO(day), { years: n })));
          expect(addMonths(day, m)).toBe(text(add(parseISO(day), { months: m })));
          expect(addDays(day, m - n)).toBe(text(addDaysElsewhere(parseISO(day), m - n)));
          expect(weekdayOf(day)).toBe(parseISO(day).getDay());
        },
      ),
    );
  });

  it('counts days without gaps', () => {
    fc.assert(fc.property(anyDay, (day) => fromDayNumber(toDayNumber(day)) === day));
    expect(toDayNumber('1970-01-01')).toBe(0);
    expect(addDays('1969-12-31', 1)).toBe('1970-01-01');
  });
});

describe('years and anniversaries', () => {
  it('puts 5 April into the tax year ending that day and 6 April into the next', () => {
    expect(endOfYearEnding('2024-04-05', '04-05')).toBe('2024-04-05');
    expect(endOfYearEnding('2024-04-06', '04-05')).toBe('2025-04-05');
  });

  it('never takes the day itself as the one that follows', () => {
    expect(nextFollowing('2024-04-05', '01-31')).toBe('2025-01-31');
    expect(nextFollowing('2025-01-31', '01-31')).toBe('2026-01-31');
    expect(nextFollowingOf('2025-04-30', ['01-31', '04-30', '07-31', '10-31'])).toBe('2025-07-31');
    expect(nextFollowingOf('2025-10-31', ['01-31', '04-30', '07-31', '10-31'])).toBe('2026-01-31');
  });

  it('gives somebody born on 29 February a birthday on 1 March', () => {
    expect(birthdayAt('2008-02-29', 18)).toBe('2026-03-01');
    expect(birthdayAt('2008-02-29', 20)).toBe('2028-02-29');
    expect(birthdayAt('2010-09-14', 18)).toBe('2028-09-14');
  });

  it('refuses what is not a period', () => {
    expect(parsePeriod('P1Y6M')).toEqual({ years: 1, months: 6, days: 0 });
    for (const text of ['6Y', 'P', 'P6', 'P-1Y', 'PT5H'])
      expect(() => parsePeriod(text)).toThrow(/P6Y/);
  });
});

describe('days that move', () => {
  // IRS Notice 2011-17 for Emancipation Day; due days of individual returns as the IRS published them.
  it.each([
    ['2016-04-15', '2016-04-18'],
    ['2017-04-15', '2017-04-18'],
    ['2018-04-15', '2018-04-17'],
    ['2019-04-15', '2019-04-15'],
    ['2022-04-15', '2022-04-18'],
    ['2023-04-15', '2023-04-18'],
    ['2024-04-15', '2024-04-15'],
    ['2028-04-15', '2028-04-18'],
    ['2029-04-15', '2029-04-17'],
    ['2030-04-15', '2030-04-15'],
  ])('a US return due %s could be filed until %s', (statutory, moved) => {
    expect(shiftToWorkingDay(statutory, 'us-dc')).toBe(moved);
  });

  it('knows inauguration day and the New Year that is observed in December', () => {
    expect(isDayOff('2025-01-20', 'us-dc')).toBe(true);
    expect(isDayOff('2021-12-31', 'us-dc')).toBe(true);
    expect(isDayOff('2020-06-19', 'us-dc')).toBe(false);
    expect(isDayOff('2024-06-19', 'us-dc')).toBe(true);
  });

  it('finds no public holiday of the District that a holiday library has and it has not', () => {
    const library = new Holidays('US', 'DC');
    for (let year = 2022; year <= 2040; year += 1) {
      const days = library.getHolidays(year).filter((holiday) => holiday.type === 'public');
      for (const holiday of days) {
        const day = holiday.date.slice(0, 10);
        // The library also lists the fixed date beside the day on which it is observed.
        expect(isDayOff(day, 'us-dc'), `${day} ${holiday.name}`).toBe(true);
      }
    }
  });

  it('moves Canadian due days over weekends and public holidays', () => {
    expect(shiftToWorkingDay('2023-04-30', 'ca')).toBe('2023-05-01');
    expect(shiftToWorkingDay('2024-06-15', 'ca')).toBe('2024-06-17');
    expect(isDayOff('2024-03-29', 'ca')).toBe(true);
    expect(isDayOff('2024-05-20', 'ca')).toBe(true);
  });
});
