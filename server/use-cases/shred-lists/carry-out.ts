/** Recording a destruction row by row: the gate stands open once more for each paper, or nothing happens. */
import type { z } from 'zod';
import type { destructionSchema, ShredList, ShredRow } from '../../contract/shred-lists.ts';
import { listBoxCodes } from '../../db/repositories/box-repository.ts';
import { insertDepartures } from '../../db/repositories/departure-repository.ts';
import { findHousehold } from '../../db/repositories/household-repository.ts';
import {
  changePaper,
  lockPapers,
  type StoredPaper,
} from '../../db/repositories/paper-repository.ts';
import {
  listRows,
  lockShredList,
  type ShredListRow,
  type ShredRowRow,
  updateRow,
  updateShredList,
} from '../../db/repositories/shred-list-repository.ts';
import { listMembers } from '../../db/repositories/user-repository.ts';
import { inTransaction, type Transaction } from '../../db/transaction.ts';
import {
  ConflictError,
  ForbiddenError,
  GateClosedError,
  InvalidInputError,
  NotFoundError,
  type Reason,
} from '../../errors.ts';
import type { Assessment } from '../../contract/assessments.ts';
import { assessPaper, loadAssessContext } from '../assess-paper.ts';
import { type Actor, canSee, requireReach } from '../papers/actor.ts';
import { requireMandate } from '../papers/depart-paper.ts';
import { askGate, nameReasons } from '../papers/gate-paper.ts';
import type { PaperDay } from '../papers/save-change.ts';
import { findChanges } from './approved-rows.ts';
import { record } from './decide-list.ts';
import { describeRow, getShredList } from './view-list.ts';

type Destruction = z.infer<typeof destructionSchema>;
type Outcome = Destruction['rows'][number]['outcome'];

/** @throws ConflictError, InvalidInputError, GateClosedError; then nothing is recorded */
export async function recordDestruction(
  id: string,
  input: Destruction,
  actor: Actor,
  day: PaperDay,
): Promise<ShredList> {
  await requireMandate(actor, day);
  const clientPresent = input.clientPresent ?? (await isOfHousehold(input.witness, actor, day));
  await inTransaction(async (transaction) => {
    const list = await lockShredList(id, transaction);
    if (!list || list.householdId !== actor.householdId) throw new NotFoundError();
    requireTime(list, input, clientPresent, day);
    const rows = await listRows(list.id, transaction);
    const outcomes = requireOutcomes(rows, input);
    const papers = await lockPapers([...outcomes.keys()], transaction);
    if (papers.some((paper) => !canSee(actor, paper))) {
      throw new ForbiddenError(
        'There are papers on this list that you may not see. Somebody else has to record it.',
      );
    }
    for (const paper of papers) requireReach(actor, paper.classGroup, 'recording its destruction');
    const assessments = await requireGateOpen(
      list,
      papers,
      rows,
      outcomes,
      input,
      day,
      transaction,
    );
    const boxCodes = await listBoxCodes(list.householdId);
    for (const row of rows) {
      const paper = papers.find((p) => p.id === row.paperId);
      if (!paper) continue;
      const outcome = outcomes.get(row.paperId) ?? 'kept-back';
      const boxCode = boxCodes.get(paper.boxId ?? '') ?? null;
      await writeOutcome({ list, row, paper, outcome, boxCode }, input, actor, day, transaction);
    }
    await insertDepartures(
      papers.flatMap((paper) => {
        const assessment = assessments.get(paper.id);
        if (!assessment) return [];
        return {
          householdId: list.householdId,
          paperId: paper.id,
          how: 'shred' as const,
          on: input.on,
          recipient: null,
          shredListId: list.id,
          recordedBy: actor.user.id,
          recordedAt: day.now,
          assessment,
        };
      }),
      transaction,
    );
    await updateShredList(
      list.id,
      {
        status: 'done',
        doneAt: day.now,
        version: list.version + 1,
        destruction: {
          on: input.on,
          place: input.place,
          method: input.method,
          level: input.level,
          witness: input.witness,
          clientPresent,
          recordedByName: actor.user.name,
          recordedAt: day.now.toISOString(),
        },
      },
      transaction,
    );
    const destroyed = [...outcomes.values()].filter((outcome) => outcome === 'destroyed').length;
    await record(
      list,
      actor,
      day,
      'done',
      `${destroyed} of ${outcomes.size} papers destroyed.`,
      transaction,
    );
  });
  return getShredList(id, actor, day);
}

/** The list is approved, the waiting time is over or the client was there, and the approval still held. */
function requireTime(
  list: ShredListRow,
  input: Destruction,
  clientPresent: boolean,
  day: PaperDay,
): void {
  const { approval } = list;
  if (list.status !== 'approved' || !approval) {
    throw new ConflictError(
      `Shred list ${list.number} is ${list.status}. Only an approved list can be carried out.`,
    );
  }
  if (input.on > day.today) {
    throw new InvalidInputError([
      {
        field: 'on',
        message: 'This day has not come yet. Record the destruction on the day it happened.',
      },
    ]);
  }
  if (input.on < approval.on) {
    throw new InvalidInputError([
      {
        field: 'on',
        message: `The list was approved on ${approval.on}; nothing was to be destroyed before.`,
      },
    ]);
  }
  if (input.on > approval.lapsesOn) {
    throw new ConflictError(
      `The approval lapsed after ${approval.lapsesOn}. Gather a new list and ask again.`,
    );
  }
  if (!clientPresent && input.on < approval.notBefore) {
    throw new ConflictError(
      `Wait until ${approval.notBefore}, or destroy the papers while the client is present and say so.`,
    );
  }
}

