/** What papers are about. */
import { Op, type Transaction } from 'sequelize';
import { SubjectModel, type SubjectRow } from '../models/subject-model.ts';
import { selectRows } from './sql.ts';

export type { SubjectRow } from '../models/subject-model.ts';

export async function findSubject(
  id: string,
  transaction?: Transaction,
): Promise<SubjectRow | null> {
  const found = await SubjectModel.findByPk(id, { transaction: transaction ?? null });
  return found?.get({ plain: true }) ?? null;
}

export async function listSubjects(
  householdId: string,
  transaction?: Transaction,
): Promise<SubjectRow[]> {
  const rows = await SubjectModel.findAll({
    where: { householdId },
    order: [
      ['name', 'ASC'],
      ['id', 'ASC'],
    ],
    transaction: transaction ?? null,
  });
  return rows.map((row) => row.get({ plain: true }));
}

export async function listSubjectsByIds(
  ids: string[],
  transaction?: Transaction,
): Promise<SubjectRow[]> {
  if (ids.length === 0) return [];
  const rows = await SubjectModel.findAll({
    where: { id: { [Op.in]: ids } },
    transaction: transaction ?? null,
  });
  return rows.map((row) => row.get({ plain: true }));
}

export async function insertSubject(
  subject: Pick<SubjectRow, 'householdId' | 'kind' | 'name'> & Partial<SubjectRow>,
  transaction: Transaction,
): Promise<SubjectRow> {
  const made = await SubjectModel.create(subject, { transaction });
  await made.reload({ transaction });
  return made.get({ plain: true });
}

/** Writes the values when the version still is `version`; false when somebody was faster. */
export async function updateSubject(
  id: string,
  version: number,
  values: Partial<SubjectRow>,
  transaction: Transaction,
): Promise<boolean> {
  const [changed] = await SubjectModel.update(
    { ...values, version: version + 1 },
    { where: { id, version }, transaction },
  );
  return changed === 1;
}

/** How many papers that a caller may see are about each subject. */
export async function countPapersBySubject(
  householdId: string,
  visible: { groups: string[] | null; userId: string },
): Promise<Map<string, number>> {
  const rows = await selectRows<{ subjectId: string; papers: number }>(
    `select subject_id as "subjectId", count(*)::int as papers from papers
     where household_id = $householdId and subject_id is not null
       and ($groups::text[] is null or class_group = any($groups::text[]))
       and (eyes_only_user_id is null or eyes_only_user_id = $userId)
     group by subject_id`,
    { householdId, groups: visible.groups, userId: visible.userId },
  );
  return new Map(rows.map((row) => [row.subjectId, row.papers]));
}
