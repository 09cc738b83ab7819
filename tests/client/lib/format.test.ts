import { describe, expect, it } from 'vitest';
import {
  countDaysBetween,
  formatBytes,
  formatCount,
  formatDay,
  formatDistance,
  formatGrams,
  formatInstant,
  formatNumber,
  formatShortDay,
} from '../../../src/lib/format.ts';

describe('dates on screen', () => {
  it('writes a calendar day as it stands, wherever the browser is', () => {
    expect(formatDay('2025-06-03')).toBe('3 June 2025');
    expect(formatDay('2024-02-29')).toBe('29 February 2024');
    expect(formatShortDay('2025-12-31')).toBe('31 Dec 2025');
  });

  it('gives text that is no day back as it is', () => {
    expect(formatDay('some time')).toBe('some time');
  });

  it('writes an instant in the time zone of the household', () => {
    expect(formatInstant('2026-06-30T23:30:00Z', 'Europe/London')).toBe('1 July 2026, 00:30');
    expect(formatInstant('2026-06-30T23:30:00Z', 'America/New_York')).toBe('30 June 2026, 19:30');
  });

  it('counts whole days across a change of the clocks', () => {
    expect(countDaysBetween('2026-03-28', '2026-03-30')).toBe(2);
    expect(countDaysBetween('2026-03-30', '2026-03-28')).toBe(-2);
  });

  it.each([
    ['2026-12-01', 'today'],
    ['2026-12-02', 'tomorrow'],
    ['2026-11-30', 'yesterday'],
    ['2026-12-13', 'in 12 days'],
    ['2027-03-02', 'in 3 months'],
    ['2023-12-01', '3 years ago'],
  ])('says how far off %s is: %s', (day, words) => {
    expect(formatDistance('2026-12-01', day)).toBe(words);
  });
});

describe('amounts on screen', () => {
  it('groups thousands and agrees with one and many', () => {
    expect(formatNumber(1234567)).toBe('1\u202f234\u202f567');
    expect(formatCount(1, 'sheet')).toBe('1 sheet');
    expect(formatCount(0, 'sheet')).toBe('0 sheets');
    expect(formatCount(2, 'copy', 'copies')).toBe('2 copies');
  });

  it('writes weight and size in the unit that fits', () => {
    expect(formatGrams(995)).toBe('995 g');
    expect(formatGrams(1250)).toBe('1.3 kg');
    expect(formatBytes(120)).toBe('1 kB');
    expect(formatBytes(2_340_000)).toBe('2.3 MB');
  });
});
