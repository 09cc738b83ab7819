/**
 * Germany: vouchers are kept eight years instead of ten since 1 January 2025, also older ones whose ten years
 * had not run out by then (AO §147(3); Art. 97 §19a EGAO).
 */
import { addDays, addPeriod, endOfCalendarYear, laterOf, wordDay, wordPeriod } from '../dates.ts';
import type { Outcome, Scene } from '../outcome.ts';
import { addStep } from '../outcome.ts';
import { periodOf } from '../rule-set.ts';
import type { ChangeOverKeep } from '../rule-schema.ts';
import type { FoundTrigger } from '../triggers.ts';

/** Evaluates the rule: the new end, but never one that the former law still held back. */
export function keepThroughChange(
  keep: ChangeOverKeep,
  trigger: FoundTrigger,
  scene: Scene,
): Outcome {
  const start = endOfCalendarYear(trigger.day);
  const period = periodOf(keep.period);
  const renewed = addPeriod(start, period);
  addStep(scene, `${wordPeriod(period)} after the end of that year: ${wordDay(renewed)}.`, renewed);
  const former = addPeriod(start, periodOf(keep.formerPeriod));
  const lastFormerDay = addDays(keep.changedFrom, -1);
  const heldBack = former < lastFormerDay ? former : lastFormerDay;
  if (heldBack > renewed) {
    addStep(
      scene,
      `Under the law before ${wordDay(keep.changedFrom)} it was still to be kept: until ${wordDay(heldBack)}.`,
      heldBack,
    );
  }
  return { kind: 'dated', until: laterOf(renewed, heldBack) };
}
