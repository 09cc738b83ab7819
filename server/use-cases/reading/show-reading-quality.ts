/** How well papers were read: the reader's opinion beside what people settled on. */
import type { ReadingQuality } from '../../contract/reading-quality.ts';
import {
  countReadingOutcomes,
  type ReadingOutcomeRow,
} from '../../db/repositories/reading-quality-repository.ts';

export async function showReadingQuality(practiceId: string): Promise<ReadingQuality> {
  return summariseOutcomes(await countReadingOutcomes(practiceId));
}

/** Sums the rows over all, by month (latest first) and by kind (most papers first). */
export function summariseOutcomes(rows: readonly ReadingOutcomeRow[]): ReadingQuality {
  const byMonth = groupBy(rows, (row) => row.month);
  const byClass = groupBy(rows, (row) => row.class);
  return {
    ...sum(rows),
    months: [...byMonth]
      .map(([month, group]) => ({ month, ...sum(group) }))
      .sort((a, b) => b.month.localeCompare(a.month)),
    classes: [...byClass]
      .map(([id, group]) => ({ class: id, ...sum(group), takenFor: listMistakes(group) }))
      .sort((a, b) => b.papers - a.papers || a.class.localeCompare(b.class)),
  };
}

function sum(rows: readonly ReadingOutcomeRow[]) {
  const total = (count: (row: ReadingOutcomeRow) => number) =>
    rows.reduce((sofar, row) => sofar + count(row), 0);
  return {
    papers: total((row) => row.papers),
    kindCorrected: total((row) => (row.readClass === row.class ? 0 : row.papers)),
    dateCorrected: total((row) => row.dateCorrected),
  };
}

function listMistakes(rows: readonly ReadingOutcomeRow[]) {
  const wrong = rows.filter((row) => row.readClass !== row.class);
  return [...groupBy(wrong, (row) => row.readClass)]
    .map(([id, group]) => ({ class: id, papers: sum(group).papers }))
    .sort((a, b) => b.papers - a.papers || a.class.localeCompare(b.class));
}

function groupBy<K>(
  rows: readonly ReadingOutcomeRow[],
  keyOf: (row: ReadingOutcomeRow) => K,
): Map<K, ReadingOutcomeRow[]> {
  const groups = new Map<K, ReadingOutcomeRow[]>();
  for (const row of rows) groups.set(keyOf(row), [...(groups.get(keyOf(row)) ?? []), row]);
  return groups;
}
