/** Correcting and deciding a paper, and taking the last change back. */
import { classLabel, requireClass } from '../../contract/document-classes.ts';
import type { Paper, Pile, UpdatePaper } from '../../contract/papers.ts';
import { pileLabels, statusOfPile } from '../../contract/papers.ts';
import type { EditableColumns } from './snapshot.ts';
import {
  findLastChange,
  listPaperChanges as listChangeRows,
  markUndone,
} from '../../db/repositories/paper-change-repository.ts';
import { namesOf } from '../../db/repositories/event-repository.ts';
import { findPaper, type StoredPaper } from '../../db/repositories/paper-repository.ts';
import { findSubject } from '../../db/repositories/subject-repository.ts';
import { ConflictError, ForbiddenError, InvalidInputError } from '../../errors.ts';
import { type Actor, isOfPractice, requireReach, requireVisible } from './actor.ts';
import { patchFacts, withKeyDate } from './patch-facts.ts';
import { changeLocked, type PaperChange, type PaperDay } from './save-change.ts';
import { canTakeBack, restoreSnapshot } from './snapshot.ts';
import { getPaper } from './view-paper.ts';

interface Target {
  id: string;
  version: number;
}

/**
 * Corrects or decides a paper. Choosing a pile is a decision; the reader's own opinion stays in `read`.
 * @throws StaleVersionError, InvalidInputError, ForbiddenError
 */
export async function updatePaper(
  target: Target,
  patch: UpdatePaper,
  actor: Actor,
  day: PaperDay,
): Promise<Paper> {
  await changeLocked(target, actor, day, async (paper) => {
    requireReach(actor, paper.classGroup, 'deciding about it');
    if (patch.class) requireReach(actor, requireClass(patch.class).group, 'deciding about it');
    if (patch.practiceNote !== undefined && !isOfPractice(actor)) {
      throw new ForbiddenError('Notes for the practice alone are written by the practice.');
    }
    await requireOwnSubject(patch.subjectId, paper.householdId);
    return decideChange(paper, patch, actor, day);
  });
  return getPaper(target.id, actor, day);
}

/** The change that a patch makes to a paper. */
function decideChange(
  paper: StoredPaper,
  patch: UpdatePaper,
  actor: Actor,
  day: PaperDay,
): PaperChange {
  const { class: nextClass, facts, answers, pile, status, ...plain } = patch;
  const values: Partial<EditableColumns> = { ...definedOnly(plain) };
  const classId = nextClass ?? paper.class;
  if (nextClass && (nextClass !== paper.class || paper.confidence !== null)) {
    values.class = nextClass;
    // A person's word: no doubt is left to show.
    values.confidence = null;
  }
  const country = patch.country ?? paper.country;
  if (facts) values.facts = patchFacts(paper.facts, facts, classId, country);
  else if (values.class || patch.country) {
    values.facts = withKeyDate(paper.facts, classId, country);
  }
  if (answers) values.answers = { ...paper.answers, ...answers };
  // A step down was a decision about the paper as it was understood then.
  if (values.class || values.facts || answers) values.steppedDown = null;
  Object.assign(values, decideState(paper, { pile, status }, actor, day));
  return { values, sentence: describePatch(paper, patch), action: 'paper.changed' };
}

/** The state that goes with a pile or an explicit state; both together must not contradict each other. */
function decideState(
  paper: StoredPaper,
  { pile, status }: Pick<UpdatePaper, 'pile' | 'status'>,
  actor: Actor,
  day: PaperDay,
): Partial<EditableColumns> {
  if (pile === undefined && status === undefined) return {};
  if (status === 'to-review') {
    if (pile !== undefined) {
      throw new InvalidInputError([
        {
          field: 'pile',
          message: 'A paper that waits for review has no pile yet. Leave the pile out.',
        },
      ]);
    }
    return { status, pile: null, reviewedAt: null, reviewedBy: null };
  }
  const nextPile: Pile = pile ?? pileOfStatus(paper, status);
  const nextStatus = status ?? statusOfPile[nextPile];
  if (statusOfPile[nextPile] !== nextStatus) {
    throw new InvalidInputError([
      {
        field: 'status',
        message: `The pile "${pileLabels[nextPile]}" and the state "${nextStatus}" do not go together. Choose one of them.`,
      },
    ]);
  }
  return { pile: nextPile, status: nextStatus, reviewedAt: day.now, reviewedBy: actor.user.id };
}

