/** One rule, one case: what the rule says. */
import type { IsoDate } from '../contract/dates.ts';
import { wordDay } from './dates.ts';
import { findPaperDate } from './moments.ts';
import type { Outcome, Scene } from './outcome.ts';
import { addStep, openBecause } from './outcome.ts';
import type { Keep, Rule } from './rule-schema.ts';
import { keepThroughChange } from './strategies/change-over.ts';
import { keepFromFiling } from './strategies/filing-start.ts';
import { keepFromFilingYear } from './strategies/filing-year.ts';
import { keepForLateRestart } from './strategies/late-restart.ts';
import { keepForPeriod } from './strategies/plain-period.ts';
import { keepForReturnWindow } from './strategies/return-window.ts';
import { findTrigger, isFound } from './triggers.ts';

/** No last day to keep: may go from the day received, else the paper's date, else the day asked about. */
function keepNothing(scene: Scene): Outcome {
  const { receivedOn } = scene.inputs;
  const from: IsoDate = receivedOn ?? findPaperDate(scene.inputs) ?? scene.on;
  addStep(scene, `Nothing asks for it to be kept: it may go from ${wordDay(from)}.`, from);
  return { kind: 'none', from };
}

type TriggeredKeep = Exclude<Keep, { how: 'permanent' | 'none' | 'owner-decides' | 'open' }>;

/**
 * The return that tells of a sale is not filed before it: an earlier filing day is another year's, so that of this
 * year is not known.
 */
function withoutEarlierFiling(keep: TriggeredKeep, scene: Scene): Scene {
  const event = keep.waitsFor ? scene.inputs[keep.waitsFor] : null;
  const filing = keep.how === 'return-window' ? 'filedOn' : 'filing' in keep ? keep.filing : null;
  if (!event || !filing) return scene;
  const filed = scene.inputs[filing];
  if (!filed || filed >= event) return scene;
  const { [filing]: _earlier, ...inputs } = scene.inputs;
  return { ...scene, inputs };
}

function evaluateTriggered(rule: Rule, keep: TriggeredKeep, given: Scene): Outcome {
  const scene = withoutEarlierFiling(keep, given);
  const trigger = findTrigger(keep, scene);
  if (keep.how === 'filing-start') {
    // Waiting for an event stands before the return; a missing year does not when the due day is given.
    if (keep.waitsFor && !scene.inputs[keep.waitsFor] && !isFound(trigger)) return trigger;
    return keepFromFiling(keep, trigger, scene);
  }
  if (!isFound(trigger)) return trigger;
  if (rule.validFrom && trigger.day < rule.validFrom) return { kind: 'not-in-force' };
  if (rule.validTo && trigger.day > rule.validTo) return { kind: 'not-in-force' };
  switch (keep.how) {
    case 'period':
      return keepForPeriod(keep, trigger, scene);
    case 'return-window':
      return keepForReturnWindow(keep, trigger, scene);
    case 'late-restart':
      return keepForLateRestart(keep, trigger, scene);
    case 'change-over':
      return keepThroughChange(keep, trigger, scene);
    case 'filing-year':
      return keepFromFilingYear(keep, trigger, scene);
  }
}

/** Evaluates a rule that applies to the case; steps and assumptions are noted in the scene. */
export function evaluateRule(rule: Rule, scene: Scene): Outcome {
  const { keep } = rule;
  switch (keep.how) {
    case 'permanent':
      addStep(scene, `${rule.title}: kept for ever.`, null);
      return { kind: 'permanent' };
    case 'none':
      return keepNothing(scene);
    case 'owner-decides':
      addStep(scene, `${rule.title}: the owner decides.`, null);
      return { kind: 'owner-decides' };
    case 'open':
      if (!keep.answer || scene.inputs[keep.answer.input] !== undefined)
        return openBecause(keep.because);
      return {
        kind: 'open',
        because: keep.because,
        missing: keep.answer.input,
        provisional: null,
        assuming: keep.answer.assuming,
      };
    default:
      return evaluateTriggered(rule, keep, scene);
  }
}
