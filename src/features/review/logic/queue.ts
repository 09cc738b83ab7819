/** The order of work: which paper comes next, and how many are still to go. */

export interface QueueItem {
  id: string;
  number: number;
}

/** `first`: papers nobody has decided; `second`: those left undecided. */
export type Round = 'first' | 'second';

/** The round named in the address; anything else is the first. */
export function parseRound(text: string | null): Round {
  return text === 'second' ? 'second' : 'first';
}

/** The items that are still to be decided, in order of their number. */
export function listRemaining<T extends QueueItem>(
  items: readonly T[],
  settled: ReadonlySet<string>,
): T[] {
  return items.filter((item) => !settled.has(item.id)).sort((a, b) => a.number - b.number);
}

/**
 * The item after the given number, going round to the first at the end; null when none is left but
 * the one with this number.
 */
export function findNext<T extends QueueItem>(remaining: readonly T[], number: number): T | null {
  const others = remaining.filter((item) => item.number !== number);
  return others.find((item) => item.number > number) ?? others[0] ?? null;
}

/** The item before the given number, going round to the last. */
export function findPrevious<T extends QueueItem>(
  remaining: readonly T[],
  number: number,
): T | null {
  const others = remaining.filter((item) => item.number !== number);
  return others.findLast((item) => item.number < number) ?? others.at(-1) ?? null;
}

/** How many papers are still to go: the list's total without those decided here since it came. */
export function countToGo(
  items: readonly QueueItem[],
  total: number,
  settled: ReadonlySet<string>,
): number {
  return Math.max(0, total - items.filter((item) => settled.has(item.id)).length);
}

/** The count in words. */
export function describeToGo(toGo: number): string {
  if (toGo === 0) return 'None to go';
  return toGo === 1 ? 'The last one' : `${toGo} to go`;
}
