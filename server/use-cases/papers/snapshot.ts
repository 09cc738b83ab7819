/** What a paper was before a change: the columns that people edit. */
import type { PaperChangeRow } from '../../db/repositories/paper-change-repository.ts';
import type { StoredPaper } from '../../db/repositories/paper-repository.ts';

const editableColumns = [
  'status',
  'class',
  'confidence',
  'country',
  'title',
  'facts',
  'answers',
  'pile',
  'keptBecause',
  'place',
  'note',
  'practiceNote',
  'subjectId',
  'sheets',
  'steppedDown',
  'reviewedAt',
  'reviewedBy',
] as const satisfies readonly (keyof StoredPaper)[];
export type EditableColumns = Pick<StoredPaper, (typeof editableColumns)[number]>;

/** The editable columns as JSON. */
export function takeSnapshot(paper: StoredPaper): Record<string, unknown> {
  const picked = editableColumns.map((name) => [name, paper[name]]);
  return JSON.parse(JSON.stringify(Object.fromEntries(picked))) as Record<string, unknown>;
}

/** Whether a change can be taken back: pages that moved (split, join) carry no snapshot. */
export function canTakeBack(change: PaperChangeRow | null): change is PaperChangeRow {
  return change !== null && Object.keys(change.before).length > 0;
}

/** The columns as they were; written by `takeSnapshot`, so they are trusted. */
export function restoreSnapshot(before: Record<string, unknown>): Partial<EditableColumns> {
  const known = Object.fromEntries(
    Object.entries(before).filter(([name]) =>
      (editableColumns as readonly string[]).includes(name),
    ),
  ) as Partial<EditableColumns>;
  const { reviewedAt } = known;
  return reviewedAt ? { ...known, reviewedAt: new Date(reviewedAt) } : known;
}