/** Every row that was approved has an outcome, and no other has. */
function requireOutcomes(rows: ShredRowRow[], input: Destruction): Map<string, Outcome> {
  const given = new Map(input.rows.map((row) => [row.paper, row.outcome]));
  const approved = rows.filter((row) => !row.keptBack).map((row) => row.paperId);
  const problems = [
    ...approved
      .filter((paper) => !given.has(paper))
      .map((paper) => `Say what became of paper ${paper}.`),
    ...[...given.keys()]
      .filter((paper) => !rows.some((row) => row.paperId === paper))
      .map((paper) => `Paper ${paper} is not on this list.`),
    ...rows
      .filter((row) => row.keptBack && (given.get(row.paperId) ?? 'kept-back') !== 'kept-back')
      .map((row) => `Paper ${row.paperId} was kept back at the approval and stays.`),
    ...(given.size < input.rows.length ? ['A paper is named twice. Give each one outcome.'] : []),
  ];
  if (problems.length > 0) {
    throw new InvalidInputError(problems.map((message) => ({ field: 'rows', message })));
  }
  return new Map(approved.map((paper) => [paper, given.get(paper) ?? 'kept-back']));
}

/** Fresh sums for the day of the act; answers the assessment of each paper that was destroyed. */
async function requireGateOpen(
  list: ShredListRow,
  papers: StoredPaper[],
  rows: ShredRowRow[],
  outcomes: Map<string, Outcome>,
  input: Destruction,
  day: PaperDay,
  transaction: Transaction,
): Promise<Map<string, Assessment>> {
  const assessments = new Map<string, Assessment>();
  const context = await loadAssessContext(list.householdId, day, transaction);
  const reasons: Reason[] = [];
  for (const paper of papers) {
    if (outcomes.get(paper.id) !== 'destroyed') continue;
    const answer = askGate(paper, context, { how: 'shred', on: input.on, today: day.today });
    const row = rows.find((r) => r.paperId === paper.id);
    reasons.push(...nameReasons(paper, [...answer.reasons, ...findChanges(row, paper)]));
    assessments.set(paper.id, answer.assessment);
  }
  if (reasons.length > 0) throw new GateClosedError(reasons);
  return assessments;
}

/**
 * Destroyed papers are left for good; a paper kept back is kept, in use; one that was not found is undecided,
 * so that somebody looks for it.
 */
async function writeOutcome(
  what: {
    list: ShredListRow;
    row: ShredRowRow;
    paper: StoredPaper;
    outcome: Outcome;
    boxCode: string | null;
  },
  input: Destruction,
  actor: Actor,
  day: PaperDay,
  transaction: Transaction,
): Promise<void> {
  const { list, row, paper, outcome, boxCode } = what;
  const snapshot: ShredRow = {
    ...describeRow({ ...row, outcome }, paper, boxCode),
    firstPageId: null,
    blocked: [],
  };
  await updateRow(list.id, paper.id, { outcome, snapshot }, transaction);
  const reviewed = { reviewedAt: day.now, reviewedBy: actor.user.id };
  const context = await loadAssessContext(
    list.householdId,
    { ...day, today: input.on },
    transaction,
  );
  const values: Partial<StoredPaper> =
    outcome === 'destroyed'
      ? { status: 'left', leftOn: input.on, ...assessPaper(paper, context) }
      : outcome === 'kept-back'
        ? {
            status: 'kept',
            pile: 'file-here',
            keptBecause: paper.keptBecause ?? 'use',
            ...reviewed,
          }
        : { status: 'undecided', pile: 'undecided', ...reviewed };
  await changePaper(paper.id, paper.version, values, transaction);
  const words = { destroyed: 'destroyed', 'kept-back': 'kept back', 'not-found': 'not found' }[
    outcome
  ];
  await record(list, actor, day, outcome, `paper ${paper.number} ${words}.`, transaction, paper.id);
}

/** Whether the witness is one of the household: by first and last name. */
async function isOfHousehold(witness: string, actor: Actor, day: PaperDay): Promise<boolean> {
  const household = await findHousehold(actor.householdId);
  const members = await listMembers(
    { id: actor.householdId, practiceId: actor.practiceId },
    day.today,
  );
  const names = [
    ...(household?.people ?? []).map((person) => person.name),
    ...members.filter((m) => m.membership.role === 'client').map((m) => m.user.name),
  ];
  const words = new Set(wordsOf(witness));
  return names.some((name) => {
    const parts = wordsOf(name);
    const first = parts[0];
    const last = parts.at(-1);
    return first !== undefined && last !== undefined && words.has(first) && words.has(last);
  });
}

const wordsOf = (name: string) => name.toLowerCase().match(/[\p{L}'-]+/gu) ?? [];
