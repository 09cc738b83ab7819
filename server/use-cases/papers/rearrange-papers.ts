/** Joining and splitting papers of one scan by hand; the parts are read and classed anew. */
import type { Paper } from '../../contract/papers.ts';
import { appendEvent } from '../../db/repositories/event-repository.ts';
import { findHousehold, takeNumbers } from '../../db/repositories/household-repository.ts';
import { type HoldRow, insertHold } from '../../db/repositories/hold-repository.ts';
import { insertPaperChange } from '../../db/repositories/paper-change-repository.ts';
import {
  assignPages,
  hasBlankBacks,
  listPagesOfPaper,
  listPaperIdsOfScan,
  type StoredPage,
} from '../../db/repositories/page-repository.ts';
import {
  changePaper,
  insertPaper,
  lockPaper,
  lockPapers,
  removePaper,
  repointPaper,
  type StoredPaper,
} from '../../db/repositories/paper-repository.ts';
import {
  isOnPastList,
  listLiveListsOf,
  removeRow,
} from '../../db/repositories/shred-list-repository.ts';
import { inTransaction, type Transaction } from '../../db/transaction.ts';
import { ConflictError, InvalidInputError, StaleVersionError } from '../../errors.ts';
import { readPaper } from '../../reading/papers.ts';
import {
  type AssessContext,
  assessPaper,
  holdsOfPaper,
  loadAssessContext,
  reassessPapers,
} from '../assess-paper.ts';
import { type Actor, requireReach, requireVisible } from './actor.ts';
import { columnsOfReading, countSheets, readingContextOf, toPageText } from './create-papers.ts';
import { type PaperDay, requireNotApproved, requireNotLeft } from './save-change.ts';
import { getPaper } from './view-paper.ts';

interface Target {
  id: string;
  version: number;
}

/** Splits a paper before one of its pages. @throws InvalidInputError when there is no such page */
export async function splitPaper(
  target: Target,
  beforePage: number,
  actor: Actor,
  day: PaperDay,
): Promise<{ first: Paper; second: Paper }> {
  const secondId = await inTransaction(async (transaction) => {
    const paper = requireVisible(actor, await lockPaper(target.id, transaction));
    if (paper.version !== target.version) return null;
    requireReach(actor, paper.classGroup, 'splitting it');
    requireNotLeft(paper);
    await requireNotApproved(paper, transaction);
    const pages = await listPagesOfPaper(paper.id, transaction);
    if (beforePage > pages.length) {
      throw new InvalidInputError([
        {
          field: 'beforePage',
          message: `The paper has ${pages.length} page(s). Choose a page from 2 on to split before.`,
        },
      ]);
    }
    const tools = await loadTools(paper, day, transaction);
    const holds = holdsOfPaper(paper.id, tools.context).filter(
      (hold) => hold.paperId !== null && hold.liftedOn === null,
    );
    const number = await takeNumbers(paper.householdId, 'nextPaperNumber', 1, transaction);
    const head = pages.slice(0, beforePage - 1);
    const tail = pages.slice(beforePage - 1);
    await changePaper(paper.id, paper.version, reread(paper.id, head, tools), transaction);
    const second = await insertPaper(
      {
        ...reread(null, tail, tools),
        householdId: paper.householdId,
        boxId: paper.boxId,
        scanId: paper.scanId,
        eyesOnlyUserId: paper.eyesOnlyUserId,
        number,
      },
      transaction,
    );
    await assignPages(paper.id, idsOf(head), transaction);
    await assignPages(second.id, idsOf(tail), transaction);
    await copyHolds(holds, second.id, day, transaction);
    await record(
      paper,
      `split before page ${beforePage}; the rest is paper ${number}.`,
      'paper.split',
      actor,
      day,
      transaction,
    );
    return second.id;
  });
  if (secondId === null) throw new StaleVersionError(await getPaper(target.id, actor, day));
  return {
    first: await getPaper(target.id, actor, day),
    second: await getPaper(secondId, actor, day),
  };
}

