/** Rules that say different things of the same papers, or leave days between them to which none applies. */
import { addDays } from './dates.ts';
import type { Rule } from './rule-schema.ts';
import type { Place, TableFault } from './table-fault.ts';

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
  const absolute = ['permanent', 'none', 'owner-decides', 'open'];
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

/** Pairs of rules that contradict each other. */
export function findContradictions(places: readonly Place[]): TableFault[] {
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

/** Whether two rules are the same rule at different times. */
function isSameSubject(a: Rule, b: Rule): boolean {
  return (
    JSON.stringify([a.classes, a.roles]) === JSON.stringify([b.classes, b.roles]) &&
    conditionsOf(a) === conditionsOf(b)
  );
}

/** A rule that ends although its successor begins only days later: papers of the days between have no rule. */
export function findGapsInTime(places: readonly Place[]): TableFault[] {
  const faults: TableFault[] = [];
  for (const { table, index, rule } of places) {
    const { validTo } = rule;
    if (!validTo) continue;
    const others = places.filter((other) => other.table === table && other.rule !== rule);
    const starts = others
      .filter((other) => isSameSubject(rule, other.rule))
      .map((other) => other.rule.validFrom ?? '0001-01-01')
      .sort();
    const next = starts.find((start) => start > validTo);
    const isCovered = starts.some((start) => start <= addDays(validTo, 1));
    if (!next || isCovered) continue;
    faults.push({
      table,
      path: ['rules', index, 'validTo'],
      message: `The rule "${rule.id}" leaves a gap: it ends on ${validTo} and the next one begins on ${next}.`,
    });
  }
  return faults;
}
