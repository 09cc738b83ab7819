/** Faults that only show when rules and tables are seen together. Pure: places are paths into the table. */
import type { IsoDate } from '../contract/dates.ts';
import { classIds } from '../contract/document-classes.ts';
import { parsePeriod } from './dates.ts';
import type { Keep, Rule, RuleTable } from './rule-schema.ts';

export interface TableFault {
  /** Which table, by its place in the list that was checked. */
  readonly table: number;
  readonly path: readonly (string | number)[];
  readonly message: string;
}

interface Place {
  readonly table: number;
  readonly index: number;
  readonly rule: Rule;
}

function findIdFaults(places: readonly Place[], tables: readonly RuleTable[]): TableFault[] {
  const faults: TableFault[] = [];
  const seen = new Map<string, Place>();
  for (const place of places) {
    const { rule, table, index } = place;
    const path = ['rules', index, 'id'];
    const country = tables[table]?.country ?? '';
    if (!rule.id.startsWith(`${country.toLowerCase()}.`)) {
      faults.push({
        table,
        path,
        message: `The rule "${rule.id}" stands in the table ${country}; start its id with "${country.toLowerCase()}.".`,
      });
    }
    const first = seen.get(rule.id);
    if (first)
      faults.push({
        table,
        path,
        message: `The id "${rule.id}" is used twice; give this rule an id of its own.`,
      });
    else seen.set(rule.id, place);
  }
  return faults;
}

function findSourceFaults(places: readonly Place[], tables: readonly RuleTable[]): TableFault[] {
  const faults: TableFault[] = [];
  const shared = new Set(tables.find((table) => table.country === 'common')?.authorities ?? []);
  for (const { rule, table, index } of places) {
    const { authority, status, readOn } = rule.source;
    const own = tables[table];
    const path = ['rules', index, 'source', 'authority'];
    if (own && !own.authorities.includes(authority) && !shared.has(authority)) {
      const foreign = tables.find((other) => other.authorities.includes(authority));
      faults.push({
        table,
        path,
        message: foreign
          ? `The rule "${rule.id}" rests on a foreign source: "${authority}" belongs to ${foreign.name}. Name a source of ${own.name}.`
          : `The source "${authority}" of the rule "${rule.id}" is missing from the table's authorities; add it or correct the name.`,
      });
    }
    if (rule.basis === 'law' && shared.has(authority)) {
      faults.push({
        table,
        path,
        message: `The rule "${rule.id}" says "law" but names no law; give the statute or change the basis.`,
      });
    }
    if (status === 'memory' && readOn !== null) {
      faults.push({
        table,
        path: ['rules', index, 'source', 'readOn'],
        message: `The rule "${rule.id}" is from memory, so nobody read its source on ${readOn}; remove "readOn" or correct the status.`,
      });
    }
  }
  return faults;
}

/** Periods written in a rule, with where they stand. */
function listPeriods(keep: Keep): [string, string][] {
  const found: [string, string][] = [];
  for (const name of [
    'period',
    'formerPeriod',
    'lateWindow',
    'onTimeWindow',
    'lateAmendment',
  ] as const) {
    const value: unknown = name in keep ? (keep as Record<string, unknown>)[name] : undefined;
    if (typeof value === 'string') found.push([name, value]);
  }
  return found;
}

function findPeriodFaults(places: readonly Place[]): TableFault[] {
  const faults: TableFault[] = [];
  for (const { rule, table, index } of places) {
    for (const [name, text] of listPeriods(rule.keep)) {
      const period = parsePeriod(text);
      const isNothing = period.years + period.months + period.days === 0;
      if ((isNothing && text !== 'P0D') || period.years > 150) {
        faults.push({
          table,
          path: ['rules', index, 'keep', name],
          message: `The period ${text} of the rule "${rule.id}" can never apply; write a length from P1D to P150Y, or P0D for "no further time".`,
        });
      }
    }
    if (rule.validFrom && rule.validTo && rule.validTo < rule.validFrom) {
      faults.push({
        table,
        path: ['rules', index, 'validTo'],
        message: `The rule "${rule.id}" can never apply: it ends on ${rule.validTo}, before it begins on ${rule.validFrom}.`,
      });
    }
    if (
      rule.regions &&
      rule.exceptRegions &&
      rule.regions.every((region) => rule.exceptRegions?.includes(region))
    ) {
      faults.push({
        table,
        path: ['rules', index, 'regions'],
        message: `The rule "${rule.id}" can never apply: all its regions are excepted.`,
      });
    }
  }
  return faults;
}