/** Joins a paper with its neighbour in the same scan; the one that comes first stays. */
export async function joinPaper(
  target: Target,
  otherId: string,
  actor: Actor,
  day: PaperDay,
): Promise<Paper> {
  const keptId = await inTransaction(async (transaction) => {
    const locked = await lockPapers([target.id, otherId], transaction);
    const paper = requireVisible(actor, locked.find((p) => p.id === target.id) ?? null);
    const other = requireVisible(actor, locked.find((p) => p.id === otherId) ?? null);
    if (paper.version !== target.version) return null;
    for (const part of [paper, other]) {
      requireReach(actor, part.classGroup, 'joining it');
      requireNotLeft(part);
      await requireNotApproved(part, transaction);
    }
    const [first, second] = await orderOf(paper, other, transaction);
    await takeOffLists(second, transaction);
    const pages = [
      ...(await listPagesOfPaper(first.id, transaction)),
      ...(await listPagesOfPaper(second.id, transaction)),
    ];
    await assignPages(first.id, idsOf(pages), transaction);
    await repointPaper(second.id, first.id, transaction);
    await removePaper(second.id, transaction);
    const tools = await loadTools(first, day, transaction);
    const values = {
      ...reread(first.id, pages, tools),
      eyesOnlyUserId: first.eyesOnlyUserId ?? second.eyesOnlyUserId,
    };
    await changePaper(first.id, first.version, values, transaction);
    await record(
      first,
      `joined with paper ${second.number}.`,
      'paper.joined',
      actor,
      day,
      transaction,
    );
    return first.id;
  });
  if (keptId === null) throw new StaleVersionError(await getPaper(target.id, actor, day));
  return getPaper(keptId, actor, day);
}

/** What was held stays held in both parts, with the reason, the placer and the day. */
async function copyHolds(
  holds: HoldRow[],
  paperId: string,
  day: PaperDay,
  transaction: Transaction,
): Promise<void> {
  const [first] = holds;
  if (!first) return;
  for (const { id: _id, ...hold } of holds) await insertHold({ ...hold, paperId }, transaction);
  await reassessPapers({ householdId: first.householdId, ids: [paperId] }, day, transaction);
}

/** @throws ConflictError unless the two follow each other in one scan */
async function orderOf(
  a: StoredPaper,
  b: StoredPaper,
  transaction: Transaction,
): Promise<[StoredPaper, StoredPaper]> {
  const ids = a.scanId ? await listPaperIdsOfScan(a.scanId, transaction) : [];
  const distance = ids.indexOf(b.id) - ids.indexOf(a.id);
  if (a.scanId === null || a.scanId !== b.scanId || Math.abs(distance) !== 1) {
    throw new ConflictError('Only papers that follow each other in the same scan can be joined.');
  }
  return distance === 1 ? [a, b] : [b, a];
}

/** @throws ConflictError when the paper stands on a list whose record must stay */
async function takeOffLists(paper: StoredPaper, transaction: Transaction): Promise<void> {
  if (await isOnPastList(paper.id, transaction)) {
    throw new ConflictError(
      `Paper ${paper.number} is on the record of a shred list. It stays by itself.`,
    );
  }
  const live = (await listLiveListsOf([paper.id], transaction)).get(paper.id);
  if (live) await removeRow(live.listId, paper.id, transaction);
}

interface Tools {
  context: AssessContext;
  reading: { country: string; businessNames: string[] };
  isDuplex: boolean;
}

async function loadTools(
  paper: StoredPaper,
  day: PaperDay,
  transaction: Transaction,
): Promise<Tools> {
  const household = await findHousehold(paper.householdId, transaction);
  return {
    context: await loadAssessContext(paper.householdId, day, transaction),
    reading: {
      country: household?.country ?? paper.country,
      businessNames: household?.businessNames ?? [],
    },
    isDuplex: paper.scanId ? await hasBlankBacks(paper.scanId, transaction) : false,
  };
}

/** The columns of a paper made of these pages: read anew, waiting for review. */
function reread(id: string | null, pages: StoredPage[], { context, reading, isDuplex }: Tools) {
  const texts = pages.map((page, index) => toPageText(page, index + 1));
  const columns = columnsOfReading(
    readPaper(texts, readingContextOf(reading)),
    pages,
    reading.country,
  );
  const blank = { subjectId: null, bundle: false, bundleFrom: null, bundleTo: null };
  return {
    ...columns,
    ...blank,
    ...assessPaper({ ...columns, ...blank, id, answers: {}, steppedDown: null }, context),
    answers: {},
    status: 'to-review' as const,
    pile: null,
    keptBecause: null,
    reviewedAt: null,
    reviewedBy: null,
    sheets: countSheets(pages.length, isDuplex),
  };
}

/** Moving pages cannot be taken back by a snapshot: the step is on record without one. */
async function record(
  paper: StoredPaper,
  sentence: string,
  action: string,
  actor: Actor,
  day: PaperDay,
  transaction: Transaction,
): Promise<void> {
  await insertPaperChange(
    {
      householdId: paper.householdId,
      paperId: paper.id,
      version: paper.version + 1,
      before: {},
      sentence,
      userId: actor.user.id,
      at: day.now,
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

const idsOf = (pages: StoredPage[]) => pages.map((page) => page.id);
