/** Asks the gate about a stored paper, with a fresh sum for the day. */
import type { Assessment } from '../../contract/assessments.ts';
import type { IsoDate } from '../../contract/dates.ts';
import type { Pile } from '../../contract/papers.ts';
import type { StoredPaper } from '../../db/repositories/paper-repository.ts';
import type { Reason } from '../../errors.ts';
import { type DepartureKind, type GateReason, mayLeave } from '../../retention/departure-gate.ts';
import { type AssessContext, assessOn, holdsOfPaper } from '../assess-paper.ts';

/** The columns of a paper that the gate and the sum look at. */
export type GatedPaper = Pick<
  StoredPaper,
  | 'id'
  | 'class'
  | 'country'
  | 'facts'
  | 'answers'
  | 'subjectId'
  | 'bundle'
  | 'bundleFrom'
  | 'bundleTo'
  | 'status'
  | 'pile'
  | 'reviewedAt'
  | 'steppedDown'
>;

/**
 * Why a paper may not leave in this way on this day, with the assessment of that day.
 * @param today null while the departure is only planned
 */
export function askGate(
  paper: GatedPaper,
  context: AssessContext,
  { how, on, today }: { how: DepartureKind; on: IsoDate; today: IsoDate | null },
): { reasons: GateReason[]; assessment: Assessment } {
  const assessment = assessOn(paper, context, on);
  const reasons = mayLeave({
    paper: {
      class: paper.class,
      status: paper.status,
      pile: paper.pile,
      isReviewed: paper.reviewedAt !== null,
      isSteppedDown: isSteppedDownTo(paper, assessment),
    },
    assessment,
    holds: holdsOfPaper(paper.id, context).filter((hold) => hold.liftedOn === null),
    how,
    on,
    today,
  });
  return { reasons, assessment };
}

/** Whether the person stepped down from advice at least as long as it is now. */
function isSteppedDownTo(paper: GatedPaper, assessment: Assessment): boolean {
  if (!paper.steppedDown) return false;
  return (
    assessment.advisedUntil === null || assessment.advisedUntil <= paper.steppedDown.advisedUntil
  );
}

/** The way out that a pile stands for; shredding when it stands for none. */
export function departureOfPile(pile: Pile | null): DepartureKind {
  return pile === 'recycle' || pile === 'give-back' || pile === 'pass-on' ? pile : 'shred';
}

/** Reasons as an answer carries them: each names its paper. */
export function nameReasons(
  paper: Pick<StoredPaper, 'id' | 'number'>,
  reasons: { code: string; sentence: string }[],
): Reason[] {
  return reasons.map(({ code, sentence }) => ({
    code,
    paper: paper.id,
    sentence: `Paper ${paper.number}: ${sentence}`,
  }));
}
