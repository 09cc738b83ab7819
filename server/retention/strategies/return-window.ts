/**
 * United Kingdom: papers behind a return are kept to a base date, and longer while the authority may still open
 * an enquiry: after a late or amended return up to the quarter day next following its first anniversary
 * (TMA 1970 ss.9A, 12B; FA 1998 Sch 18 paras 21, 24), by the published rule 15 months after a late return.
 */
import type { IsoDate } from '../../contract/dates.ts';
import {
  addPeriod,
  addYears,
  findLatest,
  laterOf,
  nextFollowing,
  nextFollowingOf,
  wordDay,
  wordPeriod,
} from '../dates.ts';
import type { Outcome, Scene } from '../outcome.ts';
import { addAssumption, addStep, openBecause, openUntilAnswered } from '../outcome.ts';
import { periodOf } from '../rule-set.ts';
import type { ReturnWindowKeep } from '../rule-schema.ts';
import type { FoundTrigger } from '../triggers.ts';
import { findDue } from './due-days.ts';

function findBase(keep: ReturnWindowKeep, yearEnd: IsoDate, scene: Scene): IsoDate {
  const period = periodOf(keep.period);
  if (!keep.anchor) {
    const base = addPeriod(yearEnd, period);
    addStep(scene, `${wordPeriod(period)} after the end of that year: ${wordDay(base)}.`, base);
    return base;
  }
  const anchor = nextFollowing(yearEnd, keep.anchor);
  const base = addPeriod(anchor, period);
  addStep(
    scene,
    `${wordPeriod(period)} after the ${wordDay(anchor)} that follows: ${wordDay(base)}.`,
    base,
  );
  return base;
}

/** The quarter day next following the first anniversary of a late return or an amendment. */
function findQuarterDay(keep: ReturnWindowKeep, from: IsoDate): IsoDate {
  return nextFollowingOf(addYears(from, 1), keep.quarterDays);
}

function extendForFiling(
  keep: ReturnWindowKeep,
  yearEnd: IsoDate,
  filedOn: IsoDate,
  base: IsoDate,
  scene: Scene,
): IsoDate {
  const { dueOn, nominalDueOn, noticeToFileOn } = scene.inputs;
  let due = findDue(keep.due, yearEnd, { dueOn, nominalDueOn });
  if (!dueOn && noticeToFileOn && keep.noticeExtends) {
    due = laterOf(due, addPeriod(noticeToFileOn, periodOf(keep.noticeExtends)));
  }
  if (filedOn <= due) {
    if (!keep.onTimeWindow) return base;
    const window = addPeriod(filedOn, periodOf(keep.onTimeWindow));
    addStep(
      scene,
      `Filed ${wordDay(filedOn)}, in time (due ${wordDay(due)}): an enquiry can start until ${wordDay(window)}.`,
      window,
    );
    return laterOf(base, window);
  }
  let until = base;
  const quarterDay = findQuarterDay(keep, filedOn);
  addStep(
    scene,
    `Filed ${wordDay(filedOn)}, late (due ${wordDay(due)}): the quarter day after its first anniversary is ${wordDay(quarterDay)}.`,
    quarterDay,
  );
  until = laterOf(until, quarterDay);
  const isLateEnough =
    !keep.lateWindowAfter || filedOn > addPeriod(due, periodOf(keep.lateWindowAfter));
  if (keep.lateWindow && isLateEnough) {
    const period = periodOf(keep.lateWindow);
    const window = addPeriod(filedOn, period);
    addStep(scene, `${wordPeriod(period)} after the late return: ${wordDay(window)}.`, window);
    until = laterOf(until, window);
  }
  return until;
}

/** Evaluates the rule for the year that ends on the trigger day. */
export function keepForReturnWindow(
  keep: ReturnWindowKeep,
  trigger: FoundTrigger,
  scene: Scene,
): Outcome {
  const { filedOn, noticeToFileOn } = scene.inputs;
  const amendedOn = findLatest([scene.inputs.amendedOn, scene.inputs.amendedReturnReceivedOn]);
  let until = findBase(keep, trigger.day, scene);
  if (amendedOn) {
    const quarterDay = findQuarterDay(keep, amendedOn);
    addStep(
      scene,
      `Amended ${wordDay(amendedOn)}: the quarter day after its first anniversary is ${wordDay(quarterDay)}.`,
      quarterDay,
    );
    until = laterOf(until, quarterDay);
  }
  if (filedOn) {
    return { kind: 'dated', until: extendForFiling(keep, trigger.day, filedOn, until, scene) };
  }
  if (filedOn === null) {
    if (noticeToFileOn) {
      return openBecause(
        'A return was asked for and has not been filed, so the clock can still move.',
      );
    }
    addStep(scene, 'No return was asked for or sent: the date stands.', null);
    return { kind: 'dated', until };
  }
  if (keep.ifFilingUnknown === 'on-time') {
    addAssumption(scene, 'When the return was filed is not known: counted as filed on time.');
    return { kind: 'dated', until };
  }
  return openUntilAnswered(
    'When the return of that year was filed is not known.',
    'filedOn',
    until,
    'the return was filed on time',
  );
}
