/** Germany, private tax papers: the assessment period counts from the end of the year of filing (AO §§169, 170). */
import { addPeriod, addYears, endOfCalendarYear, laterOf, wordDay, wordPeriod } from '../dates.ts';
import type { Outcome, Scene } from '../outcome.ts';
import { addStep, openUntilAnswered } from '../outcome.ts';
import { periodOf } from '../rule-set.ts';
import type { FilingYearKeep } from '../rule-schema.ts';
import type { FoundTrigger } from '../triggers.ts';

/** Evaluates the rule for the tax year that ends on the trigger day. */
export function keepFromFilingYear(
  keep: FilingYearKeep,
  trigger: FoundTrigger,
  scene: Scene,
): Outcome {
  const filed = scene.inputs[keep.filing];
  const period = periodOf(keep.period);
  const yearEnd = endOfCalendarYear(trigger.day);
  const onTime = addYears(yearEnd, keep.onTimeYears);
  if (filed === undefined) {
    const until = addPeriod(onTime, period);
    return openUntilAnswered(
      'When the return of that year was filed is not known.',
      keep.filing,
      until,
      `the return was filed in ${onTime.slice(0, 4)}`,
    );
  }
  const start =
    filed === null
      ? addYears(yearEnd, keep.neverFiledYears)
      : laterOf(yearEnd, endOfCalendarYear(filed));
  const until = addPeriod(start, period);
  addStep(
    scene,
    filed === null
      ? `Not filed: the clock starts at the latest on ${wordDay(start)}.`
      : `Filed ${wordDay(filed)}: the clock starts at the end of that year, ${wordDay(start)}.`,
    start,
  );
  addStep(scene, `${wordPeriod(period)} later: ${wordDay(until)}.`, until);
  return { kind: 'dated', until };
}
