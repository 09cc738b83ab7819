import { describe, expect, test } from 'vitest';
import { parseDates } from '../../../server/reading/facts/parse-dates.ts';

const first = (text: string, dayFirst = true) => parseDates(text, { dayFirst })[0]?.value ?? null;

describe('dates as the countries print them', () => {
  test.each([
    ['3 March 2024', '2024-03-03'],
    ['3rd March, 2024', '2024-03-03'],
    ['March 3, 2024', '2024-03-03'],
    ['03-Mar-24', '2024-03-03'],
    ['3.3.2024', '2024-03-03'],
    ['2024-03-03', '2024-03-03'],
    ['2024/03/03', '2024-03-03'],
    ['this 2nd day of April 1996', '1996-04-02'],
    ['this 2nd day ofApril 1996', '1996-04-02'],
    ['the twenty-sixth day of March two thousand and fifteen', '2015-03-26'],
    ['Eighteenth July 2017', '2017-07-18'],
    ['14 AUG /AOUT 31', '2031-08-14'],
    ['02 BEAL/MAY 2033', '2033-05-02'],
    ['12 mars 2020', '2020-03-12'],
    ['5. Januar 2021', '2021-01-05'],
    ['1 Jan ’99', '1999-01-01'],
    ['61/13/2026', '2026-01-13'],
  ])('%s', (text, value) => {
    expect(first(text.replace('’', "'"))).toBe(value);
  });

  test('read 03/06 by the custom of the country, and 13/06 and 06/13 by what is possible', () => {
    expect(first('03/06/2024')).toBe('2024-06-03');
    expect(first('03/06/2024', false)).toBe('2024-03-06');
    expect(first('13/06/2024', false)).toBe('2024-06-13');
    expect(first('06/13/2024')).toBe('2024-06-13');
  });

  test('take two-digit years as this century up to 45 and as the last after it', () => {
    expect(first('01/02/45')).toBe('2045-02-01');
    expect(first('01/02/46')).toBe('1946-02-01');
  });

  test('give both ends of a stretch', () => {
    const [from, to] = parseDates('21 Jun to 20 Jul 2023', { dayFirst: true });
    expect([from?.value, from?.range, to?.value, to?.range]).toEqual([
      '2023-06-21',
      'from',
      '2023-07-20',
      'to',
    ]);
  });

  test.each(['31 February 2024', '29/02/2023', 'sort code 12-34-56', '01632 960111', '£1,204.11'])(
    'find none in "%s"',
    (text) => {
      expect(parseDates(text, { dayFirst: true }).filter((d) => d.precision === 'day')).toEqual([]);
    },
  );
});
