/** When a message that could not be handed over is tried again. Pure. */

const minuteMs = 60_000;
const hourMinutes = 60;
const dayMinutes = 24 * hourMinutes;

/** Minutes to wait after the first, second, third and fourth failure (common practice, no source). */
export const firstDelaysMinutes = [1, 5, 15, 60] as const;
/** For so long a message is tried hourly; afterwards daily. RFC 5321 section 4.5.4.1 asks for 4 to 5 days of trying in all. */
export const hourlyForDays = 3;

/**
 * Minutes until the next attempt.
 * @param failures failed attempts so far, the one just made included: 1 or more
 * @param ageMinutes minutes since the message was written, at the failure
 */
export function findRetryDelayMinutes(failures: number, ageMinutes: number): number {
  if (!Number.isInteger(failures) || failures < 1) {
    throw new RangeError('Count at least one failed attempt before asking when to try again.');
  }
  const early = firstDelaysMinutes[failures - 1];
  if (early !== undefined) return early;
  return ageMinutes < hourlyForDays * dayMinutes ? hourMinutes : dayMinutes;
}

/** The instant of the next attempt after a failure. */
export function findNextAttemptAt(input: {
  createdAt: Date;
  failedAt: Date;
  failures: number;
}): Date {
  const ageMinutes = (input.failedAt.getTime() - input.createdAt.getTime()) / minuteMs;
  const delayMinutes = findRetryDelayMinutes(input.failures, ageMinutes);
  return new Date(input.failedAt.getTime() + delayMinutes * minuteMs);
}
