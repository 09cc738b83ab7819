/** The register: a household's papers as one table, filtered, searched, sorted and paged by the database. */
import type { PaperRow as RegisterRow } from '../../contract/papers.ts';
import { selectRows } from './sql.ts';

/** Which papers somebody may see: class groups (null: all), and papers for other eyes left out. */
export interface Visibility {
  groups: string[] | null;
  userId: string;
}

export interface RegisterFilter {
  q?: string | undefined;
  /** Classes whose label fits the words searched for; they are found too. */
  labelClasses?: string[] | undefined;
  classes?: string[] | undefined;
  groups?: string[] | undefined;
  piles?: string[] | undefined;
  statuses?: string[] | undefined;
  boxId?: string | undefined;
  subjectId?: string | undefined;
  country?: string | undefined;
  isHeld?: boolean | undefined;
  dueBy?: string | undefined;
}

const sortColumns = {
  number: 'p.number',
  class: 'p.class',
  issuer: 'lower(p.issuer)',
  addressee: 'lower(p.addressee)',
  reference: 'p.reference',
  title: 'lower(p.title)',
  country: 'p.country',
  paperOn: 'p.paper_on',
  keyDate: 'p.key_date',
  expiresOn: 'p.expires_on',
  taxYear: 'p.tax_year',
  keepUntil: 'p.keep_until',
  shredFrom: 'p.shred_from',
  advisedUntil: 'p.advised_until',
  status: 'p.status',
  pile: 'p.pile',
  keptBecause: 'p.kept_because',
  place: 'lower(p.place)',
  sheets: 'p.sheets',
  boxCode: 'b.code',
  subjectName: 'lower(s.name)',
  reviewedAt: 'p.reviewed_at',
  leftOn: 'p.left_on',
  confidence: 'p.confidence',
} as const;
export type SortField = keyof typeof sortColumns;
export const sortFields = Object.keys(sortColumns) as SortField[];

/** Rows of one page, and how many there are in all. */
export async function listRegister(
  householdId: string,
  visible: Visibility,
  filter: RegisterFilter,
  page: { offset: number; limit: number; sort?: { field: SortField; descending: boolean } },
): Promise<{ rows: RegisterRow[]; total: number }> {
  const { where, bind } = buildWhere(householdId, visible, filter);
  const order = buildOrder(page.sort, filter.q !== undefined);
  const rows = await selectRows<RegisterRow & { total: number }>(
    `with found as (
       select p.id, count(*) over ()::int as total, row_number() over (order by ${order}) as place_in_list
       from papers p left join boxes b on b.id = p.box_id left join subjects s on s.id = p.subject_id
       where ${where}
       order by ${order} offset $offset limit $limit)
     select found.total, ${rowColumns},
       ${filter.q === undefined ? 'null' : headline} as snippet
     from found join papers p on p.id = found.id
       left join boxes b on b.id = p.box_id left join subjects s on s.id = p.subject_id
     order by found.place_in_list`,
    { ...bind, offset: page.offset, limit: page.limit },
  );
  const first = rows[0];
  const total = first
    ? first.total
    : page.offset === 0
      ? 0
      : await countRegister(householdId, visible, filter);
  return { rows: rows.map(({ total: _total, ...row }) => row), total };
}

/** How many papers a filter finds. */
export async function countRegister(
  householdId: string,
  visible: Visibility,
  filter: RegisterFilter,
): Promise<number> {
  const { where, bind } = buildWhere(householdId, visible, filter);
  const rows = await selectRows<{ total: number }>(
    `select count(*)::int as total from papers p where ${where}`,
    bind,
  );
  return rows[0]?.total ?? 0;
}

/** One paper as a line of the register; null when it may not be seen. */
export async function findRegisterRow(
  id: string,
  visible: Visibility,
): Promise<RegisterRow | null> {
  const rows = await selectRows<RegisterRow>(
    `select ${rowColumns}, null as snippet
     from papers p left join boxes b on b.id = p.box_id left join subjects s on s.id = p.subject_id
     where p.id = $id and ${visibleWhere}`,
    { id, visibleGroups: visible.groups, viewer: visible.userId },
  );
  return rows[0] ?? null;
}

