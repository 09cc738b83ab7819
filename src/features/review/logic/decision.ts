/** What a decision about a paper is made of, before it is sent. */
import { classLabel } from '../../../../server/contract/document-classes.ts';
import {
  pileLabels,
  statusOfPile,
  type Paper,
  type Pile,
  type UpdatePaper,
} from '../../../../server/contract/papers.ts';

/** Piles from which the sheet leaves the household: nobody chooses one unseen. */
export function isLeavingPile(pile: Pile): boolean {
  return statusOfPile[pile] === 'leaving';
}

/**
 * Whether the paper has been seen: one of its pages was shown at full size. A paper entered without a
 * scan was in the hand of the person who described it.
 */
export function hasBeenSeen(
  paper: Pick<Paper, 'pages'>,
  shownPageIds: ReadonlySet<string>,
): boolean {
  return paper.pages.length === 0 || paper.pages.some((page) => shownPageIds.has(page.id));
}

/** Reasons of the gate that the decision itself settles, so that they are no obstacle to it. */
const settledByDeciding = /review|looked|pile|status|decid/;

/** Why a paper put on a leaving pile would have to wait, one sentence each; empty when it may go. */
export function listObstacles(paper: Pick<Paper, 'gate' | 'assessment'>, pile: Pile): string[] {
  if (!isLeavingPile(pile)) return [];
  const sentences = paper.gate
    .filter((reason) => !settledByDeciding.test(reason.code))
    .map((reason) => reason.sentence);
  return [...new Set(sentences)];
}

export type PileAnswer =
  { may: true } | { may: false; because: 'unseen' } | { may: false; because: 'obstacles' };

/** Whether a pile may be chosen straight away, or what has to be settled first. */
export function decidePile(
  paper: Pick<Paper, 'pages' | 'gate' | 'assessment'>,
  pile: Pile,
  shownPageIds: ReadonlySet<string>,
): PileAnswer {
  if (!isLeavingPile(pile)) return { may: true };
  if (!hasBeenSeen(paper, shownPageIds)) return { may: false, because: 'unseen' };
  return listObstacles(paper, pile).length > 0
    ? { may: false, because: 'obstacles' }
    : { may: true };
}

/** The pile that the rules' advice points to; null when the paper is simply kept. */
export function findSuggestedPile(paper: Pick<Paper, 'gate' | 'assessment'>): Pile | null {
  const { disposal, permanent, open, heldBy } = paper.assessment;
  if (permanent || open || heldBy.length > 0) return null;
  if (disposal === 'return') return 'give-back';
  if (disposal !== 'shred' && disposal !== 'recycle') return null;
  return listObstacles(paper, disposal).length === 0 ? disposal : null;
}

/** The paper as it will look once the patch is saved; dates stay as they are until the server answers. */
export function applyPatch(paper: Paper, patch: UpdatePaper): Paper {
  const next: Paper = { ...paper };
  if (patch.class !== undefined && patch.class !== paper.class) {
    next.class = patch.class;
    next.confidence = null;
  }
  if (patch.pile !== undefined) {
    next.pile = patch.pile;
    next.status = statusOfPile[patch.pile];
  }
  if (patch.status !== undefined) next.status = patch.status;
  if (patch.keptBecause !== undefined) next.keptBecause = patch.keptBecause;
  if (patch.place !== undefined) next.place = patch.place;
  if (patch.note !== undefined) next.note = patch.note;
  if (patch.practiceNote !== undefined) next.practiceNote = patch.practiceNote;
  if (patch.country !== undefined) next.country = patch.country;
  return next;
}

/** Whether a patch can move the dates, so that the shown ones are old until the server answers. */
export function movesDates(patch: UpdatePaper): boolean {
  return (
    patch.class !== undefined ||
    patch.facts !== undefined ||
    patch.country !== undefined ||
    patch.answers !== undefined ||
    patch.subjectId !== undefined
  );
}

/** Two patches of one paper as one; the later wins field by field. */
export function mergePatches(earlier: UpdatePaper, later: UpdatePaper): UpdatePaper {
  const merged: UpdatePaper = { ...earlier, ...later };
  if (earlier.facts && later.facts) {
    merged.facts = { ...earlier.facts, ...later.facts };
    if (earlier.facts.dates && later.facts.dates) {
      merged.facts.dates = { ...earlier.facts.dates, ...later.facts.dates };
    }
  }
  if (earlier.answers && later.answers) merged.answers = { ...earlier.answers, ...later.answers };
  return merged;
}

/** What a patch did, for the passing message: "Bank statement 12: Shred". */
export function describePatch(paper: Pick<Paper, 'number' | 'class'>, patch: UpdatePaper): string {
  const name = `${classLabel(patch.class ?? paper.class)}, no. ${paper.number}`;
  if (patch.pile !== undefined) {
    return patch.pile === 'undecided'
      ? `${name}: left undecided`
      : `${name}: ${pileLabels[patch.pile]}`;
  }
  if (patch.class !== undefined) return `${name}: kind changed`;
  if (patch.facts !== undefined) return `${name}: corrected`;
  return `${name}: saved`;
}
