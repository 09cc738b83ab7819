/** Finds the day from which a rule's clock starts, or why it has not started. */
import type { IsoDate } from '../contract/dates.ts';
import { wordDay } from './dates.ts';
import type { DayInput, Moment, ResolvedMoment } from './moments.ts';
import { momentLabel, resolveMoment } from './moments.ts';
import type { Outcome, Scene } from './outcome.ts';
import { addStep, openBecause } from './outcome.ts';

export interface TriggerPlan {
  readonly trigger: readonly Moment[];
  readonly pick: 'first' | 'latest';
  readonly needs?: readonly Moment[] | undefined;
  readonly needsOneOf?: readonly Moment[] | undefined;
  readonly waitsFor?: DayInput | undefined;
  readonly openWhile?: DayInput | undefined;
}

export interface FoundTrigger {
  readonly day: IsoDate;
  readonly label: string;
  /** A moment the rule needs that is not known; the day is then only good for a provisional date. */
  readonly lacking: string | null;
}

/** "The day it ended" at the start of a sentence. */
function startSentence(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

function explainMissing(moment: Moment, isNever: boolean): string {
  const label = startSentence(momentLabel(moment));
  return isNever ? `${label} has not come yet.` : `${label} is not known.`;
}

function noteTrigger(scene: Scene, moment: ResolvedMoment, day: IsoDate): void {
  const how = moment.derivedBy ? ` ${moment.derivedBy}` : '';
  addStep(scene, `Counts from ${moment.label}: ${wordDay(day)}.${how}`, day);
}

/** Events that must have happened, and events said not to have happened, before anything counts. */
function findWaiting(plan: TriggerPlan, scene: Scene): Outcome | null {
  const { waitsFor, openWhile } = plan;
  if (waitsFor) {
    const value = scene.inputs[waitsFor];
    if (!value) return openBecause(explainMissing(waitsFor, value === null));
  }
  if (openWhile && scene.inputs[openWhile] === null) {
    return openBecause(explainMissing(openWhile, true));
  }
  return null;
}

function findFirst(
  plan: TriggerPlan,
  scene: Scene,
  event: DayInput | null,
): FoundTrigger | Outcome {
  for (const moment of plan.trigger) {
    const resolved = resolveMoment(moment, scene.inputs, event);
    if (resolved.isNever) return openBecause(explainMissing(moment, true));
    if (resolved.day) {
      noteTrigger(scene, resolved, resolved.day);
      return { day: resolved.day, label: resolved.label, lacking: null };
    }
  }
  return openBecause(explainMissing(plan.trigger[0] ?? 'paperDate', false));
}

function findLatestOf(
  plan: TriggerPlan,
  scene: Scene,
  event: DayInput | null,
): FoundTrigger | Outcome {
  let latest: ResolvedMoment | null = null;
  let lacking: string | null = null;
  let never: Moment | null = null;
  for (const moment of plan.trigger) {
    const resolved = resolveMoment(moment, scene.inputs, event);
    if (resolved.day === null) {
      if (resolved.isNever) never ??= moment;
      if (plan.needs?.includes(moment)) {
        if (resolved.isNever) return openBecause(explainMissing(moment, true));
        lacking = moment;
      }
    } else if (latest?.day == null || resolved.day > latest.day) latest = resolved;
  }
  if (!latest?.day) {
    return openBecause(explainMissing(never ?? plan.trigger[0] ?? 'paperDate', never !== null));
  }
  const anyOf = plan.needsOneOf;
  if (anyOf && !anyOf.some((moment) => resolveMoment(moment, scene.inputs).day !== null)) {
    const named = anyOf[0] ?? 'paperDate';
    if (resolveMoment(named, scene.inputs).isNever) return openBecause(explainMissing(named, true));
    lacking = named;
  }
  noteTrigger(scene, latest, latest.day);
  return { day: latest.day, label: latest.label, lacking };
}

/** The trigger day of a rule in a case, or an open outcome that says what is missing. */
export function findTrigger(plan: TriggerPlan, scene: Scene): FoundTrigger | Outcome {
  const waiting = findWaiting(plan, scene);
  if (waiting) return waiting;
  const event = plan.waitsFor ?? null;
  return plan.pick === 'first' ? findFirst(plan, scene, event) : findLatestOf(plan, scene, event);
}

/** Whether `findTrigger` gave a day. */
export function isFound(result: FoundTrigger | Outcome): result is FoundTrigger {
  return 'day' in result;
}
