/** Rule tables, indexed for the sum: which rules a country has for a class, and what is common to all. */
import type { ClassId } from '../contract/document-classes.ts';
import { parsePeriod } from './dates.ts';
import type { Period } from './dates.ts';
import type { Handling, LimitationKind, Rule, RuleTable } from './rule-schema.ts';

/** Tables that were checked, ready for `assess`. `version` names exactly this content. */
export interface RuleSet {
  readonly version: string;
  readonly tables: ReadonlyMap<string, IndexedTable>;
  readonly common: IndexedTable;
  readonly handling: Handling;
  /** Every rule of every table, in table order. */
  readonly rules: readonly Rule[];
}

export interface IndexedTable {
  readonly table: RuleTable;
  readonly byClass: ReadonlyMap<ClassId, readonly Rule[]>;
}

function indexTable(table: RuleTable): IndexedTable {
  const byClass = new Map<ClassId, Rule[]>();
  for (const rule of table.rules) {
    for (const id of rule.classes) {
      const list = byClass.get(id);
      if (list) list.push(rule);
      else byClass.set(id, [rule]);
    }
  }
  return { table, byClass };
}

/** Indexes tables; throws RangeError when the common table is missing or a country comes twice. */
export function buildRuleSet(
  tables: readonly RuleTable[],
  handling: Handling,
  version: string,
): RuleSet {
  const indexed = new Map<string, IndexedTable>();
  for (const table of tables) {
    if (indexed.has(table.country)) {
      throw new RangeError(`There are two rule tables for "${table.country}"; keep one.`);
    }
    indexed.set(table.country, indexTable(table));
  }
  const common = indexed.get('common');
  if (!common) throw new RangeError('The common rule table is missing; add a table "common".');
  indexed.delete('common');
  return {
    version,
    tables: indexed,
    common,
    handling,
    rules: tables.flatMap((table) => table.rules),
  };
}

const parsed = new Map<string, Period>();

/** The parsed form of a period text, remembered. */
export function periodOf(text: string): Period {
  let period = parsed.get(text);
  if (!period) {
    period = parsePeriod(text);
    parsed.set(text, period);
  }
  return period;
}

/** A region as tables write it: lower case. */
export function normaliseRegion(region: string | null | undefined): string | null {
  return region ? region.toLowerCase() : null;
}

/** The limitation period of a country and region, and whether its clock starts at the year's end. */
export function requireLimitation(
  table: RuleTable,
  kind: LimitationKind,
  region: string | null,
): { text: string; fromYearEnd: boolean } {
  const limitation = table.limitation?.[kind];
  if (!limitation) {
    throw new RangeError(`The rule table ${table.country} has no limitation period for ${kind}.`);
  }
  const text =
    region === null ? limitation.unknownRegion : (limitation.regions[region] ?? limitation.usual);
  return { text, fromYearEnd: limitation.fromYearEnd };
}
