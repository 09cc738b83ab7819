/** Two people changed the same record: what each of them changed, and one record made of both. */

export interface MergedEdits<T> {
  /** Fields that both changed, to different values. */
  clashes: (keyof T)[];
  /** Mine where I changed something, theirs elsewhere. */
  withMine: T;
  /** Theirs where both changed something; my other changes stay. */
  withTheirs: T;
}

function isSame(a: unknown, b: unknown): boolean {
  return JSON.stringify(a) === JSON.stringify(b);
}

/** Merges my edits and somebody else's, both made on the same base. */
export function mergeEdits<T extends object>(base: T, mine: T, theirs: T): MergedEdits<T> {
  const withMine = { ...theirs };
  const withTheirs = { ...theirs };
  const clashes: (keyof T)[] = [];
  for (const key of Object.keys(base) as (keyof T)[]) {
    if (isSame(base[key], mine[key])) continue;
    withMine[key] = mine[key];
    const theyChangedIt = !isSame(base[key], theirs[key]);
    if (!theyChangedIt) withTheirs[key] = mine[key];
    else if (!isSame(mine[key], theirs[key])) clashes.push(key);
  }
  return { clashes, withMine, withTheirs };
}

/** The fields of `mine` that differ from the base. */
export function pickChanges<T extends object>(base: T, mine: T): Partial<T> {
  const changes: Partial<T> = {};
  for (const key of Object.keys(base) as (keyof T)[]) {
    if (!isSame(base[key], mine[key])) changes[key] = mine[key];
  }
  return changes;
}
