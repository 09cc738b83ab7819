/** Placing and lifting holds. */
import type { z } from 'zod';
import { classLabel } from '../../contract/document-classes.ts';
import type { Hold, placeHoldSchema } from '../../contract/holds.ts';
import { appendEvent, namesOf } from '../../db/repositories/event-repository.ts';
import {
  findHold,
  type HoldRow,
  insertHold,
  listHolds as listHoldRows,
  markLifted,
} from '../../db/repositories/hold-repository.ts';
import {
  findPaper,
  listPapersByIds,
  type StoredPaper,
} from '../../db/repositories/paper-repository.ts';
import { inTransaction } from '../../db/transaction.ts';
import { ConflictError, ForbiddenError, NotFoundError } from '../../errors.ts';
import { reassessHousehold, reassessPapers } from '../assess-paper.ts';
import { type Actor, canSee, requireReach, requireVisible } from '../papers/actor.ts';
import type { PaperDay } from '../papers/save-change.ts';
import { isLiftable } from './liftable.ts';

/** Holds that the actor may know of, those in force first. */
export async function listHolds(actor: Actor): Promise<{ items: Hold[]; total: number }> {
  const items = await viewHolds(await listHoldRows(actor.householdId), actor);
  return { items, total: items.length };
}

/** Places a hold on one paper, or on the whole household. */
export async function placeHold(
  input: z.infer<typeof placeHoldSchema>,
  actor: Actor,
  day: PaperDay,
): Promise<Hold> {
  const paper = input.paperId ? requireVisible(actor, await findPaper(input.paperId)) : null;
  if (paper) requireReach(actor, paper.classGroup, 'holding it');
  else if (actor.reach !== 'all') {
    throw new ForbiddenError(
      'You see some kinds of paper only, so you can hold single papers, not the whole household. Open the paper and hold it there.',
    );
  }
  if (paper?.status === 'left') {
    throw new ConflictError(`Paper ${paper.number} has left already; a hold would come too late.`);
  }
  const row = await inTransaction(async (transaction) => {
    const hold = await insertHold(
      {
        ...input,
        householdId: actor.householdId,
        placedOn: day.today,
        placedBy: actor.user.id,
        placedByRole: actor.membership.role,
        createdAt: day.now,
      },
      transaction,
    );
    await reassessCovered(hold, day, transaction);
    await appendEvent(
      {
        practiceId: actor.practiceId,
        householdId: actor.householdId,
        userId: actor.user.id,
        at: day.now,
        action: 'hold.placed',
        sentence: `${coverOf(paper)}: don't destroy yet.`,
        paperId: paper?.id ?? null,
        detail: { holdId: hold.id },
      },
      transaction,
    );
    return hold;
  });
  return requireOne(await viewHolds([row], actor));
}

/** Lifts a hold. @throws ForbiddenError when another side placed it */
export async function liftHold(
  id: string,
  reason: string,
  actor: Actor,
  day: PaperDay,
): Promise<Hold> {
  const before = await findHold(id);
  const [view] = before ? await viewHolds([before], actor) : [];
  if (!before || !view) throw new NotFoundError();
  if (before.liftedOn !== null) throw new ConflictError('This hold was lifted already.');
  if (!isLiftable(before, actor)) {
    throw new ForbiddenError(
      'This hold was placed by another side. They can lift it, or the owner of the practice with their recorded agreement.',
    );
  }
  const paper = before.paperId ? await findPaper(before.paperId) : null;
  await inTransaction(async (transaction) => {
    const isLifted = await markLifted(
      id,
      { liftedOn: day.today, liftedBy: actor.user.id, liftReason: reason },
      transaction,
    );
    if (!isLifted) throw new ConflictError('This hold was lifted already.');
    await reassessCovered(before, day, transaction);
    await appendEvent(
      {
        practiceId: actor.practiceId,
        householdId: actor.householdId,
        userId: actor.user.id,
        at: day.now,
        action: 'hold.lifted',
        sentence: `${coverOf(paper)}: the hold was lifted.`,
        paperId: paper?.id ?? null,
        detail: { holdId: id },
      },
      transaction,
    );
  });
  const after = await findHold(id);
  return requireOne(after ? await viewHolds([after], actor) : []);
}

async function reassessCovered(
  hold: Pick<HoldRow, 'householdId' | 'paperId'>,
  day: PaperDay,
  transaction: Parameters<typeof reassessHousehold>[2],
): Promise<void> {
  if (hold.paperId === null) await reassessHousehold(hold.householdId, day, transaction);
  else {
    await reassessPapers({ householdId: hold.householdId, ids: [hold.paperId] }, day, transaction);
  }
}

function coverOf(paper: Pick<StoredPaper, 'number'> | null): string {
  return paper ? `Paper ${paper.number}` : 'The whole household';
}

async function viewHolds(rows: HoldRow[], actor: Actor): Promise<Hold[]> {
  const papers = new Map(
    (await listPapersByIds(rows.flatMap((row) => row.paperId ?? []))).map((p) => [p.id, p]),
  );
  const names = await namesOf(rows.flatMap((row) => [row.placedBy, row.liftedBy]));
  return rows.flatMap((row): Hold[] => {
    const paper = row.paperId ? papers.get(row.paperId) : undefined;
    if (row.paperId && (!paper || !canSee(actor, paper))) return [];
    return [
      {
        id: row.id,
        householdId: row.householdId,
        scope: paper ? 'paper' : 'household',
        paperId: row.paperId,
        paperLabel: paper ? `Paper ${paper.number}, ${classLabel(paper.class)}` : null,
        kind: row.kind,
        reason: row.reason,
        placedOn: row.placedOn,
        placedByName: names.get(row.placedBy) ?? 'Somebody',
        reviewOn: row.reviewOn,
        liftedOn: row.liftedOn,
        liftedByName: row.liftedBy ? (names.get(row.liftedBy) ?? 'Somebody') : null,
        liftReason: row.liftReason,
        createdAt: row.createdAt.toISOString(),
        liftable: isLiftable(row, actor),
      },
    ];
  });
}

function requireOne(holds: Hold[]): Hold {
  const [hold] = holds;
  if (!hold) throw new NotFoundError();
  return hold;
}
