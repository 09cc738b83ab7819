/** An approval is given to papers as they stood on the list: what was changed since is not approved. */
import type { ShredRow } from '../../contract/shred-lists.ts';
import type { StoredPaper } from '../../db/repositories/paper-repository.ts';
import type { ShredRowRow } from '../../db/repositories/shred-list-repository.ts';

/** What the approver saw of the paper. */
const seen = ['class', 'title', 'issuer', 'paperOn', 'sheets'] as const satisfies (keyof ShredRow &
  keyof StoredPaper)[];

/** Why the approval does not cover the paper as it is now; empty when it does, or when there was none yet. */
export function findChanges(
  row: Pick<ShredRowRow, 'snapshot'> | undefined,
  paper: Pick<StoredPaper, (typeof seen)[number]>,
): { code: string; sentence: string }[] {
  const approved = row?.snapshot;
  if (!approved || seen.every((name) => approved[name] === paper[name])) return [];
  return [
    {
      code: 'changed',
      sentence:
        'It was changed after the approval: keep it back now and ask for approval on a new list.',
    },
  ];
}
