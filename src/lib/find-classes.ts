import { classGroupLabels, documentClasses } from '../../server/contract/document-classes.ts';
import type { ClassId, DocumentClass } from '../../server/contract/document-classes.ts';

function simplify(text: string): string {
  return text.normalize('NFD').replace(/\p{M}/gu, '').toLowerCase();
}

/** How well a kind of paper fits the words typed: 0 not at all, more is better. */
function scoreClass(candidate: DocumentClass, words: readonly string[]): number {
  const label = simplify(candidate.label);
  const rest = simplify(`${candidate.covers} ${classGroupLabels[candidate.group]} ${candidate.id}`);
  let score = 0;
  for (const word of words) {
    if (label.startsWith(word)) score += 8;
    else if (label.includes(` ${word}`)) score += 6;
    else if (label.includes(word)) score += 4;
    else if (rest.includes(word)) score += 1;
    else return 0;
  }
  return score;
}

/**
 * Kinds of paper that have all the words typed, best first; without words all of them, the suggested
 * ones first.
 */
export function findClasses(typed: string, suggested: readonly ClassId[] = []): DocumentClass[] {
  const words = simplify(typed).split(/\s+/).filter(Boolean);
  const all: readonly DocumentClass[] = documentClasses;
  const rank = (c: DocumentClass): number => {
    const place = suggested.indexOf(c.id as ClassId);
    return place === -1 ? suggested.length : place;
  };
  if (words.length === 0) return [...all].sort((a, b) => rank(a) - rank(b));
  return all
    .map((c) => ({ c, score: scoreClass(c, words) }))
    .filter((entry) => entry.score > 0)
    .sort((a, b) => b.score - a.score || rank(a.c) - rank(b.c))
    .map((entry) => entry.c);
}
