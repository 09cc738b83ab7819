/** Which picture a page id stands for, and what decides who may see it. */
import { QueryTypes } from 'sequelize';
import type { ClassGroup } from '../../contract/document-classes.ts';
import { PageModel } from '../models/page-model.ts';

export interface PagePlace {
  householdId: string;
  scanId: string;
  number: number;
  /** Null while the page belongs to no paper yet. */
  classGroup: ClassGroup | null;
  eyesOnlyUserId: string | null;
}

export async function findPagePlace(pageId: string): Promise<PagePlace | null> {
  const { sequelize } = PageModel;
  if (!sequelize) throw new Error('No database is connected.');
  const rows = await sequelize.query<PagePlace>(
    `select g.household_id as "householdId", g.scan_id as "scanId", g.number,
       p.class_group as "classGroup", p.eyes_only_user_id as "eyesOnlyUserId"
     from pages g left join papers p on p.id = g.paper_id where g.id = $pageId`,
    { bind: { pageId }, type: QueryTypes.SELECT },
  );
  return rows[0] ?? null;
}
