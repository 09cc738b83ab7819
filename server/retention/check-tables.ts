/** Faults that only show when rules and tables are seen together. Pure: places are paths into the table. */
import type { IsoDate } from '../contract/dates.ts';
import { classIds } from '../contract/document-classes.ts';
import { findContradictions, findGapsInTime } from './check-conflicts.ts';
import { isRealDay, parsePeriod } from './dates.ts';
import type { Keep, RuleTable } from './rule-schema.ts';
import { limitationKinds } from './rule-schema.ts';
import type { Place, TableFault } from './table-fault.ts';

export type { TableFault } from './table-fault.ts';

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

/** Days of a year as `mm-dd` that a rule counts to, with where they stand. */
function listMonthDays(keep: Keep): [string, string][] {
  const found: [string, string][] = [];
  if (keep.how === 'return-window') {
    if (keep.anchor) found.push(['anchor', keep.anchor]);
    for (const day of keep.quarterDays) found.push(['quarterDays', day]);
  }
  if ('due' in keep && 'monthDay' in keep.due) found.push(['due', keep.due.monthDay]);
  return found;
}

function findDayFaults(places: readonly Place[]): TableFault[] {
  const faults: TableFault[] = [];
  for (const { rule, table, index } of places) {
    for (const [name, monthDay] of listMonthDays(rule.keep)) {
      if (isRealDay(`2000-${monthDay}`)) continue;
      faults.push({
        table,
        path: ['rules', index, 'keep', name],
        message: `The rule "${rule.id}" can never apply: no year has a ${monthDay}; write a month and a day that exist.`,
      });
    }
  }
  return faults;
}

/** A rule that asks for an event not to have happened, and counts from it. */
function findTriggerFaults(places: readonly Place[]): TableFault[] {
  const faults: TableFault[] = [];
  for (const { rule, table, index } of places) {
    const { keep, when } = rule;
    if (!when || !('trigger' in keep)) continue;
    const absent = Object.entries(when)
      .filter(([, value]) => value === 'never' || value === 'unknown' || value === 'not-known')
      .map(([name]) => name);
    const isLost = keep.trigger.every((moment) => absent.includes(moment));
    if (!isLost && !(keep.waitsFor && absent.includes(keep.waitsFor))) continue;
    faults.push({
      table,
      path: ['rules', index, 'when'],
      message: `The rule "${rule.id}" can never apply: it asks that its own trigger is not there.`,
    });
  }
  return faults;
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
  for (const [table, { limitation, regions, name }] of tables.entries()) {
    for (const kind of limitationKinds) {
      for (const region of Object.keys(limitation?.[kind].regions ?? {})) {
        if (regions.includes(region)) continue;
        faults.push({
          table,
          path: ['limitation', kind, 'regions', region],
          message: `The limitation periods name the region "${region}", which ${name} does not list.`,
        });
      }
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
    ...findDayFaults(places),
    ...findTriggerFaults(places),
    ...findRegionFaults(places, tables),
    ...findContradictions(places),
    ...findGapsInTime(places),
    ...findGaps(tables),
  ];
}

/** Rules whose review date has passed on a day, or whose source is said to be read on a day to come. */
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
      const { readOn } = rule.source;
      if (readOn !== null && readOn > on) {
        faults.push({
          table: index,
          path: ['rules', place, 'source', 'readOn'],
          message: `The source of the rule "${rule.id}" cannot have been read on ${readOn}: that day has not come.`,
        });
      }
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
