/**
 * Works out the sums of whole households anew after the rules have changed. Papers are taken some hundreds at a
 * time, each lot in a transaction of its own: memory stays flat, others are served between, and what was done
 * stays done when the work is interrupted.
 */
import {
  countPapersInHouse,
  lockNextPapers,
  type MovedColumns,
  saveMovedColumns,
} from '../db/repositories/reassessment-repository.ts';
import { inTransaction } from '../db/transaction.ts';
import { type AssessDay, assessPaper, loadAssessContext } from './assess-paper.ts';

export interface ReassessProgress {
  done: number;
  total: number;
}

export interface ReassessOptions {
  /** Papers in one transaction. */
  lot?: number;
  /** Households that are worked on at the same time. */
  lanes?: number;
  onProgress?: (progress: ReassessProgress) => void;
}

type FindDay = (householdId: string) => AssessDay | Promise<AssessDay>;

/** Assesses every paper of the households that has not left. Answers how many there were. */
export async function reassessAll(
  householdIds: readonly string[],
  findDay: FindDay,
  { lot = 500, lanes = 2, onProgress }: ReassessOptions = {},
): Promise<number> {
  const progress: ReassessProgress = { done: 0, total: await countPapersInHouse(householdIds) };
  const waiting = [...householdIds];
  const work = async (): Promise<void> => {
    for (let id = waiting.shift(); id !== undefined; id = waiting.shift()) {
      const day = await findDay(id);
      let last: string | null = null;
      do {
        const done = await reassessLot(id, last, day, lot);
        ({ last } = done);
        progress.done += done.count;
        if (done.count > 0) onProgress?.({ ...progress });
      } while (last !== null);
    }
  };
  await Promise.all(Array.from({ length: lanes }, work));
  return progress.done;
}

/** One lot; `last` is null when it was the household's last. */
function reassessLot(
  householdId: string,
  after: string | null,
  day: AssessDay,
  limit: number,
): Promise<{ count: number; last: string | null }> {
  return inTransaction(async (transaction) => {
    const papers = await lockNextPapers(householdId, after, limit, transaction);
    if (papers.length === 0) return { count: 0, last: null };
    // Read anew for each lot: somebody may have placed a hold since the last one.
    const context = await loadAssessContext(householdId, day, transaction);
    const rows = papers.map((paper) => ({
      id: paper.id,
      ...pickMoved(assessPaper(paper, context)),
    }));
    await saveMovedColumns(rows, transaction);
    return {
      count: papers.length,
      last: papers.length < limit ? null : (papers.at(-1)?.id ?? null),
    };
  });
}

function pickMoved(columns: MovedColumns): MovedColumns {
  return {
    assessment: columns.assessment,
    keepUntil: columns.keepUntil,
    shredFrom: columns.shredFrom,
    advisedUntil: columns.advisedUntil,
    permanent: columns.permanent,
    open: columns.open,
    held: columns.held,
    rule: columns.rule,
    securityLevel: columns.securityLevel,
    ruleSetVersion: columns.ruleSetVersion,
    assessedOn: columns.assessedOn,
    steppedDown: columns.steppedDown,
  };
}
