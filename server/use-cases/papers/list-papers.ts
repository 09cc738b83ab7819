/** The register: what a caller may see of a household's papers, and the same as a table to take away. */
import { stringify } from 'csv-stringify/sync';
import type { z } from 'zod';
import {
  classGroups,
  classIds,
  classLabel,
  documentClasses,
} from '../../contract/document-classes.ts';
import {
  type listPapersQuery,
  type PaperRow,
  paperStatuses,
  pileLabels,
  piles,
} from '../../contract/papers.ts';
import {
  listRegister,
  type RegisterFilter,
  type SortField,
  sortFields,
} from '../../db/repositories/register-repository.ts';
import { InvalidInputError } from '../../errors.ts';
import { type Actor, visibilityOf } from './actor.ts';

type ListPapersQuery = z.infer<typeof listPapersQuery>;

/** @throws InvalidInputError when a filter or the sort field is not known */
export function listPapers(
  query: ListPapersQuery,
  actor: Actor,
): Promise<{ items: PaperRow[]; total: number }> {
  return listRegister(actor.householdId, visibilityOf(actor, actor.reach), parseFilter(query), {
    offset: (query.page - 1) * query.pageSize,
    limit: query.pageSize,
    ...parseSort(query.sort),
  }).then(({ rows, total }) => ({ items: rows, total }));
}

const exportLimit = 100_000;
const columns: [string, (row: PaperRow) => string | number | null][] = [
  ['Number', (row) => row.number],
  ['Box', (row) => row.boxCode],
  ['Kind', (row) => classLabel(row.class)],
  ['Title', (row) => row.title],
  ['Issuer', (row) => row.issuer],
  ['Addressee', (row) => row.addressee],
  ['Reference', (row) => row.reference],
  ['Country', (row) => row.country],
  ['Date on the paper', (row) => row.paperOn],
  ['Tax year', (row) => row.taxYear],
  ['Expires', (row) => row.expiresOn],
  ['About', (row) => row.subjectName],
  ['State', (row) => row.status],
  ['Pile', (row) => (row.pile ? pileLabels[row.pile] : null)],
  ['Kept because', (row) => row.keptBecause],
  ['Place', (row) => row.place],
  ['Keep until', (row) => row.keepUntil],
  ['May go from', (row) => row.shredFrom],
  ['Advised until', (row) => row.advisedUntil],
  ['For good', (row) => (row.permanent ? 'yes' : '')],
  ['Open', (row) => (row.open ? 'yes' : '')],
  ["Don't destroy yet", (row) => (row.held ? 'yes' : '')],
  ['Rule', (row) => row.rule],
  ['Sheets', (row) => row.sheets],
  ['Left on', (row) => row.leftOn],
];

/** The register as CSV (RFC 4180, UTF-8 with a mark, cells that a spreadsheet would run are escaped). */
export async function exportPapers(query: ListPapersQuery, actor: Actor): Promise<string> {
  const { rows } = await listRegister(
    actor.householdId,
    visibilityOf(actor, actor.reach),
    parseFilter(query),
    { offset: 0, limit: exportLimit, ...parseSort(query.sort) },
  );
  return stringify(
    rows.map((row) => columns.map(([, read]) => read(row))),
    {
      header: true,
      columns: columns.map(([name]) => name),
      bom: true,
      escape_formulas: true,
      record_delimiter: 'windows',
    },
  );
}

/** @throws InvalidInputError when the field is not one that papers are sorted by */
export function parseSort(sort: string | undefined): {
  sort?: { field: SortField; descending: boolean };
} {
  if (sort === undefined) return {};
  const name = sort.replace(/^-/, '');
  const field = sortFields.find((known) => known === name);
  if (!field) {
    throw new InvalidInputError([
      {
        field: 'sort',
        message: `Papers cannot be sorted by "${name}". Known are: ${sortFields.join(', ')}.`,
      },
    ]);
  }
  return { sort: { field, descending: sort.startsWith('-') } };
}

/** @throws InvalidInputError when a value of a filter is not known */
export function parseFilter(query: ListPapersQuery): RegisterFilter {
  const q = query.q === '' ? undefined : query.q;
  return {
    q,
    labelClasses: q === undefined ? undefined : findClassesByLabel(q),
    classes: parseList('class', query.class, classIds),
    groups: parseList('group', query.group, classGroups),
    piles: parseList('pile', query.pile, piles),
    statuses: parseList('status', query.status, paperStatuses),
    boxId: query.box,
    subjectId: query.subject,
    country: query.country,
    isHeld: query.held === undefined ? undefined : query.held === 'true',
    dueBy: query.dueBy,
  };
}

function parseList(
  field: string,
  text: string | undefined,
  known: readonly string[],
): string[] | undefined {
  if (text === undefined || text.trim() === '') return undefined;
  const values = text.split(',').map((value) => value.trim());
  const unknown = values.find((value) => !known.includes(value));
  if (unknown !== undefined) {
    throw new InvalidInputError([
      { field, message: `"${unknown}" is not known here. Known are: ${known.join(', ')}.` },
    ]);
  }
  return values;
}

/** Classes in whose label every word of the search begins a word. */
function findClassesByLabel(q: string): string[] {
  const words = q.toLowerCase().match(/[\p{L}\p{N}]+/gu) ?? [];
  if (words.length === 0) return [];
  return documentClasses
    .filter((known) => {
      const parts = known.label.toLowerCase().match(/[\p{L}\p{N}]+/gu) ?? [];
      return words.every((word) => parts.some((part) => part.startsWith(word)));
    })
    .map((known) => known.id);
}
