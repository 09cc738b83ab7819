/** Whether a rule applies to a case, and what had to be assumed for it. */
import type { CaseInputs, CaseRole } from '../contract/cases.ts';
import type { InputName } from './moments.ts';
import type { ConditionValue, Rule } from './rule-schema.ts';

/** What is assumed of a paper of which nobody said whether a return used it. */
export const countedAsUsed = 'Whether it was used for a tax return is not known: counted as used.';
export const countedAsPrivate =
  'Whether it was used for a tax return is not known: counted as private.';

const flagQuestions: Partial<Record<InputName, string>> = {
  usedForTax: countedAsUsed,
  vatRegistered: 'Whether the business was registered for VAT is not known: counted as registered.',
  deducted: 'Whether it was deducted from tax is not known: counted as deducted.',
  workExpense: 'Whether it was a work expense is not known: counted as one.',
  buildingWork: 'Whether it was building work is not known: counted as building work.',
  claimIssued: 'Whether a claim was issued is not known: counted as issued.',
  personalInjury: 'Whether somebody was injured is not known: both were counted.',
};

function assumptionFor(name: InputName): string {
  return (
    flagQuestions[name] ?? `The answer "${name}" is not known: counted as whatever keeps longer.`
  );
}

/** What the case says of a flag: what was not used for tax was not deducted and is no work expense either. */
function findAnswer(inputs: CaseInputs, name: InputName): unknown {
  const value = inputs[name];
  if (value !== undefined || (name !== 'deducted' && name !== 'workExpense')) return value;
  return inputs.usedForTax;
}

/** The answer to a condition: no, yes, or yes because an unknown was counted so. */
type Answer = 'no' | 'yes' | 'assumed';

function meetsCondition(value: unknown, condition: ConditionValue): Answer {
  switch (condition) {
    case 'yes':
      return value === true ? 'yes' : 'no';
    case 'no':
      return value === false || value === null ? 'yes' : 'no';
    case 'yes-or-unknown':
      if (value === undefined) return 'assumed';
      return value === true ? 'yes' : 'no';
    case 'no-or-unknown':
      return value === true ? 'no' : 'yes';
    case 'known':
      return value === undefined || value === null ? 'no' : 'yes';
    case 'not-known':
      return value === undefined || value === null ? 'yes' : 'no';
    case 'never':
      return value === null ? 'yes' : 'no';
    case 'not-never':
      return value === null ? 'no' : 'yes';
    case 'not-unknown':
      return value === undefined ? 'no' : 'yes';
    case 'not-no':
      return value === false || value === null ? 'no' : 'yes';
    case 'unknown':
      return value === undefined ? 'assumed' : 'no';
  }
}

/** Said when a rule was left out because its answer is not known and the common case is that it does not hold. */
const unlikelyNotes: Partial<Record<InputName, string>> = {
  usedForTax: countedAsPrivate,
  oneStopShop: 'Whether the sale went through the one-stop shop is not known: counted as not.',
};

function meetsKind(
  given: string | null | undefined,
  known: ReadonlySet<string>,
  condition: NonNullable<Rule['documentKind']>,
): Answer {
  const kind = given?.toLowerCase();
  // A kind that no rule of the class names is at least none of the excepted ones; otherwise it tells nothing.
  if (!kind || (condition.only && !known.has(kind))) return condition.orUnknown ? 'assumed' : 'no';
  const isMet = condition.only ? condition.only.includes(kind) : !condition.except?.includes(kind);
  return isMet ? 'yes' : 'no';
}

/** The kinds that the rules of a class tell apart. */
export interface KnownKinds {
  readonly documentKind: ReadonlySet<string>;
  readonly recordKind: ReadonlySet<string>;
}

/** Collects the kinds named by rules. */
export function collectKinds(rules: readonly Rule[]): KnownKinds {
  const documentKind = new Set<string>();
  const recordKind = new Set<string>();
  for (const rule of rules) {
    for (const kind of rule.documentKind?.only ?? rule.documentKind?.except ?? [])
      documentKind.add(kind);
    for (const kind of rule.recordKind?.only ?? rule.recordKind?.except ?? []) recordKind.add(kind);
  }
  return { documentKind, recordKind };
}

function meetsRegion(rule: Rule, region: string | null): Answer {
  if (!rule.regions && !rule.exceptRegions) return 'yes';
  if (region === null) return rule.ifRegionUnknown === 'count' ? 'assumed' : 'no';
  if (rule.regions && !rule.regions.includes(region)) return 'no';
  return rule.exceptRegions?.includes(region) ? 'no' : 'yes';
}

/** Roles to count: one when known, several when not; `isStated` tells which. */
export interface CountedRoles {
  readonly roles: readonly CaseRole[];
  readonly isStated: boolean;
  /** Nothing narrows the roles down: then even a rare use of a paper cannot be ruled out. */
  readonly isAny?: boolean;
}

function meetsRole(rule: Rule, counted: CountedRoles, inputs: CaseInputs): boolean {
  if (!rule.roles) return true;
  if (!counted.isStated && rule.ifRoleUnknown) {
    const input = inputs[rule.ifRoleUnknown.onlyWith];
    if (input === undefined || input === null) return false;
  }
  for (const role of counted.roles) if (rule.roles.includes(role)) return true;
  return false;
}

/** The roles that the rules of a class speak of; null when they are the same for every role. */
export function collectRoles(rules: readonly Rule[]): ReadonlySet<CaseRole> | null {
  const spoken = rules.flatMap((rule) => rule.roles ?? []);
  return spoken.length === 0 ? null : new Set(spoken);
}

/** Whether the rule applies; sentences about unknown answers are added to `assumed`. */
export function appliesTo(
  rule: Rule,
  inputs: CaseInputs,
  region: string | null,
  counted: CountedRoles,
  kinds: KnownKinds,
  assumed: string[],
): boolean {
  if (!meetsRole(rule, counted, inputs)) return false;
  const byRegion = meetsRegion(rule, region);
  if (byRegion === 'no') return false;
  let documentKind: Answer = 'yes';
  let recordKind: Answer = 'yes';
  if (rule.documentKind) {
    documentKind = meetsKind(inputs.documentKind, kinds.documentKind, rule.documentKind);
    if (documentKind === 'no') return false;
  }
  if (rule.recordKind) {
    recordKind = meetsKind(inputs.recordKind, kinds.recordKind, rule.recordKind);
    if (recordKind === 'no') return false;
  }
  if (rule.when) {
    let unknown: InputName[] | null = null;
    for (const name in rule.when) {
      const key = name as InputName;
      const condition = rule.when[key];
      if (!condition) continue;
      const value = findAnswer(inputs, key);
      let answer = meetsCondition(value, condition);
      if (answer === 'no' && condition === 'yes' && key === 'usedForTax' && counted.isAny) {
        if (value === undefined) answer = 'assumed';
      }
      if (answer === 'no') {
        const note = condition === 'yes' && value === undefined ? unlikelyNotes[key] : undefined;
        if (note) assumed.push(note);
        return false;
      }
      if (answer === 'assumed') (unknown ??= []).push(key);
    }
    if (unknown) for (const name of unknown) assumed.push(assumptionFor(name));
  }
  if (byRegion === 'assumed') {
    assumed.push('The region is not known: the rules of every region were counted.');
  }
  if (documentKind === 'assumed' || recordKind === 'assumed') {
    assumed.push('What kind of paper it is within its class is not known: every kind was counted.');
  }
  return true;
}