function findRegionFaults(places: readonly Place[], tables: readonly RuleTable[]): TableFault[] {
  const faults: TableFault[] = [];
  for (const { rule, table, index } of places) {
    const own = tables[table];
    for (const name of ['regions', 'exceptRegions'] as const) {
      for (const region of rule[name] ?? []) {
        if (own?.regions.includes(region)) continue;
        faults.push({
          table,
          path: ['rules', index, name],
          message: `The rule "${rule.id}" names the region "${region}", which ${own?.name ?? 'the table'} does not list.`,
        });
      }
    }
    const { keep } = rule;
    if (keep.how === 'period' && typeof keep.period !== 'string' && !own?.limitation) {
      faults.push({
        table,
        path: ['rules', index, 'keep', 'period'],
        message: `The rule "${rule.id}" needs the country's limitation periods; add "limitation" to the table.`,
      });
    }
  }
  return faults;
}

function overlap<T>(a: readonly T[] | undefined, b: readonly T[] | undefined): boolean {
  return !a || !b || a.some((entry) => b.includes(entry));
}

function conditionsOf(rule: Rule): string {
  return JSON.stringify([
    rule.regions,
    rule.exceptRegions,
    rule.documentKind,
    rule.recordKind,
    rule.when,
  ]);
}

function isSameTime(a: Rule, b: Rule): boolean {
  const startsBeforeEnd = (x: Rule, y: Rule): boolean =>
    !x.validFrom || !y.validTo || x.validFrom <= y.validTo;
  return startsBeforeEnd(a, b) && startsBeforeEnd(b, a);
}

/** The same papers under the same conditions, counted from the same day, for two lengths; or for ever and not. */
function contradict(a: Rule, b: Rule): boolean {
  if (!overlap(a.classes, b.classes) || !overlap(a.roles, b.roles)) return false;
  if (!isSameTime(a, b) || conditionsOf(a) !== conditionsOf(b)) return false;
  const absolute = ['permanent', 'none', 'owner-decides'];
  if (a.keep.how !== b.keep.how)
    return absolute.includes(a.keep.how) || absolute.includes(b.keep.how);
  if (!('trigger' in a.keep) || !('trigger' in b.keep)) return false;
  const { period: lengthA, ...restA } = a.keep;
  const { period: lengthB, ...restB } = b.keep;
  return (
    JSON.stringify(restA) === JSON.stringify(restB) &&
    JSON.stringify(lengthA) !== JSON.stringify(lengthB)
  );
}

function findContradictions(places: readonly Place[]): TableFault[] {
  const faults: TableFault[] = [];
  for (const [position, later] of places.entries()) {
    for (const earlier of places.slice(0, position)) {
      if (earlier.table !== later.table || !contradict(earlier.rule, later.rule)) continue;
      faults.push({
        table: later.table,
        path: ['rules', later.index],
        message: `The rules "${earlier.rule.id}" and "${later.rule.id}" contradict each other: same papers, same start, different length.`,
      });
    }
  }
  return faults;
}

function findGaps(tables: readonly RuleTable[]): TableFault[] {
  const faults: TableFault[] = [];
  const common = new Set(
    tables.find((table) => table.country === 'common')?.rules.flatMap((rule) => rule.classes),
  );
  for (const [index, table] of tables.entries()) {
    if (table.country === 'common') continue;
    const covered = new Set(table.rules.flatMap((rule) => rule.classes));
    for (const [place, id] of table.noRule.entries()) {
      if (covered.has(id)) {
        faults.push({
          table: index,
          path: ['noRule', place],
          message: `"${id}" is listed under "noRule" and has a rule; these contradict each other.`,
        });
      }
    }
    const gaps = classIds.filter(
      (id) => !covered.has(id) && !common.has(id) && !table.noRule.includes(id),
    );
    if (gaps.length > 0) {
      faults.push({
        table: index,
        path: ['rules'],
        message: `${table.name} leaves a gap: no rule for ${gaps.join(', ')}. Add a rule, or list them under "noRule".`,
      });
    }
  }
  return faults;
}

/** Every fault of tables that fit the schema, except review dates. */
export function findTableFaults(tables: readonly RuleTable[]): TableFault[] {
  const places: Place[] = tables.flatMap((table, index) =>
    table.rules.map((rule, place) => ({ table: index, index: place, rule })),
  );
  return [
    ...findIdFaults(places, tables),
    ...findSourceFaults(places, tables),
    ...findPeriodFaults(places),
    ...findRegionFaults(places, tables),
    ...findContradictions(places),
    ...findGaps(tables),
  ];
}

/** Rules whose review date has passed on a day. */
export function findOverdueReviews(tables: readonly RuleTable[], on: IsoDate): TableFault[] {
  const faults: TableFault[] = [];
  for (const [index, table] of tables.entries()) {
    if (table.reviewBy < on) {
      faults.push({
        table: index,
        path: ['reviewBy'],
        message: `The review date ${table.reviewBy} of ${table.name} has passed; check its sources and set a new one.`,
      });
    }
    for (const [place, rule] of table.rules.entries()) {
      if (!rule.reviewBy || rule.reviewBy >= on) continue;
      faults.push({
        table: index,
        path: ['rules', place, 'reviewBy'],
        message: `The review date ${rule.reviewBy} of the rule "${rule.id}" has passed; check its source and set a new one.`,
      });
    }
  }
  return faults;
}
