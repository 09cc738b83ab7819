/**
 * United States, Australia: the clock starts when the return is filed, an early return counting as filed on the
 * due day (26 USC 6501(b)(1); ITAA 1997 s.900-25(2)). In the US the due day is the one in the statute, not moved
 * and not extended, and the end of the period moves over weekends and holidays (26 USC 7503).
 */
import type { IsoDate } from '../../contract/dates.ts';
import { addPeriod, laterOf, wordDay, wordPeriod } from '../dates.ts';
import { shiftToWorkingDay } from '../holidays.ts';
import type { Outcome, Scene } from '../outcome.ts';
import { addAssumption, addStep, openBecause, openUntilAnswered } from '../outcome.ts';
import { periodOf } from '../rule-set.ts';
import type { FilingStartKeep } from '../rule-schema.ts';
import type { FoundTrigger } from '../triggers.ts';
import { isFound } from '../triggers.ts';
import { findNominalDue } from './due-days.ts';

function shiftEnd(keep: FilingStartKeep, day: IsoDate, scene: Scene): IsoDate {
  if (!keep.shift) return day;
  const moved = shiftToWorkingDay(day, keep.shift);
  if (moved !== day) {
    addStep(
      scene,
      `${wordDay(day)} is a weekend day or holiday: moves to ${wordDay(moved)}.`,
      moved,
    );
  }
  return moved;
}

/** An amended return that shows more tax and arrives in the last days of the period (26 USC 6501(c)(7)). */
function extendForAmendment(keep: FilingStartKeep, until: IsoDate, scene: Scene): IsoDate {
  const { amendedReturnReceivedOn, amendedOn, amendmentIncreasesTax } = scene.inputs;
  const received = amendedReturnReceivedOn ?? amendedOn;
  if (!keep.lateAmendment || !received || received > until) return until;
  if (amendmentIncreasesTax === false || amendmentIncreasesTax === null) return until;
  const extended = addPeriod(received, periodOf(keep.lateAmendment));
  if (extended <= until) return until;
  if (amendmentIncreasesTax === undefined) {
    addAssumption(
      scene,
      'Whether the amended return shows more tax is not known: counted as more.',
    );
  }
  addStep(
    scene,
    `Amended return received ${wordDay(received)}, near the end: ${wordPeriod(periodOf(keep.lateAmendment))} more run to ${wordDay(extended)}.`,
    extended,
  );
  return shiftEnd(keep, extended, scene);
}

function countFrom(keep: FilingStartKeep, start: IsoDate, scene: Scene): IsoDate {
  const period = periodOf(keep.period);
  const end = addPeriod(start, period);
  addStep(scene, `${wordPeriod(period)} after ${wordDay(start)}: ${wordDay(end)}.`, end);
  return extendForAmendment(keep, shiftEnd(keep, end, scene), scene);
}

/** The due day given, or worked out from the year's end; null when neither is known. */
export function findFilingDue(
  keep: Pick<FilingStartKeep, 'due' | 'dueInput'>,
  trigger: FoundTrigger | Outcome,
  scene: Scene,
): IsoDate | null {
  const { inputs } = scene;
  const given = inputs[keep.dueInput] ?? inputs.nominalDueOn;
  if (given) return given;
  if (isFound(trigger)) return findNominalDue(keep.due, trigger.day);
  // A moved due day is never earlier than the one in the statute.
  return inputs.dueOn ?? null;
}

/** Evaluates the rule; the trigger is the end of the year, which the due day may stand in for. */
export function keepFromFiling(
  keep: FilingStartKeep,
  trigger: FoundTrigger | Outcome,
  scene: Scene,
): Outcome {
  const filed = scene.inputs[keep.filing];
  if (filed === null) return openBecause('No return has been filed, so the clock has not started.');
  const due = findFilingDue(keep, trigger, scene);
  if (!due) return openBecause('The year of the return is not known.');
  if (filed === undefined) {
    return openUntilAnswered(
      'When the return of that year was filed is not known.',
      keep.filing,
      countFrom(keep, due, scene),
      'the return was filed on time',
    );
  }
  if (keep.startFrom === 'due') {
    addStep(scene, `Counts from the due day ${wordDay(due)}.`, due);
    return { kind: 'dated', until: countFrom(keep, due, scene) };
  }
  const start = laterOf(filed, due);
  addStep(
    scene,
    filed <= due
      ? `Filed ${wordDay(filed)}: counts as filed on the due day ${wordDay(due)}.`
      : `Filed ${wordDay(filed)}, after the due day ${wordDay(due)}: counts from the filing.`,
    start,
  );
  return { kind: 'dated', until: countFrom(keep, start, scene) };
}
