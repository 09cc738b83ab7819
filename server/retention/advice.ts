/** A longer time in somebody's own interest: said beside the rule's date, never part of it. */
import type { IsoDate } from '../contract/dates.ts';
import { addPeriod, laterOf, wordDay } from './dates.ts';
import { shiftToWorkingDay } from './holidays.ts';
import { resolveMoment } from './moments.ts';
import type { Scene } from './outcome.ts';
import { periodOf } from './rule-set.ts';
import type { Rule } from './rule-schema.ts';
import type { ClassId } from '../contract/document-classes.ts';
import type { CountedRoles } from './conditions.ts';
import { findFilingDue } from './strategies/filing-start.ts';

export interface Advice {
  readonly until: IsoDate;
  readonly because: string;
}

/** The latest date that the rule's advice gives for the case; null when it gives none. */
export function findAdvice(
  rule: Rule,
  classId: ClassId,
  counted: CountedRoles,
  scene: Scene,
): Advice | null {
  let latest: Advice | null = null;
  for (const advice of rule.advised) {
    if (advice.classes && !advice.classes.includes(classId)) continue;
    if (advice.roles && !advice.roles.some((role) => counted.roles.includes(role))) continue;
    if (advice.unless && scene.inputs[advice.unless] !== undefined) continue;
    let start: IsoDate | null = null;
    for (const moment of advice.trigger) start ??= resolveMoment(moment, scene.inputs).day;
    if (advice.fromFiling && rule.keep.how === 'filing-start') {
      const trigger = start
        ? { day: start, label: '', lacking: null }
        : ({ kind: 'not-in-force' } as const);
      const due = findFilingDue(rule.keep, trigger, scene);
      const filed = scene.inputs[rule.keep.filing];
      start = due && filed ? laterOf(due, filed) : due;
    }
    if (!start) continue;
    let until = addPeriod(start, periodOf(advice.period));
    if (advice.shift) until = shiftToWorkingDay(until, advice.shift);
    if (latest === null || until > latest.until) {
      latest = { until, because: `${advice.because} Advised until ${wordDay(until)}.` };
    }
  }
  return latest;
}
