/** Papers in the order of their ids, some hundreds at a time, for a sum that is worked out anew for all of them. */
import type { Transaction } from 'sequelize';
import type { AssessedColumns, StoredPaper } from './paper-repository.ts';
import { selectRows } from './sql.ts';

/** What of a stored paper its sum depends on. */
export type PaperToAssess = Pick<
  StoredPaper,
  | 'id'
  | 'class'
  | 'country'
  | 'facts'
  | 'answers'
  | 'subjectId'
  | 'bundle'
  | 'bundleFrom'
  | 'bundleTo'
  | 'steppedDown'
>;

/** The columns that a change of rules can move; what was read on the paper stays as it is. */
export type MovedColumns = Pick<
  AssessedColumns,
  | 'assessment'
  | 'keepUntil'
  | 'shredFrom'
  | 'advisedUntil'
  | 'permanent'
  | 'open'
  | 'held'
  | 'rule'
  | 'securityLevel'
  | 'ruleSetVersion'
  | 'assessedOn'
  | 'steppedDown'
>;

/** The next papers of a household after an id, locked; papers that have left are not among them. */
export function lockNextPapers(
  householdId: string,
  afterId: string | null,
  limit: number,
  transaction: Transaction,
): Promise<PaperToAssess[]> {
  return selectRows<PaperToAssess>(
    `select id, class, country, facts, answers, subject_id as "subjectId", bundle,
       bundle_from::text as "bundleFrom", bundle_to::text as "bundleTo", stepped_down as "steppedDown"
     from papers
     where household_id = $householdId and status <> 'left' and ($afterId::uuid is null or id > $afterId::uuid)
     order by id
     limit $limit
     for no key update`,
    { householdId, afterId, limit },
    transaction,
  );
}

/** How many papers of the households have not left. */
export async function countPapersInHouse(householdIds: readonly string[]): Promise<number> {
  const [row] = await selectRows<{ count: number }>(
    `select count(*)::int as count from papers where household_id = any($ids::uuid[]) and status <> 'left'`,
    { ids: householdIds },
  );
  return row?.count ?? 0;
}

/** Writes sums that were worked out anew; no version rises, for no person changed anything. */
export async function saveMovedColumns(
  rows: readonly ({ id: string } & MovedColumns)[],
  transaction: Transaction,
): Promise<void> {
  await selectRows(
    `update papers p set
       assessment = r.assessment, keep_until = r."keepUntil", shred_from = r."shredFrom",
       advised_until = r."advisedUntil", permanent = r.permanent, open = r.open, held = r.held,
       rule = r.rule, security_level = r."securityLevel", rule_set_version = r."ruleSetVersion",
       assessed_on = r."assessedOn", stepped_down = nullif(r."steppedDown", 'null'::jsonb)
     from jsonb_to_recordset($rows::jsonb) as r(
       id uuid, assessment jsonb, "keepUntil" date, "shredFrom" date, "advisedUntil" date,
       permanent boolean, open boolean, held boolean, rule text, "securityLevel" text,
       "ruleSetVersion" text, "assessedOn" date, "steppedDown" jsonb)
     where p.id = r.id`,
    { rows: JSON.stringify(rows) },
    transaction,
  );
}
