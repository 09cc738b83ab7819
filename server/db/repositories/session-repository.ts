/** Signed-in devices: rows of the session store that belong to a user. */
import { QueryTypes } from 'sequelize';
import { UserModel } from '../models/user-model.ts';

export interface StoredSession {
  sid: string;
  userAgent: string | null;
  signedInAt: string | null;
}

function requireSequelize() {
  const { sequelize } = UserModel;
  if (!sequelize) throw new Error('No database is connected.');
  return sequelize;
}

export function listSessionsOf(userId: string): Promise<StoredSession[]> {
  return requireSequelize().query<StoredSession>(
    `select sid, sess ->> 'userAgent' as "userAgent", sess ->> 'signedInAt' as "signedInAt"
     from sessions where sess -> 'passport' ->> 'user' = $userId and expire > now()
     order by sess ->> 'signedInAt' desc nulls last`,
    { bind: { userId }, type: QueryTypes.SELECT },
  );
}

/** Signs a user out everywhere, or everywhere but in one session. */
export async function endSessionsOf(userId: string, exceptSid: string | null): Promise<void> {
  await requireSequelize().query(
    `delete from sessions where sess -> 'passport' ->> 'user' = $userId and sid is distinct from $exceptSid`,
    { bind: { userId, exceptSid } },
  );
}