/** The pile that a state given alone stands for; the one it is on when that fits. */
function pileOfStatus(paper: StoredPaper, status: UpdatePaper['status']): Pile {
  const current: Pile | null = paper.pile;
  if (current && statusOfPile[current] === status) return current;
  if (status === 'undecided') return 'undecided';
  return status === 'leaving' ? 'shred' : 'file-here';
}

/** Takes the last change back, as long as the paper has not left. @throws ConflictError */
export async function undoPaper(target: Target, actor: Actor, day: PaperDay): Promise<Paper> {
  await changeLocked(target, actor, day, async (paper, transaction) => {
    requireReach(actor, paper.classGroup, 'changing it');
    const last = await findLastChange(paper.id, transaction);
    if (!canTakeBack(last)) {
      throw new ConflictError('There is nothing to take back on this paper.');
    }
    await markUndone(last.id, transaction);
    return {
      values: restoreSnapshot(last.before),
      sentence: `Took back: ${last.sentence}`,
      action: 'paper.undone',
      isUndoing: true,
    };
  });
  return getPaper(target.id, actor, day);
}

/** What was changed on a paper, newest first. */
export async function listPaperChanges(paperId: string, actor: Actor) {
  requireVisible(actor, await findPaper(paperId));
  const rows = await listChangeRows(paperId);
  const names = await namesOf(rows.map((row) => row.userId));
  const items = rows.map((row) => ({
    id: row.id,
    at: row.at.toISOString(),
    byName: row.userId ? (names.get(row.userId) ?? 'Somebody') : 'Slackwater',
    sentence: row.sentence,
    undone: row.undone,
  }));
  return { items, total: items.length };
}

async function requireOwnSubject(
  subjectId: string | null | undefined,
  householdId: string,
): Promise<void> {
  if (!subjectId) return;
  const subject = await findSubject(subjectId);
  if (subject?.householdId !== householdId) {
    throw new InvalidInputError([
      {
        field: 'subjectId',
        message: 'The household has nothing of this id that papers are about.',
      },
    ]);
  }
}

const fieldWords: Record<string, string> = {
  country: 'country',
  facts: 'what was read',
  answers: 'answers for the rules',
  keptBecause: 'why it is kept',
  place: 'place',
  note: 'note',
  practiceNote: "the practice's note",
  title: 'title',
  subjectId: 'what it is about',
  sheets: 'number of sheets',
};

/** A plain sentence without private matter: values of notes and facts are not repeated. */
function describePatch(paper: StoredPaper, patch: UpdatePaper): string {
  const parts: string[] = [];
  if (patch.class && patch.class !== paper.class) parts.push(`is "${classLabel(patch.class)}"`);
  else if (patch.class) parts.push(`confirmed as "${classLabel(patch.class)}"`);
  if (patch.pile) parts.push(`put on "${pileLabels[patch.pile]}"`);
  else if (patch.status) parts.push(`set to "${patch.status}"`);
  const fields = Object.keys(patch).flatMap((name) => fieldWords[name] ?? []);
  if (fields.length > 0) parts.push(`changed ${fields.join(', ')}`);
  return `${parts.join('; ') || 'nothing changed'}.`;
}

function definedOnly<T extends object>(values: T): T {
  return Object.fromEntries(Object.entries(values).filter(([, value]) => value !== undefined)) as T;
}
