/** What became of each paper of a list, while the shredding goes on. */
import { rowOutcomes, type ShredRow } from '../../../../server/contract/shred-lists.ts';

export type Outcome = (typeof rowOutcomes)[number];
export type Outcomes = Readonly<Record<string, Outcome>>;

/** The rows to be carried out: those the client did not keep back. */
export function listToCarryOut(rows: readonly ShredRow[]): ShredRow[] {
  return rows.filter((row) => !row.keptBack);
}

/** The outcome of every row, as the record takes them; a row kept back at the approval stays kept back. */
export function buildOutcomeRows(
  rows: readonly ShredRow[],
  outcomes: Outcomes,
): { paper: string; outcome: Outcome }[] {
  return rows.flatMap((row) => {
    const outcome = row.keptBack ? 'kept-back' : outcomes[row.paper];
    return outcome ? [{ paper: row.paper, outcome }] : [];
  });
}

/** How many rows of each outcome there are, and how many have none yet. */
export function countOutcomes(
  rows: readonly ShredRow[],
  outcomes: Outcomes,
): Record<Outcome | 'none', number> {
  const counts = { destroyed: 0, 'kept-back': 0, 'not-found': 0, none: 0 };
  for (const row of listToCarryOut(rows)) counts[outcomes[row.paper] ?? 'none'] += 1;
  return counts;
}

/** Every row that may go and has no outcome yet counts as shredded; what was set by hand stays. */
export function fillWithDestroyed(rows: readonly ShredRow[], outcomes: Outcomes): Outcomes {
  const filled: Record<string, Outcome> = { ...outcomes };
  for (const row of listToCarryOut(rows)) {
    if (row.blocked.length === 0) filled[row.paper] ??= 'destroyed';
  }
  return filled;
}

/** Outcomes read back from the window's storage; what does not belong to the list is left out. */
export function parseOutcomes(text: string | null, rows: readonly ShredRow[]): Outcomes {
  try {
    const stored = JSON.parse(text ?? '{}') as Record<string, unknown>;
    const known: Record<string, Outcome> = {};
    for (const row of rows) {
      const outcome = rowOutcomes.find((name) => name === stored[row.paper]);
      if (outcome) known[row.paper] = outcome;
    }
    return known;
  } catch {
    return {};
  }
}
