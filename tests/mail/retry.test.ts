import { describe, expect, test } from 'vitest';
import { findNextAttemptAt, findRetryDelayMinutes } from '../../server/mail/retry.ts';

describe('trying a message again', () => {
  test('waits 1, 5, 15 and 60 minutes at first, however old the message is', () => {
    expect([1, 2, 3, 4].map((failures) => findRetryDelayMinutes(failures, 0))).toEqual([
      1, 5, 15, 60,
    ]);
    expect(findRetryDelayMinutes(1, 10 * 24 * 60)).toBe(1);
  });

  test('goes on hourly until the message is three days old, then daily', () => {
    expect(findRetryDelayMinutes(5, 81)).toBe(60);
    expect(findRetryDelayMinutes(70, 3 * 24 * 60 - 1)).toBe(60);
    expect(findRetryDelayMinutes(71, 3 * 24 * 60)).toBe(24 * 60);
    expect(findRetryDelayMinutes(400, 300 * 24 * 60)).toBe(24 * 60);
  });

  test('counts from the failure', () => {
    expect(
      findNextAttemptAt({
        createdAt: new Date('2026-12-01T06:00:00Z'),
        failedAt: new Date('2026-12-01T06:01:30Z'),
        failures: 2,
      }).toISOString(),
    ).toBe('2026-12-01T06:06:30.000Z');
  });

  test('cannot be asked before a failure', () => {
    expect(() => findRetryDelayMinutes(0, 0)).toThrow(/at least one failed attempt/);
  });
});
