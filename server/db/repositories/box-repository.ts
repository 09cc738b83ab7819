/** Areas and boxes of a household. */
import { QueryTypes, type Transaction } from 'sequelize';
import { AreaModel } from '../models/area-model.ts';
import { BoxModel, type BoxRow } from '../models/box-model.ts';
import type { Visibility } from './register-repository.ts';

export interface CountedBox extends BoxRow {
  householdName: string;
  areaName: string | null;
  scans: number;
  reading: number;
  failed: number;
  pages: number;
  papers: number;
  toReview: number;
}

/** Counts tell of nothing that the viewer may not see. */
const visiblePaper = `($groups::text[] is null or p.class_group = any($groups::text[]))
  and (p.eyes_only_user_id is null or p.eyes_only_user_id = $viewer)`;
const countedBoxes = `
  select b.id, b.household_id as "householdId", b.area_id as "areaId", b.code, b.label, b.version,
    b.created_at as "createdAt", h.name as "householdName", a.name as "areaName",
    (select count(*)::int from scans s where s.box_id = b.id) as scans,
    (select count(*)::int from scans s where s.box_id = b.id and s.status in ('waiting', 'reading')) as reading,
    (select count(*)::int from scans s where s.box_id = b.id and s.status = 'failed') as failed,
    (select count(*)::int from pages g join scans s on s.id = g.scan_id where s.box_id = b.id) as pages,
    (select count(*)::int from papers p where p.box_id = b.id and ${visiblePaper}) as papers,
    (select count(*)::int from papers p where p.box_id = b.id and p.status = 'to-review'
      and ${visiblePaper}) as "toReview"
  from boxes b join households h on h.id = b.household_id left join areas a on a.id = b.area_id`;

function requireSequelize() {
  const { sequelize } = BoxModel;
  if (!sequelize) throw new Error('No database is connected.');
  return sequelize;
}

export async function findBox(id: string, visible: Visibility): Promise<CountedBox | null> {
  const rows = await requireSequelize().query<CountedBox>(`${countedBoxes} where b.id = $id`, {
    bind: { id, groups: visible.groups, viewer: visible.userId },
    type: QueryTypes.SELECT,
  });
  return rows[0] ?? null;
}

export async function listBoxes(
  householdId: string,
  visible: Visibility,
  page: { offset: number; limit: number; descending: boolean },
): Promise<{ rows: CountedBox[]; total: number }> {
  const rows = await requireSequelize().query<CountedBox>(
    `${countedBoxes} where b.household_id = $householdId
     order by b.created_at ${page.descending ? 'desc' : 'asc'}, b.code offset $offset limit $limit`,
    {
      bind: {
        householdId,
        groups: visible.groups,
        viewer: visible.userId,
        offset: page.offset,
        limit: page.limit,
      },
      type: QueryTypes.SELECT,
    },
  );
  return { rows, total: await BoxModel.count({ where: { householdId } }) };
}

export async function insertBox(
  values: { householdId: string; areaId: string | null; code: string; label: string },
  transaction: Transaction,
): Promise<string> {
  const made = await BoxModel.create(values, { transaction });
  return made.id;
}

export async function findArea(householdId: string, id: string) {
  const found = await AreaModel.findOne({ where: { householdId, id } });
  return found?.get({ plain: true }) ?? null;
}

export async function findAreaByName(householdId: string, name: string) {
  const areas = await AreaModel.findAll({ where: { householdId } });
  return (
    areas.find((a) => a.name.toLowerCase() === name.toLowerCase())?.get({ plain: true }) ?? null
  );
}

export async function insertArea(householdId: string, name: string, transaction: Transaction) {
  const made = await AreaModel.create({ householdId, name }, { transaction });
  return made.get({ plain: true });
}

export async function listAreas(householdId: string) {
  return requireSequelize().query<{ id: string; name: string; boxes: number }>(
    `select a.id, a.name, (select count(*)::int from boxes b where b.area_id = a.id) as boxes
     from areas a where a.household_id = $householdId order by a.name`,
    { bind: { householdId }, type: QueryTypes.SELECT },
  );
}

/** Codes of a household's boxes by id. */
export async function listBoxCodes(householdId: string): Promise<Map<string, string>> {
  const boxes = await BoxModel.findAll({ where: { householdId }, attributes: ['id', 'code'] });
  return new Map(boxes.map((box) => [box.id, box.code]));
}
