/** Gathering what may be shredded on a day, with what stays out and why. */
import type { IsoDate } from '../../contract/dates.ts';
import type { ShredList } from '../../contract/shred-lists.ts';
import { appendEvent } from '../../db/repositories/event-repository.ts';
import { takeNumbers } from '../../db/repositories/household-repository.ts';
import {
  listPapersByIds,
  listPapersInHouse,
  type StoredPaper,
} from '../../db/repositories/paper-repository.ts';
import { insertShredList, listLiveListsOf } from '../../db/repositories/shred-list-repository.ts';
import { inTransaction } from '../../db/transaction.ts';
import { InvalidInputError } from '../../errors.ts';
import { type AssessContext, assessOn, loadAssessContext } from '../assess-paper.ts';
import { type Actor, canSee } from '../papers/actor.ts';
import { askGate } from '../papers/gate-paper.ts';
import type { PaperDay } from '../papers/save-change.ts';
import { getShredList } from './view-list.ts';

type LeftOut = ShredList['leftOut'][number];

/**
 * Makes a draft of every paper that is decided for shredding and eligible on the day, or of those among `papers`.
 * What stays out is named with its reasons.
 */
export async function createShredList(
  input: { on: IsoDate; papers?: string[] | undefined },
  actor: Actor,
  day: PaperDay,
): Promise<ShredList> {
  const id = await inTransaction(async (transaction) => {
    // The number comes first: taking it locks the household, so that a paper lands on one live list only.
    const number = await takeNumbers(actor.householdId, 'nextListNumber', 1, transaction);
    const context = await loadAssessContext(actor.householdId, day, transaction);
    const candidates = input.papers
      ? await requirePapers(input.papers, actor)
      : await listCandidates(actor, context, input.on);
    const live = await listLiveListsOf(
      candidates.map((paper) => paper.id),
      transaction,
    );
    const rows: string[] = [];
    const leftOut: LeftOut[] = [];
    for (const paper of candidates) {
      const reasons = findReasons(paper, context, input.on, live.get(paper.id)?.number ?? null);
      if (reasons.length === 0) rows.push(paper.id);
      else {
        leftOut.push({
          paper: paper.id,
          paperNumber: paper.number,
          class: paper.class,
          issuer: paper.issuer,
          reasons,
        });
      }
    }
    const list = await insertShredList(
      {
        householdId: actor.householdId,
        number,
        on: input.on,
        leftOut,
        createdBy: actor.user.id,
        createdAt: day.now,
      },
      rows,
      transaction,
    );
    await appendEvent(
      {
        practiceId: actor.practiceId,
        householdId: actor.householdId,
        userId: actor.user.id,
        at: day.now,
        action: 'shred-list.created',
        sentence: `Gathered shred list ${number}: ${rows.length} on it, ${leftOut.length} left out.`,
        shredListId: list.id,
      },
      transaction,
    );
    return list.id;
  });
  return getShredList(id, actor, day);
}

/** Papers on the shred pile, and papers kept by duty alone whose time is up. */
async function listCandidates(
  actor: Actor,
  context: AssessContext,
  on: IsoDate,
): Promise<StoredPaper[]> {
  const shredding = await listPapersInHouse(actor.householdId, { pile: 'shred' });
  const kept = await listPapersInHouse(actor.householdId, { status: 'kept' });
  const overdue = kept.filter((paper) => {
    if (paper.keptBecause === 'use' || paper.keptBecause === 'dear') return false;
    const { shredFrom, open, permanent, advisedUntil } = assessOn(paper, context, on);
    if (open || permanent || shredFrom === null || shredFrom > on) return false;
    return advisedUntil === null || advisedUntil < on;
  });
  return [...shredding, ...overdue].filter((paper) => canSee(actor, paper));
}

function findReasons(
  paper: StoredPaper,
  context: AssessContext,
  on: IsoDate,
  liveListNumber: number | null,
): LeftOut['reasons'] {
  if (liveListNumber !== null) {
    return [{ code: 'on-list', sentence: `It is on shred list ${liveListNumber} already.` }];
  }
  if (paper.status === 'kept') {
    return [
      {
        code: 'kept',
        sentence: 'Its time is up, but it is kept: choose Shred for it on the review desk.',
      },
    ];
  }
  return askGate(paper, context, { how: 'shred', on, today: null }).reasons;
}

async function requirePapers(ids: string[], actor: Actor): Promise<StoredPaper[]> {
  const papers = await listPapersByIds([...new Set(ids)]);
  const known = papers.filter(
    (paper) => paper.householdId === actor.householdId && canSee(actor, paper),
  );
  const missing = ids.filter((id) => !known.some((paper) => paper.id === id));
  if (missing.length > 0) {
    throw new InvalidInputError(
      missing.map((id) => ({ field: 'papers', message: `The household has no paper ${id}.` })),
    );
  }
  return known;
}
