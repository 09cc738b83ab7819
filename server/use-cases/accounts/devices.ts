import { endSessionsOf } from '../../db/repositories/session-repository.ts';

/** Signs a user out everywhere but in the session that asks. */
export function endOtherSessions(userId: string, sid: string): Promise<void> {
  return endSessionsOf(userId, sid);
}
