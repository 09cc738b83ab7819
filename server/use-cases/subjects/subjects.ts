/** What papers are about; when it ends, the clocks of its papers start. */
import type { z } from 'zod';
import type { createSubjectSchema, Subject, updateSubjectSchema } from '../../contract/subjects.ts';
import { appendEvent } from '../../db/repositories/event-repository.ts';
import {
  countPapersBySubject,
  findSubject,
  insertSubject,
  listSubjects as listSubjectRows,
  type SubjectRow,
  updateSubject as updateSubjectRow,
} from '../../db/repositories/subject-repository.ts';
import { inTransaction } from '../../db/transaction.ts';
import { InvalidInputError, NotFoundError, StaleVersionError } from '../../errors.ts';
import { reassessPapers } from '../assess-paper.ts';
import { type Actor, visibilityOf } from '../papers/actor.ts';
import type { PaperDay } from '../papers/save-change.ts';

export async function listSubjects(actor: Actor): Promise<{ items: Subject[]; total: number }> {
  const rows = await listSubjectRows(actor.householdId);
  const counts = await countPapersBySubject(actor.householdId, visibilityOf(actor));
  // Somebody who sees some kinds of paper only learns of a subject through its papers.
  const visible = rows.filter((row) => actor.seeReach === 'all' || counts.has(row.id));
  const items = visible.map((row) => viewSubject(row, counts.get(row.id) ?? 0));
  return { items, total: items.length };
}

export async function createSubject(
  input: z.infer<typeof createSubjectSchema>,
  actor: Actor,
  day: PaperDay,
): Promise<Subject> {
  requireOrder(input.startedOn, input.endedOn);
  const row = await inTransaction(async (transaction) => {
    const made = await insertSubject(
      {
        ...input,
        endKnown: input.endKnown || input.endedOn !== null,
        householdId: actor.householdId,
      },
      transaction,
    );
    await record(
      actor,
      day,
      'subject.created',
      `Added "${made.name}", which papers are about.`,
      transaction,
    );
    return made;
  });
  return viewSubject(row, 0);
}

/** Changes a subject and assesses its papers anew. @throws StaleVersionError */
export async function updateSubject(
  target: { id: string; version: number },
  changes: z.infer<typeof updateSubjectSchema>,
  actor: Actor,
  day: PaperDay,
): Promise<Subject> {
  const before = await findSubject(target.id);
  if (!before || before.householdId !== actor.householdId) throw new NotFoundError();
  const next = { ...before, ...changes };
  requireOrder(next.startedOn, next.endedOn);
  // An end that was written down is a known one.
  const values = changes.endedOn ? { ...changes, endKnown: true } : changes;
  const isWritten = await inTransaction(async (transaction) => {
    if (!(await updateSubjectRow(target.id, target.version, values, transaction))) return false;
    await reassessPapers(
      { householdId: actor.householdId, subjectId: target.id },
      day,
      transaction,
    );
    const sentence = changes.endedOn
      ? `Recorded that "${next.name}" ended; its papers were assessed anew.`
      : `Changed "${next.name}"; its papers were assessed anew.`;
    await record(actor, day, 'subject.changed', sentence, transaction);
    return true;
  });
  const row = await findSubject(target.id);
  if (!row) throw new NotFoundError();
  const counts = await countPapersBySubject(actor.householdId, visibilityOf(actor));
  const view = viewSubject(row, counts.get(row.id) ?? 0);
  if (!isWritten) throw new StaleVersionError(view);
  return view;
}

function requireOrder(startedOn: string | null, endedOn: string | null): void {
  if (startedOn && endedOn && endedOn < startedOn) {
    throw new InvalidInputError([
      { field: 'endedOn', message: 'It cannot end before it began. Check both dates.' },
    ]);
  }
}

async function record(
  actor: Actor,
  day: PaperDay,
  action: string,
  sentence: string,
  transaction: Parameters<typeof appendEvent>[1],
): Promise<void> {
  await appendEvent(
    {
      practiceId: actor.practiceId,
      householdId: actor.householdId,
      userId: actor.user.id,
      at: day.now,
      action,
      sentence,
    },
    transaction,
  );
}

function viewSubject(row: SubjectRow, papers: number): Subject {
  const { createdAt: _createdAt, ...view } = row;
  return { ...view, papers };
}
