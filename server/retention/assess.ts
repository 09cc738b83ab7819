/** The retention sum: a case, a day and rule tables in; the answer with its reasons out. Pure. */
import type { AppliedRule, Assessment, AssessmentStep } from '../contract/assessments.ts';
import type { CaseInputs, CaseRole, RetentionCase } from '../contract/cases.ts';
import { roles as allRoles } from '../contract/cases.ts';
import type { IsoDate } from '../contract/dates.ts';
import type { Advice } from './advice.ts';
import { findAdvice } from './advice.ts';
import { combineOutcomes } from './combine.ts';
import type { Verdict } from './combine.ts';
import type { CountedRoles } from './conditions.ts';
import { appliesTo, countedAsPrivate, countedAsUsed } from './conditions.ts';
import type { KnownKinds } from './conditions.ts';
import { nextDay, wordDay } from './dates.ts';
import { evaluateRule } from './evaluate-rule.ts';
import { describeHandling } from './handling.ts';
import type { Outcome, Scene } from './outcome.ts';
import { findPlan } from './class-plan.ts';
import type { IndexedTable, RuleSet } from './rule-set.ts';
import { normaliseRegion } from './rule-set.ts';
import type { Rule } from './rule-schema.ts';
import { extendToRelease, findStops, mergeStops } from './stops.ts';

export interface AssessOptions {
  /** The roles that the household's circumstances allow while the case names none; all when absent. */
  readonly possibleRoles?: readonly CaseRole[];
}

/** One rule's say on one owner's case. */
export interface Say {
  readonly rule: Rule;
  readonly outcome: Outcome;
  readonly advice: Advice | null;
}

/** Everything gathered while the rules are asked. */
interface Gathering {
  readonly says: Say[];
  readonly steps: AssessmentStep[];
  readonly assumed: string[];
}

function askRules(
  candidates: readonly Rule[],
  kinds: KnownKinds,
  counted: CountedRoles,
  retentionCase: RetentionCase,
  scene: Scene,
  gathering: Gathering,
): boolean {
  let hasSaid = false;
  for (const rule of candidates) {
    const assumed: string[] = [];
    if (!appliesTo(rule, scene.inputs, scene.region, counted, kinds, assumed)) {
      if (assumed.length > 0) gathering.assumed.push(...assumed);
      continue;
    }
    const mark = gathering.steps.length;
    const outcome = evaluateRule(rule, scene);
    if (outcome.kind === 'not-in-force') {
      gathering.steps.length = mark;
      continue;
    }
    hasSaid = true;
    for (const text of assumed) gathering.assumed.push(text);
    if (outcome.kind === 'dated') {
      gathering.steps.push({
        text: `${rule.title}: until ${wordDay(outcome.until)}.`,
        date: outcome.until,
      });
    } else if (outcome.kind === 'open') {
      gathering.steps.push({ text: `${rule.title}: open. ${outcome.because}`, date: null });
    }
    const advice =
      rule.advised.length === 0 ? null : findAdvice(rule, retentionCase.class, counted, scene);
    gathering.says.push({ rule, outcome, advice });
  }
  return hasSaid;
}

const roleNotKnown: CountedRoles = { roles: allRoles, isStated: false, isAny: true };

function countRoles(inputs: CaseInputs, options: AssessOptions): CountedRoles {
  const { role } = inputs;
  if (role && role !== 'joint') return { roles: [role], isStated: true };
  return options.possibleRoles ? { roles: options.possibleRoles, isStated: false } : roleNotKnown;
}

/** Asks the country's rules for one owner; then, if none applies, what is common to all; then additions. */
function askTable(
  country: IndexedTable,
  ruleSet: RuleSet,
  retentionCase: RetentionCase,
  inputs: CaseInputs,
  options: AssessOptions,
  gathering: Gathering,
): void {
  const plan = findPlan(country, ruleSet.common, retentionCase.class);
  const { roles, kinds } = plan;
  const scene: Scene = {
    inputs,
    on: retentionCase.on,
    table: country.table,
    region: normaliseRegion(inputs.region),
    steps: gathering.steps,
    assumed: gathering.assumed,
  };
  const given = countRoles(inputs, options);
  let counted = given;
  if (roles && counted !== roleNotKnown && !counted.roles.some((role) => roles.has(role))) {
    gathering.assumed.push(
      counted.isStated
        ? `No rule of its own for the role "${inputs.role ?? ''}": every role was counted.`
        : 'No rule for the roles that the circumstances allow: every role was counted.',
    );
    counted = roleNotKnown;
  } else if (roles && !counted.isStated) {
    gathering.assumed.push(
      'Whose paper it is, in which role, is not known: every possible role was counted.',
    );
  }
  if (!askRules(plan.own, kinds, counted, retentionCase, scene, gathering)) {
    askRules(plan.common, kinds, counted, retentionCase, scene, gathering);
  }
  if (plan.additions.length > 0) {
    askRules(plan.additions, kinds, given, retentionCase, scene, gathering);
  }
}

const emptyOpen = (because: string): Verdict => ({
  kind: 'open',
  until: null,
  from: null,
  because,
  provisional: null,
});

function listOwners(inputs: CaseInputs): CaseInputs[] {
  const { owners, ...shared } = inputs;
  if (!owners || owners.length === 0) return [inputs];
  // What the joint case says holds for each owner unless the owner's own entry says otherwise.
  const { role: _role, ...rest } = shared;
  return owners.map((owner) => ({ ...rest, ...owner }));
}

