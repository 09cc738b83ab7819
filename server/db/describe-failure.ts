/** What a person is told when the database cannot be used at the start. */

/** One sentence that says what to do; null when the fault is of another kind. */
export function describeDatabaseFailure(error: unknown): string | null {
  const { code, message } = findCause(error);
  if (code !== undefined && unreachable.includes(code)) {
    return 'The database does not answer. Start Slackwater with "npm start", or check DATABASE_URL.';
  }
  // PostgreSQL error codes, appendix A.
  if (code === '28P01' || code === '28000') {
    return 'The database refuses the account or password in DATABASE_URL. Correct it and start again.';
  }
  if (code === '3D000') {
    return 'The database named in DATABASE_URL does not exist. Create it first.';
  }
  if (code === '53100' || /No space left on device/i.test(message)) {
    return 'The disk of the database is full. Free some space and start again.';
  }
  if (code === '42501') {
    return 'The account in DATABASE_URL may not use this database. Make it the owner of the database.';
  }
  return null;
}

const unreachable = ['ECONNREFUSED', 'ECONNRESET', 'ENOTFOUND', 'EAI_AGAIN', 'ETIMEDOUT', '57P03'];

function findCause(error: unknown): { code: string | undefined; message: string } {
  let cause: unknown = error;
  for (let depth = 0; depth < 4 && cause instanceof Error; depth += 1) {
    if ('code' in cause && typeof cause.code === 'string') {
      return { code: cause.code, message: cause.message };
    }
    // Connecting to a name with several addresses fails once for each.
    const inner: unknown = cause instanceof AggregateError ? cause.errors[0] : undefined;
    cause = inner ?? ('parent' in cause ? cause.parent : cause.cause);
  }
  return { code: undefined, message: error instanceof Error ? error.message : String(error) };
}
