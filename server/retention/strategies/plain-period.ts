/** A period from a trigger: the ordinary rule. */
import type { IsoDate } from '../../contract/dates.ts';
import {
  addDays,
  addPeriod,
  birthdayAt,
  endOfCalendarYear,
  endOfMonth,
  wordDay,
  wordPeriod,
} from '../dates.ts';
import { shiftToWorkingDay } from '../holidays.ts';
import type { Outcome, Scene } from '../outcome.ts';
import { addStep, openUntilAnswered } from '../outcome.ts';
import { periodOf, requireLimitation } from '../rule-set.ts';
import type { PeriodKeep } from '../rule-schema.ts';
import type { FoundTrigger } from '../triggers.ts';

function alignStart(keep: PeriodKeep, day: IsoDate, fromYearEnd: boolean): IsoDate {
  if (fromYearEnd) return endOfCalendarYear(day);
  switch (keep.startAt) {
    case 'trigger':
      return day;
    case 'end-of-calendar-year':
      return endOfCalendarYear(day);
    case 'end-of-month':
      return endOfMonth(day);
  }
}

/** Evaluates the rule from its trigger day. */
export function keepForPeriod(keep: PeriodKeep, trigger: FoundTrigger, scene: Scene): Outcome {
  let text: string;
  let fromYearEnd = false;
  if (typeof keep.period === 'string') text = keep.period;
  else
    ({ text, fromYearEnd } = requireLimitation(scene.table, keep.period.limitation, scene.region));
  let start = alignStart(keep, trigger.day, fromYearEnd);
  if (start !== trigger.day)
    addStep(scene, `The clock starts at the end of that year: ${wordDay(start)}.`, start);
  const { birthDate } = scene.inputs;
  if (keep.notBeforeAge && birthDate) {
    const birthday = birthdayAt(birthDate, keep.notBeforeAge);
    if (birthday > start) {
      start = birthday;
      addStep(
        scene,
        `A child's claim does not start to run out before the birthday on ${wordDay(birthday)}.`,
        birthday,
      );
    }
  }
  const period = periodOf(text);
  let until = addPeriod(start, period);
  if (keep.counting === 'beginning-with') {
    until = addDays(until, -1);
    addStep(
      scene,
      `${wordPeriod(period)} beginning with that day end on ${wordDay(until)}.`,
      until,
    );
  } else if (text !== 'P0D')
    addStep(scene, `${wordPeriod(period)} later: ${wordDay(until)}.`, until);
  if (keep.alignEnd !== 'none') {
    until = keep.alignEnd === 'end-of-month' ? endOfMonth(until) : endOfCalendarYear(until);
    addStep(
      scene,
      `Runs to the end of that ${keep.alignEnd === 'end-of-month' ? 'month' : 'year'}: ${wordDay(until)}.`,
      until,
    );
  }
  if (keep.shift) {
    const moved = shiftToWorkingDay(until, keep.shift);
    if (moved !== until)
      addStep(scene, `That is a weekend or holiday: moves to ${wordDay(moved)}.`, moved);
    until = moved;
  }
  if (trigger.lacking !== null) {
    return openUntilAnswered(
      `The answer "${trigger.lacking}" is not known and may move the date.`,
      trigger.lacking,
      until,
      `that "${trigger.lacking}" is no later than ${wordDay(trigger.day)}`,
    );
  }
  if (keep.needsBirthDate && birthDate === undefined) {
    return openUntilAnswered(
      'Whose claim it is is not known: a child has longer.',
      'birthDate',
      until,
      'that the injured person was 18 or older',
    );
  }
  return { kind: 'dated', until };
}
