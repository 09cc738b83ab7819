/** The register's filters live in the address, so that a view can be kept and sent on. */
import type { RegisterQuery } from '../api/list-papers.ts';

export const filterNames = [
  'q',
  'status',
  'group',
  'class',
  'pile',
  'box',
  'held',
  'dueBy',
] as const;
export type FilterName = (typeof filterNames)[number];
export type Filters = Record<FilterName, string>;

export const pageSize = 50;
export const usualSort = 'number';

export interface View {
  filters: Filters;
  sort: string;
  page: number;
}

/** The view that an address asks for. */
export function readView(search: URLSearchParams): View {
  const filters = Object.fromEntries(
    filterNames.map((name) => [name, search.get(name) ?? '']),
  ) as Filters;
  const page = Number(search.get('page') ?? '1');
  return {
    filters,
    sort: search.get('sort') ?? (filters.q ? '' : usualSort),
    page: Number.isInteger(page) && page > 0 ? page : 1,
  };
}

/** The address of a view; what is usual is left out. */
export function writeView({ filters, sort, page }: View): URLSearchParams {
  const search = new URLSearchParams();
  for (const name of filterNames) if (filters[name]) search.set(name, filters[name]);
  if (sort && sort !== usualSort) search.set('sort', sort);
  if (page > 1) search.set('page', String(page));
  return search;
}

/** What the server is asked for. */
export function toQuery({ filters, sort, page }: View): RegisterQuery {
  const given = Object.fromEntries(Object.entries(filters).filter(([, value]) => value !== ''));
  return { ...given, page, pageSize, ...(sort ? { sort } : {}) };
}

/** The next order when a heading is pressed: up, down, as usual. */
export function nextSort(current: string, field: string): string {
  if (current === field) return `-${field}`;
  return current === `-${field}` ? usualSort : field;
}
