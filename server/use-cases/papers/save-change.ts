/** Writes one change of a paper: columns, sum, history and activity in one transaction. */
import { appendEvent } from '../../db/repositories/event-repository.ts';
import { insertPaperChange } from '../../db/repositories/paper-change-repository.ts';
import {
  changePaper,
  lockPaper,
  type StoredPaper,
} from '../../db/repositories/paper-repository.ts';
import { listLiveListsOf } from '../../db/repositories/shred-list-repository.ts';
import { inTransaction, type Transaction } from '../../db/transaction.ts';
import type { Deps } from '../../deps.ts';
import { ConflictError, StaleVersionError } from '../../errors.ts';
import { type AssessDay, assessPaper, loadAssessContext } from '../assess-paper.ts';
import { type Actor, requireVisible } from './actor.ts';
import { takeSnapshot } from './snapshot.ts';
import { getPaper } from './view-paper.ts';

export type PaperDeps = Pick<Deps, 'clock' | 'ruleSet'>;

export interface PaperDay extends AssessDay {
  now: Date;
}

/** A change as a person makes it: the new columns and a plain sentence for the record. */
export interface PaperChange {
  values: Partial<StoredPaper>;
  sentence: string;
  action: string;
  /** Taking a change back is on record, and is no step to take back itself. */
  isUndoing?: boolean;
}

/**
 * Locks a paper, checks the version, asks `decide` for the change and writes it.
 * @throws StaleVersionError with the paper as it stands, when somebody was faster
 */
export async function changeLocked(
  target: { id: string; version: number },
  actor: Actor,
  day: PaperDay,
  decide: (paper: StoredPaper, transaction: Transaction) => PaperChange | Promise<PaperChange>,
): Promise<void> {
  const isWritten = await inTransaction(async (transaction) => {
    const paper = requireVisible(actor, await lockPaper(target.id, transaction));
    if (paper.version !== target.version) return false;
    requireNotLeft(paper);
    const change = await decide(paper, transaction);
    await writeChange(paper, change, actor, day, transaction);
    return true;
  });
  if (!isWritten) throw new StaleVersionError(await getPaper(target.id, actor, day));
}

/** Writes a change of a locked paper with a fresh sum; what it was before stays for undoing. */
export async function writeChange(
  paper: StoredPaper,
  { values, sentence, action, isUndoing = false }: PaperChange,
  actor: Actor,
  day: PaperDay,
  transaction: Transaction,
  options: { before?: Record<string, unknown> } = {},
): Promise<void> {
  const context = await loadAssessContext(paper.householdId, day, transaction);
  const next = { ...paper, ...values };
  await changePaper(
    paper.id,
    paper.version,
    { ...values, ...assessPaper(next, context) },
    transaction,
  );
  await insertPaperChange(
    {
      householdId: paper.householdId,
      paperId: paper.id,
      version: paper.version + 1,
      before: options.before ?? takeSnapshot(paper),
      sentence,
      userId: actor.user.id,
      at: day.now,
      undone: isUndoing,
    },
    transaction,
  );
  await appendEvent(
    {
      practiceId: actor.practiceId,
      householdId: paper.householdId,
      userId: actor.user.id,
      at: day.now,
      action,
      sentence: `Paper ${paper.number}: ${sentence}`,
      paperId: paper.id,
    },
    transaction,
  );
}

/** @throws ConflictError when the paper has left: its record stays as it is */
export function requireNotLeft(paper: Pick<StoredPaper, 'status' | 'number'>): void {
  if (paper.status === 'left') {
    throw new ConflictError(
      `Paper ${paper.number} has left the household. Its record cannot be changed.`,
    );
  }
}

/** @throws ConflictError when the paper stands on a list that is approved */
export async function requireNotApproved(
  paper: StoredPaper,
  transaction: Transaction,
): Promise<void> {
  const list = (await listLiveListsOf([paper.id], transaction)).get(paper.id);
  if (list?.status === 'approved') {
    throw new ConflictError(
      `Paper ${paper.number} is on shred list ${list.number}, which is approved. Keep it back there first.`,
    );
  }
}