const rowColumns = `
  p.id, p.household_id as "householdId", p.number, p.box_id as "boxId", b.code as "boxCode", p.status,
  p.class, p.confidence::float8 as confidence, p.country, p.title, p.issuer, p.addressee, p.reference,
  p.paper_on::text as "paperOn", p.key_date::text as "keyDate", p.expires_on::text as "expiresOn",
  p.tax_year as "taxYear", p.pile, p.kept_because as "keptBecause", p.place,
  p.subject_id as "subjectId", s.name as "subjectName", p.keep_until::text as "keepUntil",
  p.shred_from::text as "shredFrom", p.advised_until::text as "advisedUntil", p.permanent, p.open,
  p.held, p.rule, p.security_level as "securityLevel", p.sheets, p.bundle, p.left_on::text as "leftOn",
  to_char(p.reviewed_at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"') as "reviewedAt",
  p.version,
  (select g.id from pages g where g.paper_id = p.id order by g.position, g.number limit 1) as "firstPageId"`;

const visibleWhere = `
  ($visibleGroups::text[] is null or p.class_group = any($visibleGroups::text[]))
  and (p.eyes_only_user_id is null or p.eyes_only_user_id = $viewer)`;

/** Words as typed, and their beginnings, so that a search finds while it is being written. */
const query = `(websearch_to_tsquery('simple', $q) || to_tsquery('simple', $beginnings))`;
/** The words found stand between « and »; everything else is the paper's own text. */
const headline = `ts_headline('simple',
  concat_ws(' · ', p.title, p.issuer, p.reference, p.note, left(p.text, 200000)), ${query},
  'StartSel=«, StopSel=», MaxFragments=1, MaxWords=18, MinWords=8, FragmentDelimiter= … ')`;

function buildWhere(
  householdId: string,
  visible: Visibility,
  filter: RegisterFilter,
): { where: string; bind: Record<string, unknown> } {
  const parts = ['p.household_id = $householdId', visibleWhere];
  const bind: Record<string, unknown> = {
    householdId,
    visibleGroups: visible.groups,
    viewer: visible.userId,
  };
  const add = (sql: string, name: string, value: unknown) => {
    if (value === undefined) return;
    parts.push(sql);
    bind[name] = value;
  };
  add('p.class = any($classes::text[])', 'classes', filter.classes);
  add('p.class_group = any($groups::text[])', 'groups', filter.groups);
  add('p.pile = any($piles::text[])', 'piles', filter.piles);
  add('p.status = any($statuses::text[])', 'statuses', filter.statuses);
  add('p.box_id = $boxId', 'boxId', filter.boxId);
  add('p.subject_id = $subjectId', 'subjectId', filter.subjectId);
  add('p.country = $country', 'country', filter.country);
  add('p.held = $isHeld', 'isHeld', filter.isHeld);
  add(
    `(p.shred_from <= $dueBy and not p.permanent and not p.open and not p.held and p.status <> 'left'
      and (p.advised_until is null or p.advised_until < $dueBy or p.stepped_down is not null))`,
    'dueBy',
    filter.dueBy,
  );
  if (filter.q !== undefined) {
    parts.push(
      `(p.search @@ ${query} or p.class = any($labelClasses::text[]) or p.number::text = $q)`,
    );
    bind.q = filter.q;
    bind.beginnings = beginningsOf(filter.q);
    bind.labelClasses = filter.labelClasses ?? [];
  }
  return { where: parts.join(' and '), bind };
}

/** Every word with `:*`, all of them asked for; empty when the search uses quotes, "or" or a minus sign. */
function beginningsOf(q: string): string {
  if (/["]|(^|\s)-|\bor\b/i.test(q)) return '';
  const words = q.normalize('NFC').match(/[\p{L}\p{N}]+/gu) ?? [];
  return words.map((word) => `${word}:*`).join(' & ');
}

function buildOrder(
  sort: { field: SortField; descending: boolean } | undefined,
  isSearch: boolean,
): string {
  if (sort) {
    return `${sortColumns[sort.field]} ${sort.descending ? 'desc' : 'asc'} nulls last, p.number`;
  }
  return isSearch ? `ts_rank(p.search, ${query}) desc, p.number` : 'p.number';
}
