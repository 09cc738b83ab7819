/** Sending, approving and giving up a shred list, and taking a row off. */
import type { z } from 'zod';
import {
  approvalDays,
  type approveShredListSchema,
  type ShredList,
} from '../../contract/shred-lists.ts';
import { appendEvent } from '../../db/repositories/event-repository.ts';
import {
  changePaper,
  listPapersByIds,
  lockPapers,
  type StoredPaper,
} from '../../db/repositories/paper-repository.ts';
import {
  listRows,
  lockShredList,
  removeRow,
  type ShredListRow,
  updateRow,
  updateShredList,
} from '../../db/repositories/shred-list-repository.ts';
import { inTransaction, type Transaction } from '../../db/transaction.ts';
import {
  ConflictError,
  ForbiddenError,
  GateClosedError,
  InvalidInputError,
  NotFoundError,
  StaleVersionError,
} from '../../errors.ts';
import { addDays } from '../../retention/dates.ts';
import { loadAssessContext } from '../assess-paper.ts';
import { type Actor, canSee, requireReach } from '../papers/actor.ts';
import { requireDelegateMay, requireMandate } from '../papers/depart-paper.ts';
import { askGate, nameReasons } from '../papers/gate-paper.ts';
import type { PaperDay } from '../papers/save-change.ts';
import { askForApproval, type ListMailDeps, tellOfApproval } from './list-mail.ts';
import { keepWhatWasSeen } from './keep-what-was-seen.ts';
import { getShredList } from './view-list.ts';

interface Target {
  id: string;
  version: number;
}

/**
 * Locks a list at the version that was seen and runs `work` on it.
 * @throws NotFoundError, StaleVersionError with the list as it stands
 */
async function changeList(
  target: Target,
  actor: Actor,
  day: PaperDay,
  work: (list: ShredListRow, transaction: Transaction) => Promise<void>,
): Promise<ShredList> {
  const isDone = await inTransaction(async (transaction) => {
    const list = await lockShredList(target.id, transaction);
    if (!list || list.householdId !== actor.householdId) throw new NotFoundError();
    if (list.version !== target.version) return false;
    await work(list, transaction);
    return true;
  });
  const current = await getShredList(target.id, actor, day);
  if (!isDone) throw new StaleVersionError(current);
  return current;
}

/** Takes a paper off a list that is not approved yet; the version rises. */
export function removeFromList(
  target: Target,
  paperId: string,
  actor: Actor,
  day: PaperDay,
): Promise<ShredList> {
  return changeList(target, actor, day, async (list, transaction) => {
    requireStatus(list, ['draft', 'sent'], 'Papers can be taken off only before the approval.');
    if (!(await removeRow(list.id, paperId, transaction))) {
      throw new NotFoundError('This paper is not on the list.');
    }
    await updateShredList(list.id, { version: list.version + 1 }, transaction);
    await record(list, actor, day, 'row-removed', 'took a paper off.', transaction, paperId);
  });
}

/** Sends the list to those who may approve it. */
export function sendShredList(
  target: Target,
  actor: Actor,
  day: PaperDay,
  deps: ListMailDeps,
): Promise<ShredList> {
  return changeList(target, actor, day, async (list, transaction) => {
    requireStatus(list, ['draft'], 'Only a draft can be sent.');
    const papers = await requireFilled(list, transaction);
    await updateShredList(list.id, { status: 'sent', sentAt: day.now }, transaction);
    await askForApproval(list, papers, actor, day, deps, transaction);
    await record(list, actor, day, 'sent', 'sent for approval.', transaction);
  });
}

/**
 * Approves this version of a list; rows in `keepBack` stay in the household. Every other row passes the gate
 * again. Somebody of the practice approves only on the client's recorded instruction, of which the client is told.
 */
export async function approveShredList(
  id: string,
  input: z.infer<typeof approveShredListSchema>,
  actor: Actor,
  day: PaperDay,
  deps: ListMailDeps,
): Promise<ShredList> {
  await requireMandate(actor, day);
  const isForClient = actor.membership.role !== 'client';
  if (isForClient && !input.instruction) {
    throw new InvalidInputError([
      {
        field: 'instruction',
        message:
          'The client approves. To approve for them, write down their instruction: how it was given, when, and its words.',
      },
    ]);
  }
  if (input.instruction && input.instruction.on > day.today) {
    throw new InvalidInputError([
      { field: 'instruction.on', message: 'The instruction cannot lie in the future.' },
    ]);
  }
  return changeList({ id, version: input.version }, actor, day, async (list, transaction) => {
    requireStatus(list, ['draft', 'sent'], 'This list is not waiting for an approval.');
    const rows = await listRows(list.id, transaction);
    const keepBack = new Set(input.keepBack);
    const unknown = input.keepBack.filter((paper) => !rows.some((row) => row.paperId === paper));
    if (unknown.length > 0) {
      throw new InvalidInputError(
        unknown.map((paper) => ({
          field: 'keepBack',
          message: `Paper ${paper} is not on this list.`,
        })),
      );
    }
    const papers = await lockPapers(
      rows.map((row) => row.paperId),
      transaction,
    );
    const leaving = papers.filter((paper) => !keepBack.has(paper.id));
    if (leaving.length === 0) {
      throw new ConflictError('Nothing is left to approve. Give the list up instead.');
    }
    for (const paper of leaving) requireMayApprove(actor, paper);
    await requireGateOpen(leaving, list, day, transaction);
    await keepWhatWasSeen(rows, leaving, list, transaction);
    for (const paper of papers.filter((p) => keepBack.has(p.id))) {
      await keepPaper(paper, list, actor, day, transaction);
    }
    const approval = {
      at: day.now.toISOString(),
      on: day.today,
      byName: actor.user.name,
      version: list.version,
      instruction: isForClient ? (input.instruction ?? null) : null,
      waitDays: input.waitDays,
      notBefore: addDays(day.today, input.waitDays),
      lapsesOn: addDays(day.today, approvalDays),
    };
    await updateShredList(
      list.id,
      {
        status: 'approved',
        sentAt: list.sentAt ?? day.now,
        approval,
        approvedBy: actor.user.id,
        approvedAt: day.now,
      },
      transaction,
    );
    if (isForClient) await tellOfApproval(list, approval, leaving, actor, day, deps, transaction);
    await record(
      list,
      actor,
      day,
      'approved',
      `approved version ${list.version}${isForClient ? " on the client's recorded instruction" : ''}; ${leaving.length} may go, ${keepBack.size} kept back.`,
      transaction,
    );
  });
}