const appliedCache = new WeakMap<Rule, AppliedRule['source']>();

function toApplied(rule: Rule, until: IsoDate | null): AppliedRule {
  let source = appliedCache.get(rule);
  if (!source) {
    const { authority, title, section, status } = rule.source;
    source = { authority, title, section, status };
    appliedCache.set(rule, source);
  }
  return { id: rule.id, basis: rule.basis, keepUntil: until, source };
}

/** The rules that applied, each once, with the latest date it gave (null while open or permanent). */
function listApplied(says: readonly Say[]): AppliedRule[] {
  const applied: AppliedRule[] = [];
  for (const { rule, outcome } of says) {
    const until = outcome.kind === 'dated' ? outcome.until : null;
    const known = applied.find((entry) => entry.id === rule.id);
    if (!known) applied.push(toApplied(rule, until));
    else if (known.keepUntil !== null && (until === null || until > known.keepUntil))
      known.keepUntil = until;
  }
  return applied;
}

/** Each assumption once; that a paper is private is no assumption when another rule counted it as used. */
function unique(texts: readonly string[]): string[] {
  if (texts.length < 2) return [...texts];
  const said = new Set(texts);
  if (said.has(countedAsUsed)) said.delete(countedAsPrivate);
  return [...said];
}

/**
 * What the rules say of a case on a day. Never throws for a case that passes `caseSchema` and
 * `findCaseProblems`; an unknown country answers open.
 */
export function assess(
  retentionCase: RetentionCase,
  ruleSet: RuleSet,
  options: AssessOptions = {},
): Assessment {
  const { country, inputs, on } = retentionCase;
  const table = ruleSet.tables.get(country);
  const gathering: Gathering = { says: [], steps: [], assumed: [] };
  const owners = listOwners(inputs);
  if (table) {
    for (const [index, owner] of owners.entries()) {
      if (owners.length > 1) {
        const role = owner.role ? ` (${owner.role})` : '';
        gathering.steps.push({ text: `Owner ${index + 1}${role}:`, date: null });
      }
      askTable(table, ruleSet, retentionCase, owner, options, gathering);
    }
  }
  const verdict =
    gathering.says.length === 0
      ? emptyOpen(
          `No rule is known here for ${table ? table.table.name : country}: ask the adviser.`,
        )
      : combineOutcomes(gathering.says);
  return finish(retentionCase, ruleSet, owners, gathering, verdict, on);
}

function finish(
  retentionCase: RetentionCase,
  ruleSet: RuleSet,
  owners: readonly CaseInputs[],
  gathering: Gathering,
  verdict: Verdict,
  on: IsoDate,
): Assessment {
  const { steps, says } = gathering;
  const stops = mergeStops(owners.map((owner) => findStops(owner, on)));
  const isHeld = stops.heldBy.length > 0;
  const isPermanent = verdict.kind === 'permanent';
  let keepUntil = verdict.until;
  let shredFrom = verdict.until ? nextDay(verdict.until) : verdict.from;
  let openText = verdict.kind === 'open' ? verdict.because : null;
  if (verdict.kind === 'dated' && says.length > 1) {
    steps.push({
      text: `The longest counts: keep until ${wordDay(verdict.until)}.`,
      date: verdict.until,
    });
  }
  if (
    !isHeld &&
    stops.releasedOn !== null &&
    stops.releaseText !== null &&
    verdict.kind !== 'open' &&
    !isPermanent
  ) {
    const last = keepUntil ?? verdict.from;
    const until = last ? extendToRelease(last, stops) : stops.releasedOn;
    const isLater = last === null || until > last;
    steps.push({
      text: `${stops.releaseText} ${isLater ? 'That is later and counts.' : 'The schedule stands.'}`,
      date: isLater ? until : null,
    });
    if (isLater) {
      keepUntil = until;
      shredFrom = nextDay(until);
    }
  }
  if (isHeld && !isPermanent) {
    const reason = stops.heldBy[0]?.reason;
    openText = reason ? `Do not destroy yet: ${reason}` : 'Do not destroy yet: a hold is in force.';
    steps.push({ text: openText, date: null });
    keepUntil = null;
    shredFrom = null;
  } else if (verdict.kind === 'open' && says.length === 0) {
    steps.push({ text: verdict.because ?? '', date: null });
  }
  const isOpen = openText !== null && !isPermanent;
  const advice = findLatestAdvice(says);
  const isAdvised = advice !== null && keepUntil !== null && advice.until > keepUntil;
  const handling = describeHandling(retentionCase, ruleSet, says, verdict);
  return {
    keepUntil,
    shredFrom,
    permanent: isPermanent,
    open: isOpen,
    openBecause: isOpen ? openText : null,
    heldBy: stops.heldBy,
    scheduledUntil: verdict.until,
    provisional: isHeld ? null : verdict.provisional,
    advisedUntil: isAdvised ? advice.until : null,
    advisedBecause: isAdvised ? advice.because : null,
    assumed: unique(
      stops.assumed.length > 0 ? [...gathering.assumed, ...stops.assumed] : gathering.assumed,
    ),
    disposal: handling.disposal,
    securityLevel: handling.securityLevel,
    original: handling.original,
    rules: listApplied(says),
    steps,
    cautions: handling.cautions,
  };
}

function findLatestAdvice(says: readonly Say[]): Advice | null {
  let latest: Advice | null = null;
  for (const { advice } of says)
    if (advice && (latest === null || advice.until > latest.until)) latest = advice;
  return latest;
}
