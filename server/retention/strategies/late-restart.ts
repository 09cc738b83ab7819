/** Canada, Ireland: a period from the end of the year, counted again from the delivery of a late return. */
import type { IsoDate } from '../../contract/dates.ts';
import {
  addPeriod,
  endOfCalendarYear,
  findLatest,
  laterOf,
  wordDay,
  wordPeriod,
} from '../dates.ts';
import type { Outcome, Scene } from '../outcome.ts';
import { addStep, openBecause, openUntilAnswered } from '../outcome.ts';
import { periodOf } from '../rule-set.ts';
import type { LateRestartKeep } from '../rule-schema.ts';
import type { FoundTrigger } from '../triggers.ts';
import { findDue } from './due-days.ts';

function restartFrom(keep: LateRestartKeep, day: IsoDate): IsoDate {
  const start = keep.restartAt === 'delivery' ? day : endOfCalendarYear(day);
  return addPeriod(start, periodOf(keep.period));
}

/** Evaluates the rule for the year (or valuation date) of the trigger. */
export function keepForLateRestart(
  keep: LateRestartKeep,
  trigger: FoundTrigger,
  scene: Scene,
): Outcome {
  const { inputs } = scene;
  const period = periodOf(keep.period);
  const start = keep.startAt === 'trigger' ? trigger.day : endOfCalendarYear(trigger.day);
  let until = addPeriod(start, period);
  addStep(scene, `${wordPeriod(period)} after ${wordDay(start)}: ${wordDay(until)}.`, until);
  const corrected = findLatest([inputs.amendedReturnReceivedOn, inputs.amendedOn]);
  if (keep.correctionRestarts && corrected) {
    const restarted = restartFrom(keep, corrected);
    addStep(
      scene,
      `A corrected return came on ${wordDay(corrected)}: ${wordDay(restarted)}.`,
      restarted,
    );
    until = laterOf(until, restarted);
  }
  const filed = inputs[keep.filing];
  if (filed === null)
    return openBecause('The return has not been filed, so the clock has not started.');
  if (filed === undefined) {
    return openUntilAnswered(
      'When the return of that year was filed is not known.',
      keep.filing,
      until,
      'the return was filed on time',
    );
  }
  const due = findDue(keep.due, trigger.day, inputs);
  if (filed <= due) {
    addStep(
      scene,
      `Filed ${wordDay(filed)}, in time (due ${wordDay(due)}): the date stands.`,
      null,
    );
    return { kind: 'dated', until };
  }
  const restarted = restartFrom(keep, filed);
  addStep(
    scene,
    `Filed ${wordDay(filed)}, late (due ${wordDay(due)}): ${wordPeriod(period)} count from ${keep.restartAt === 'delivery' ? 'that day' : 'the end of that year'}: ${wordDay(restarted)}.`,
    restarted,
  );
  return { kind: 'dated', until: laterOf(until, restarted) };
}
