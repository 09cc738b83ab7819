/** Counting right answers, and how sure a share is. */
export interface Count {
  right: number;
  of: number;
}

/** Named counts; a name comes into being when something is first added to it. */
export class Tally {
  readonly counts = new Map<string, Count>();

  add(name: string, right: number, of: number): void {
    const count = this.counts.get(name) ?? { right: 0, of: 0 };
    this.counts.set(name, { right: count.right + right, of: count.of + of });
  }
}

/** 95 % interval of a share after Wilson (J. Am. Stat. Assoc. 22, 1927), as shares from 0 to 1. */
export function findInterval({ right, of }: Count): [low: number, high: number] {
  if (of === 0) return [0, 1];
  const z = 1.959964;
  const share = right / of;
  const spread = z * Math.sqrt((share * (1 - share)) / of + (z * z) / (4 * of * of));
  const middle = share + (z * z) / (2 * of);
  const scale = 1 + (z * z) / of;
  return [Math.max(0, (middle - spread) / scale), Math.min(1, (middle + spread) / scale)];
}

/** For example ` 97.8 %  n 230  (95.0 to 99.1)`. */
export function describeCount(count: Count): string {
  if (count.of === 0) return '   -    n 0';
  const [low, high] = findInterval(count);
  const percent = (share: number) => (share * 100).toFixed(1);
  return `${percent(count.right / count.of).padStart(5)} %  n ${String(count.of).padEnd(5)} (${percent(low)} to ${percent(high)})`;
}
