/** Which papers were found to be copies of each other, beside which are. */
import { findDuplicates, type ComparedPaper } from '../../reading/duplicates.ts';
import type { PageText, PaperReading } from '../../reading/types.ts';

/** The papers of all households as they were read, and what the truth says of copies. */
export interface DuplicateCheck {
  households: Map<string, ComparedPaper[]>;
  /** `duplicateOf` of the truth: from paper to paper. */
  links: [string, string][];
}

export function startDuplicateCheck(): DuplicateCheck {
  return { households: new Map(), links: [] };
}

/** Adds one paper; `name` is its file, with `#page` where it lies in a pile. */
export function addPaper(
  check: DuplicateCheck,
  name: string,
  household: string,
  pages: readonly PageText[],
  reading: PaperReading | null,
  duplicateOf: string | null | undefined,
): void {
  if (duplicateOf) check.links.push([name, duplicateOf]);
  const printed = pages.filter((page) => !page.blank);
  const list = check.households.get(household) ?? [];
  check.households.set(household, list);
  list.push({
    id: name,
    text: pages.map((page) => page.text).join('\n'),
    keyDate: reading?.facts.keyDate ?? null,
    dates: Object.values(reading?.facts.dates ?? {}).flatMap((date) => (date ? [date.value] : [])),
    reference: reading?.facts.reference?.value ?? null,
    legibility: printed.some((page) => page.source === 'text-layer')
      ? 1
      : printed.reduce((sum, page) => sum + page.confidence, 0) / Math.max(1, printed.length),
  });
}

export interface DuplicateScore {
  /** Links of the truth that were found, of those whose two papers were read. */
  right: number;
  wanted: number;
  /** Pairs that are no copies, and links that were missed, by name. */
  falsePairs: string[];
  missed: string[];
}

/** Copies of one paper are copies of each other. */
function groupCopies(links: readonly [string, string][]): Map<string, number> {
  const groups = new Map<string, number>();
  links.forEach(([from, to], index) => {
    const known = [groups.get(from), groups.get(to)];
    const group = known[0] ?? known[1] ?? index;
    for (const [name, own] of groups) if (known.includes(own)) groups.set(name, group);
    groups.set(from, group);
    groups.set(to, group);
  });
  return groups;
}

/** Compares what was found with the truth. */
export function scoreDuplicates(check: DuplicateCheck): DuplicateScore {
  const groups = groupCopies(check.links);
  const pairs = [...check.households.values()].flatMap((papers) => findDuplicates(papers));
  const read = new Set([...check.households.values()].flat().map((paper) => paper.id));
  const found = new Set(
    pairs.flatMap(({ better, other }) => [`${better}=${other}`, `${other}=${better}`]),
  );
  const links = check.links.filter(([from, to]) => read.has(from) && read.has(to));
  const missed = links.filter(([from, to]) => !found.has(`${from}=${to}`));
  const falsePairs = pairs.filter(({ better, other }) => {
    const group = groups.get(better);
    return group === undefined || group !== groups.get(other);
  });
  return {
    right: links.length - missed.length,
    wanted: links.length,
    falsePairs: falsePairs.map(({ better, other }) => `${better} and ${other}`),
    missed: missed.map(([from, to]) => `${from} and ${to}`),
  };
}
