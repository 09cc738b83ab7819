/** Choosing what stays. */
import type { ShredRow } from '../../../../server/contract/shred-lists.ts';

/** Papers read back from the window's storage; anything unreadable counts as nothing chosen. */
export function parseKeepBack(text: string | null): ReadonlySet<string> {
  try {
    const stored: unknown = JSON.parse(text ?? '[]');
    if (!Array.isArray(stored)) return new Set();
    return new Set(stored.filter((entry): entry is string => typeof entry === 'string'));
  } catch {
    return new Set();
  }
}

/** The chosen papers that are still on the list: others would be refused. */
export function listKeptBack(rows: readonly ShredRow[], keepBack: ReadonlySet<string>): ShredRow[] {
  return rows.filter((row) => !row.keptBack && keepBack.has(row.paper));
}

/** Rows that would be refused now and that nobody keeps back. */
export function listBlocked(
  rows: readonly ShredRow[],
  keepBack: ReadonlySet<string> = new Set(),
): ShredRow[] {
  return rows.filter((row) => !row.keptBack && row.blocked.length > 0 && !keepBack.has(row.paper));
}
