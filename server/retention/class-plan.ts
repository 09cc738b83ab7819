/** Which rules a country asks about a class, worked out once for a rule set. */
import type { CaseRole } from '../contract/cases.ts';
import type { ClassId } from '../contract/document-classes.ts';
import type { KnownKinds } from './conditions.ts';
import { collectKinds, collectRoles } from './conditions.ts';
import type { Rule } from './rule-schema.ts';
import type { IndexedTable } from './rule-set.ts';

export interface ClassPlan {
  /** The country's own rules; when none of them applies, the common ones are asked. */
  readonly own: readonly Rule[];
  readonly common: readonly Rule[];
  /** Asked in any case. */
  readonly additions: readonly Rule[];
  readonly kinds: KnownKinds;
  /** The roles that the country's own rules speak of; null when they speak of none. */
  readonly roles: ReadonlySet<CaseRole> | null;
}

function buildPlan(country: IndexedTable, common: IndexedTable, classId: ClassId): ClassPlan {
  const all = country.byClass.get(classId) ?? [];
  const own = all.filter((rule) => !rule.addition);
  const shared = common.byClass.get(classId) ?? [];
  const ofCommon = shared.filter((rule) => !rule.addition);
  return {
    own,
    common: ofCommon,
    additions: [...all, ...shared].filter((rule) => rule.addition),
    kinds: collectKinds([...own, ...ofCommon]),
    roles: collectRoles(own),
  };
}

const plans = new WeakMap<IndexedTable, WeakMap<IndexedTable, Map<ClassId, ClassPlan>>>();

/** The plan of a class in a country, beside the common table of the same rule set. */
export function findPlan(country: IndexedTable, common: IndexedTable, classId: ClassId): ClassPlan {
  const byCommon = plans.get(country) ?? new WeakMap<IndexedTable, Map<ClassId, ClassPlan>>();
  plans.set(country, byCommon);
  const byClass = byCommon.get(common) ?? new Map<ClassId, ClassPlan>();
  byCommon.set(common, byClass);
  const plan = byClass.get(classId) ?? buildPlan(country, common, classId);
  byClass.set(classId, plan);
  return plan;
}
