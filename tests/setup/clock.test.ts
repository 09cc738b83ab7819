import { describe, expect, test } from 'vitest';
import { createFixedClock, dayIn } from '../../server/clock.ts';

describe('the day', () => {
  // Offsets of the IANA time zone database, 2026 rules; from memory, and the same in ICU.
  test.each([
    ['2026-03-29T00:59:59Z', 'Europe/London', '2026-03-29'],
    ['2026-06-30T23:30:00Z', 'Europe/London', '2026-07-01'],
    ['2026-12-01T04:59:59Z', 'America/New_York', '2026-11-30'],
    ['2026-12-01T05:00:00Z', 'America/New_York', '2026-12-01'],
    ['2026-12-31T10:00:00Z', 'Pacific/Auckland', '2026-12-31'],
    ['2026-12-31T11:00:00Z', 'Pacific/Auckland', '2027-01-01'],
    ['2026-11-30T12:00:00Z', 'Pacific/Kiritimati', '2026-12-01'],
  ])('of %s in %s is %s', (instant, timeZone, day) => {
    expect(dayIn(new Date(instant), timeZone)).toBe(day);
  });

  test('is refused for a time zone that does not exist', () => {
    expect(() => dayIn(new Date(0), 'Europe/Atlantis')).toThrow(RangeError);
  });
});

describe('a fixed clock', () => {
  test('stands still, is set and moves on by hand', () => {
    const clock = createFixedClock('2026-12-01T09:00:00Z');
    expect(clock.now().toISOString()).toBe('2026-12-01T09:00:00.000Z');
    clock.advance(15 * 3_600_000);
    expect(clock.todayIn('UTC')).toBe('2026-12-02');
    clock.set('2027-01-01T00:00:00Z');
    expect(clock.todayIn('America/Chicago')).toBe('2026-12-31');
  });

  test('hands out a copy: a caller cannot move it', () => {
    const clock = createFixedClock('2026-12-01T09:00:00Z');
    clock.now().setFullYear(1999);
    expect(clock.todayIn('UTC')).toBe('2026-12-01');
  });

  test('is refused a text that is no instant', () => {
    expect(() => createFixedClock('tomorrow')).toThrow(/Not an instant/);
  });
});
