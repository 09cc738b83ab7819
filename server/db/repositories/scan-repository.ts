/** Scans and how far their reading got. */
import { Op, QueryTypes, type Transaction } from 'sequelize';
import { ScanModel, type ScanRow } from '../models/scan-model.ts';
import type { Visibility } from './register-repository.ts';

export interface CountedScan extends ScanRow {
  pagesRead: number;
  blankPages: number;
  papers: number;
}

function requireSequelize() {
  const { sequelize } = ScanModel;
  if (!sequelize) throw new Error('No database is connected.');
  return sequelize;
}

const visiblePaper = `($groups::text[] is null or p.class_group = any($groups::text[]))
  and (p.eyes_only_user_id is null or p.eyes_only_user_id = $viewer)`;

const countedScans = `
  select s.id, s.household_id as "householdId", s.box_id as "boxId", s.name, s.media_type as "mediaType",
    s.bytes, s.sha256, s.status, s.reason, s.page_count as "pageCount", s.attempts,
    s.created_by as "createdBy", s.created_at as "createdAt", s.read_at as "readAt",
    (select count(*)::int from pages g where g.scan_id = s.id) as "pagesRead",
    (select count(*)::int from pages g where g.scan_id = s.id and g.blank) as "blankPages",
    (select count(*)::int from papers p where p.scan_id = s.id and ${visiblePaper}) as papers
  from scans s
  where ($groups::text[] is null or s.created_by = $viewer
    or exists (select 1 from papers p where p.scan_id = s.id and ${visiblePaper}))`;

/** Scans of a box; who sees some kinds of paper only learns of scans with such papers, and of their own. */
export async function listScansOfBox(boxId: string, visible: Visibility): Promise<CountedScan[]> {
  return requireSequelize().query<CountedScan>(
    `${countedScans} and s.box_id = $boxId order by s.created_at desc, s.name`,
    {
      bind: { boxId, groups: visible.groups, viewer: visible.userId },
      type: QueryTypes.SELECT,
    },
  );
}

export async function findCountedScan(
  id: string,
  visible: Visibility,
): Promise<CountedScan | null> {
  const rows = await requireSequelize().query<CountedScan>(`${countedScans} and s.id = $id`, {
    bind: { id, groups: visible.groups, viewer: visible.userId },
    type: QueryTypes.SELECT,
  });
  return rows[0] ?? null;
}

export async function findScan(id: string): Promise<ScanRow | null> {
  const found = await ScanModel.findByPk(id);
  return found?.get({ plain: true }) ?? null;
}

/** Those of the ids that are scans on record. */
export async function listKnownScanIds(ids: string[]): Promise<Set<string>> {
  const rows = await ScanModel.findAll({ attributes: ['id'], where: { id: { [Op.in]: ids } } });
  return new Set(rows.map((row) => row.id));
}

/** The scan of a household with these very bytes. */
export async function findScanByHash(householdId: string, sha256: string): Promise<ScanRow | null> {
  const found = await ScanModel.findOne({ where: { householdId, sha256 } });
  return found?.get({ plain: true }) ?? null;
}

/** Adds a scan; false when the household has these bytes already. */
export async function insertScan(
  values: Pick<
    ScanRow,
    'id' | 'householdId' | 'boxId' | 'name' | 'mediaType' | 'bytes' | 'sha256' | 'createdBy'
  >,
  transaction: Transaction,
): Promise<boolean> {
  const [, count] = await requireSequelize().query(
    `insert into scans (id, household_id, box_id, name, media_type, bytes, sha256, created_by)
     values ($id, $householdId, $boxId, $name, $mediaType, $bytes, $sha256, $createdBy)
     on conflict (household_id, sha256) do nothing`,
    { bind: { ...values }, transaction, type: QueryTypes.INSERT },
  );
  return count === 1;
}

/** Takes a scan up for reading; null when it is read, failed or gone. */
export async function claimScan(id: string): Promise<ScanRow | null> {
  const [count] = await ScanModel.update(
    { status: 'reading', reason: null },
    { where: { id, status: { [Op.in]: ['waiting', 'reading'] } } },
  );
  return count === 1 ? findScan(id) : null;
}

export async function updateScan(
  id: string,
  values: Partial<ScanRow>,
  transaction?: Transaction,
): Promise<void> {
  await ScanModel.update(values, { where: { id }, transaction: transaction ?? null });
}

/** Puts a failed scan back in the queue; false when it had not failed. */
export async function requeueScan(id: string, transaction: Transaction): Promise<boolean> {
  const [count] = await ScanModel.update(
    { status: 'waiting', reason: null },
    { where: { id, status: 'failed' }, transaction },
  );
  return count === 1;
}

/** Scans that wait to be read or whose reading was interrupted and that no job waits for, oldest first. */
export function listUnreadScanIds(): Promise<string[]> {
  // A job that waits out its delay is not waited for: whoever starts a worker wants to see it work.
  return listUnreadWithoutJob(`j.state in ('created', 'retry') and j.start_after <= now()`);
}

/** Unread scans that no job waits for and none is at. */
export function listStrandedScanIds(): Promise<string[]> {
  return listUnreadWithoutJob(`j.state in ('created', 'retry', 'active')`);
}

async function listUnreadWithoutJob(isLive: string): Promise<string[]> {
  const rows = await requireSequelize().query<{ id: string }>(
    `select s.id from scans s
     where s.status in ('waiting', 'reading')
       and not exists (select 1 from jobs.job j where j.name = 'read-scan'
         and ${isLive} and j.data ->> 'scanId' = s.id::text)
     order by s.created_at`,
    { type: QueryTypes.SELECT },
  );
  return rows.map((row) => row.id);
}
