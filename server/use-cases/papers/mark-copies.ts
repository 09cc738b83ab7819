/** Marks new papers that are likely copies of a paper that is there already, for a person to look at. */
import { listLegibility } from '../../db/repositories/page-repository.ts';
import {
  listPossibleCopies,
  setLikelyCopies,
  type StoredPaper,
} from '../../db/repositories/paper-repository.ts';
import type { Transaction } from '../../db/transaction.ts';
import { findDuplicates, type ComparedPaper } from '../../reading/duplicates.ts';

/** With so many papers of the same kinds or references a new one is compared at most. */
const mostCompared = 400;

/**
 * Compares new papers with those of the household and among themselves. The less legible copy is marked as
 * the copy of the other, unless a person has decided about it already: then the new one is marked.
 */
export async function markLikelyCopies(
  householdId: string,
  newIds: readonly string[],
  newPapers: readonly Pick<StoredPaper, 'class' | 'reference'>[],
  transaction: Transaction,
): Promise<void> {
  const stored = await listPossibleCopies(
    householdId,
    {
      classes: [...new Set(newPapers.map((paper) => paper.class))],
      references: newPapers.flatMap((paper) => (paper.reference ? [paper.reference] : [])),
    },
    mostCompared,
    transaction,
  );
  const legibility = await listLegibility(
    stored.map((paper) => paper.id),
    transaction,
  );
  const oldestFirst = [...stored].reverse();
  const byId = new Map(stored.map((paper) => [paper.id, paper]));
  const isNew = new Set(newIds);
  const marked = new Map<string, string>();
  const pairs = findDuplicates(
    oldestFirst.map((paper) => toCompared(paper, legibility.get(paper.id) ?? 0)),
  );
  for (const { better, other } of pairs) {
    if (!isNew.has(better) && !isNew.has(other)) continue;
    const worse = byId.get(other);
    const isDecided = worse !== undefined && worse.status !== 'to-review' && !isNew.has(other);
    const [copy, of] = isDecided ? [better, other] : [other, better];
    if (marked.has(copy) || marked.get(of) === copy || byId.get(copy)?.likelyCopyOf) continue;
    marked.set(copy, of);
  }
  await setLikelyCopies(
    [...marked].map(([id, likelyCopyOf]) => ({ id, likelyCopyOf })),
    transaction,
  );
}

function toCompared(paper: StoredPaper, legibility: number): ComparedPaper {
  const { id, text, keyDate, reference, facts } = paper;
  return {
    id,
    text,
    keyDate,
    reference,
    dates: Object.values(facts.dates).flatMap((date) => (date ? [date.value] : [])),
    legibility,
  };
}