/** Gives a list up; its papers stay where they were. */
export function voidShredList(
  target: Target,
  reason: string,
  actor: Actor,
  day: PaperDay,
): Promise<ShredList> {
  return changeList(target, actor, day, async (list, transaction) => {
    requireStatus(list, ['draft', 'sent', 'approved'], 'This list is finished already.');
    await updateShredList(
      list.id,
      { status: 'void', voidReason: reason, version: list.version + 1 },
      transaction,
    );
    await record(list, actor, day, 'voided', 'given up.', transaction);
  });
}

/** @throws ForbiddenError when the actor may not approve the destruction of this paper */
function requireMayApprove(actor: Actor, paper: StoredPaper): void {
  if (!canSee(actor, paper)) {
    throw new ForbiddenError(
      'There are papers on this list that you may not see. Somebody who sees all of them has to approve it.',
    );
  }
  requireReach(actor, paper.classGroup, 'approving its destruction');
  requireDelegateMay(actor, paper.class);
}

/** The gate, with a fresh sum for the list's day or today. @throws GateClosedError naming each paper */
async function requireGateOpen(
  papers: StoredPaper[],
  list: ShredListRow,
  day: PaperDay,
  transaction: Transaction,
): Promise<void> {
  const context = await loadAssessContext(list.householdId, day, transaction);
  const on = list.on > day.today ? list.on : day.today;
  const reasons = papers.flatMap((paper) =>
    nameReasons(paper, askGate(paper, context, { how: 'shred', on, today: null }).reasons),
  );
  if (reasons.length > 0) throw new GateClosedError(reasons);
}

/** A paper that somebody kept back stays: in use, so that nobody is reminded to shred it. */
async function keepPaper(
  paper: StoredPaper,
  list: ShredListRow,
  actor: Actor,
  day: PaperDay,
  transaction: Transaction,
): Promise<void> {
  await updateRow(
    list.id,
    paper.id,
    { keptBack: true, keptBackReason: `Kept back by ${actor.user.name}` },
    transaction,
  );
  await changePaper(
    paper.id,
    paper.version,
    {
      status: 'kept',
      pile: 'file-here',
      keptBecause: paper.keptBecause ?? 'use',
      reviewedAt: day.now,
      reviewedBy: actor.user.id,
    },
    transaction,
  );
  await record(
    list,
    actor,
    day,
    'kept-back',
    `paper ${paper.number} kept back.`,
    transaction,
    paper.id,
  );
}

async function requireFilled(list: ShredListRow, transaction: Transaction): Promise<StoredPaper[]> {
  const rows = await listRows(list.id, transaction);
  const papers = await listPapersByIds(
    rows.filter((row) => !row.keptBack).map((row) => row.paperId),
    transaction,
  );
  if (papers.length === 0) {
    throw new ConflictError('There is nothing on this list. Gather papers first.');
  }
  return papers;
}

function requireStatus(
  list: ShredListRow,
  allowed: ShredListRow['status'][],
  sentence: string,
): void {
  if (!allowed.includes(list.status)) {
    throw new ConflictError(`${sentence} Shred list ${list.number} is ${list.status}.`);
  }
}

/** One line of the activity record about a list. */
export async function record(
  list: Pick<ShredListRow, 'id' | 'number' | 'householdId'>,
  actor: Actor,
  day: PaperDay,
  action: string,
  sentence: string,
  transaction: Transaction,
  paperId: string | null = null,
): Promise<void> {
  await appendEvent(
    {
      practiceId: actor.practiceId,
      householdId: list.householdId,
      userId: actor.user.id,
      at: day.now,
      action: `shred-list.${action}`,
      sentence: `Shred list ${list.number}: ${sentence}`,
      shredListId: list.id,
      paperId,
    },
    transaction,
  );
}
