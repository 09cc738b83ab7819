/** The random part of single-use links. */
import { createHash, randomBytes } from 'node:crypto';

const hourMs = 60 * 60 * 1000;
export const resetValidMs = 2 * hourMs;
export const emailChangeValidMs = 24 * hourMs;
export const invitationValidMs = 14 * 24 * hourMs;

export function newToken(): { token: string; tokenHash: string } {
  const token = randomBytes(32).toString('base64url');
  return { token, tokenHash: hashToken(token) };
}

/** What is kept of a token: its random part has 256 bits, so a plain hash is enough. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}

export function after(now: Date, durationMs: number): Date {
  return new Date(now.getTime() + durationMs);
}
