import { QueryTypes } from 'sequelize';
import type { DatedPaper } from '../../reminders/paper-dates.ts';
import { PaperModel } from '../models/paper-model.ts';

export type DatedPaperRow = DatedPaper & { isSteppedDown: boolean; eyesOnlyUserId: string | null };

/** The papers of a household that have a date to speak of. */
export async function listDatedPapers(householdId: string): Promise<DatedPaperRow[]> {
  const { sequelize } = PaperModel;
  if (!sequelize) throw new Error('No database is connected.');
  return sequelize.query<DatedPaperRow>(
    `select p.id, p.number, b.code as "boxCode", p.place, p.class, p.status,
       p.kept_because as "keptBecause", p.expires_on::text as "expiresOn",
       p.keep_until::text as "keepUntil", p.shred_from::text as "shredFrom",
       p.advised_until::text as "advisedUntil", p.permanent, p.open, p.held,
       p.stepped_down is not null as "isSteppedDown", p.eyes_only_user_id as "eyesOnlyUserId"
     from papers p left join boxes b on b.id = p.box_id
     where p.household_id = $householdId and p.status <> 'left'
       and (p.expires_on is not null or p.keep_until is not null)
     order by p.number`,
    { bind: { householdId }, type: QueryTypes.SELECT },
  );
}
