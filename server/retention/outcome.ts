/** What one rule says of one case, before rules, owners and holds are put together. */
import type { AssessmentStep } from '../contract/assessments.ts';
import type { CaseInputs } from '../contract/cases.ts';
import type { IsoDate } from '../contract/dates.ts';
import type { RuleTable } from './rule-schema.ts';

export type Outcome =
  | { readonly kind: 'permanent' }
  | { readonly kind: 'owner-decides' }
  | { readonly kind: 'none'; readonly from: IsoDate }
  | { readonly kind: 'dated'; readonly until: IsoDate }
  | {
      readonly kind: 'open';
      readonly because: string;
      /** The one answer that would give a date, with the date for the case named in `assuming`. */
      readonly missing: string | null;
      readonly provisional: IsoDate | null;
      readonly assuming: string | null;
    }
  /** The rule was not in force on its trigger. */
  | { readonly kind: 'not-in-force' };

/** What a rule is evaluated against: the case of one owner, with places to note steps and assumptions. */
export interface Scene {
  readonly inputs: CaseInputs;
  readonly on: IsoDate;
  readonly table: RuleTable;
  readonly region: string | null;
  readonly steps: AssessmentStep[];
  readonly assumed: string[];
}

/** Open without a date to offer. */
export function openBecause(because: string): Outcome {
  return { kind: 'open', because, missing: null, provisional: null, assuming: null };
}

/** Open for want of one answer, with the date that a favourable answer would give. */
export function openUntilAnswered(
  because: string,
  missing: string,
  provisional: IsoDate,
  assuming: string,
): Outcome {
  return { kind: 'open', because, missing, provisional, assuming };
}

/** Notes a step of the sum. */
export function addStep(scene: Scene, text: string, date: IsoDate | null): void {
  scene.steps.push({ text, date });
}

/** Notes how something unknown was counted. */
export function addAssumption(scene: Scene, text: string): void {
  scene.assumed.push(text);
}
