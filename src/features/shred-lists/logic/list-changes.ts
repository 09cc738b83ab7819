/** What became different in a list between the moment a person looked at it and now. */
import type { ShredList, ShredRow } from '../../../../server/contract/shred-lists.ts';
import { describeRow, statusWords } from './words.ts';

const nameRow = (row: ShredRow): string => `paper ${row.paperNumber} (${describeRow(row)})`;

/** One sentence for each difference that matters to consent; none when there is none. */
export function describeChanges(seen: ShredList, now: ShredList): string[] {
  const before = new Map(seen.rows.map((row) => [row.paper, row]));
  const after = new Set(now.rows.map((row) => row.paper));
  const sentences: string[] = [];
  if (seen.status !== now.status && !(seen.status === 'draft' && now.status === 'sent')) {
    const who = now.status === 'approved' && now.approval ? ` by ${now.approval.byName}` : '';
    sentences.push(`The list is now “${statusWords[now.status]}”${who}.`);
  }
  for (const row of seen.rows) {
    if (!after.has(row.paper)) sentences.push(`Taken off: ${nameRow(row)}.`);
  }
  for (const row of now.rows) {
    const old = before.get(row.paper);
    if (!old) sentences.push(`Added: ${nameRow(row)}.`);
    else if (row.blocked.length > 0 && old.blocked.length === 0) {
      sentences.push(`May not go any more: ${nameRow(row)}.`);
    }
  }
  if (sentences.length === 0 && seen.version !== now.version) {
    sentences.push('Somebody saved the list again; the papers on it are the same.');
  }
  return sentences;
}
