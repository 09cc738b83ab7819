/** Telling a database that went away from a fault of our own, and waiting until it is back. */
import { BaseError, ConnectionError, DatabaseError } from 'sequelize';
import type { Database } from './connection.ts';

/** PostgreSQL error codes, appendix A: class 08 connection exceptions, 57P01 to 57P03 going down or starting. */
const lossCodes = /^(08...|57P0[123])$/;
/** What the operating system says of a connection that broke. */
const brokenSockets = ['ECONNREFUSED', 'ECONNRESET', 'EPIPE', 'ETIMEDOUT'];

/** Whether a query failed because the connection to the database broke. */
export function isConnectionLoss(error: unknown): boolean {
  if (error instanceof ConnectionError) return true;
  const cause: unknown =
    error instanceof DatabaseError
      ? error.parent
      : error instanceof BaseError
        ? error.cause
        : error;
  if (!(cause instanceof Error)) return false;
  const code = 'code' in cause && typeof cause.code === 'string' ? cause.code : '';
  return (
    lossCodes.test(code) ||
    brokenSockets.includes(code) ||
    /^Connection terminated|^Client has encountered a connection error/.test(cause.message)
  );
}

const pauseMs = 500;

/** Waits until the database answers, or until `signal` says to give up. */
export async function untilDatabaseAnswers(database: Database, signal: AbortSignal): Promise<void> {
  while (!signal.aborted) {
    const isUp = await database.query('select 1').then(
      () => true,
      () => false,
    );
    if (isUp) return;
    await new Promise((resolve) => setTimeout(resolve, pauseMs));
  }
}
