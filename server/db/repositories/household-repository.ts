/** Households, their areas and boxes. */
import { Op, QueryTypes, type Transaction } from 'sequelize';
import { HouseholdModel, type HouseholdRow } from '../models/household-model.ts';
import { PracticeModel } from '../models/practice-model.ts';

export type RecordKind =
  'household' | 'box' | 'scan' | 'page' | 'paper' | 'hold' | 'subject' | 'shred-list';

const tables: Record<Exclude<RecordKind, 'household'>, string> = {
  box: 'boxes',
  scan: 'scans',
  page: 'pages',
  paper: 'papers',
  hold: 'holds',
  subject: 'subjects',
  'shred-list': 'shred_lists',
};

/** The household (and its practice) that a record belongs to. */
export async function findHouseholdOf(
  kind: RecordKind,
  id: string,
): Promise<{ id: string; practiceId: string } | null> {
  const sql =
    kind === 'household'
      ? 'select id, practice_id as "practiceId" from households where id = $id'
      : `select h.id, h.practice_id as "practiceId" from ${tables[kind]} r join households h on h.id = r.household_id where r.id = $id`;
  const rows = await requireSequelize().query<{ id: string; practiceId: string }>(sql, {
    bind: { id },
    type: QueryTypes.SELECT,
  });
  return rows[0] ?? null;
}

/** @throws Error when no database is connected */
function requireSequelize() {
  const { sequelize } = HouseholdModel;
  if (!sequelize) throw new Error('No database is connected.');
  return sequelize;
}

export async function findHousehold(
  id: string,
  transaction?: Transaction,
): Promise<HouseholdRow | null> {
  const found = await HouseholdModel.findByPk(id, { transaction: transaction ?? null });
  return found?.get({ plain: true }) ?? null;
}

/** Locks the household's row until the transaction ends: numbers are given out one at a time. */
export async function lockHousehold(id: string, transaction: Transaction): Promise<HouseholdRow> {
  const found = await HouseholdModel.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE });
  if (!found) throw new Error(`No household ${id}.`);
  return found.get({ plain: true });
}

/** Households of whole practices, or single ones, in the order of their names. */
export async function listHouseholds(scope: {
  practiceIds: string[];
  householdIds: string[];
  offset: number;
  limit: number;
  descending: boolean;
}): Promise<{ rows: HouseholdRow[]; total: number }> {
  const { rows, count } = await HouseholdModel.findAndCountAll({
    where: {
      [Op.or]: [{ practiceId: scope.practiceIds }, { id: scope.householdIds }],
    },
    order: [
      ['name', scope.descending ? 'DESC' : 'ASC'],
      ['id', 'ASC'],
    ],
    offset: scope.offset,
    limit: scope.limit,
  });
  return { rows: rows.map((row) => row.get({ plain: true })), total: count };
}

export async function insertHousehold(
  values: Pick<HouseholdRow, 'practiceId' | 'name' | 'country' | 'timeZone'> &
    Partial<HouseholdRow>,
  transaction: Transaction,
): Promise<HouseholdRow> {
  const made = await HouseholdModel.create(values, { transaction });
  await made.reload({ transaction });
  return made.get({ plain: true });
}

/** Writes the values when the version still is `version`; false when somebody was faster. */
export async function updateHousehold(
  id: string,
  version: number,
  values: Partial<HouseholdRow>,
  transaction: Transaction,
): Promise<boolean> {
  const [changed] = await HouseholdModel.update(
    { ...values, version: version + 1 },
    { where: { id, version }, transaction },
  );
  return changed === 1;
}

/** Takes `count` running numbers of one kind; answers the first. */
export async function takeNumbers(
  householdId: string,
  kind: 'nextBoxNumber' | 'nextPaperNumber' | 'nextListNumber',
  count: number,
  transaction: Transaction,
): Promise<number> {
  const household = await lockHousehold(householdId, transaction);
  await HouseholdModel.update(
    { [kind]: household[kind] + count },
    { where: { id: householdId }, transaction },
  );
  return household[kind];
}

export async function findPracticeName(id: string): Promise<string> {
  const practice = await PracticeModel.findByPk(id);
  return practice?.name ?? '';
}

export interface HouseholdCounts {
  householdId: string;
  toReview: number;
  undecided: number;
  kept: number;
  leaving: number;
  left: number;
  reading: number;
  holds: number;
  boxes: number;
}

/** Whose counts are asked for, and how far that person sees in each household (null: everything). */
export interface CountScope {
  userId: string;
  households: { id: string; groups: string[] | null }[];
}

/** Papers by state, scans still to be read, holds in force and boxes, as far as somebody may know. */
export async function countForHouseholds(scope: CountScope): Promise<Map<string, HouseholdCounts>> {
  if (scope.households.length === 0) return new Map();
  const rows = await requireSequelize().query<HouseholdCounts>(
    `with asked as (select * from jsonb_to_recordset($households::jsonb) as h(id uuid, groups text[])),
       seen as (
         select p.id, p.household_id, p.status from papers p join asked h on h.id = p.household_id
         where (h.groups is null or p.class_group = any(h.groups))
           and (p.eyes_only_user_id is null or p.eyes_only_user_id = $userId))
     select h.id as "householdId",
       (select count(*)::int from seen p where p.household_id = h.id and p.status = 'to-review') as "toReview",
       (select count(*)::int from seen p where p.household_id = h.id and p.status = 'undecided') as undecided,
       (select count(*)::int from seen p where p.household_id = h.id and p.status = 'kept') as kept,
       (select count(*)::int from seen p where p.household_id = h.id and p.status = 'leaving') as leaving,
       (select count(*)::int from seen p where p.household_id = h.id and p.status = 'left') as "left",
       (select count(*)::int from scans s where s.household_id = h.id and s.status in ('waiting', 'reading')) as reading,
       (select count(*)::int from holds o where o.household_id = h.id and o.lifted_on is null
         and (o.paper_id is null or o.paper_id in (select id from seen))) as holds,
       (select count(*)::int from boxes b where b.household_id = h.id) as boxes
     from asked h`,
    {
      bind: { households: JSON.stringify(scope.households), userId: scope.userId },
      type: QueryTypes.SELECT,
    },
  );
  return new Map(rows.map((row) => [row.householdId, row]));
}
