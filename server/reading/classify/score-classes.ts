/** From the words found to points for each kind of paper. */
import type { ClassId } from '../../contract/document-classes.ts';
import type { TermHit } from './page-terms.ts';
import type { Tier, Vocabulary } from './vocabulary.ts';

interface TierWeight {
  inTitle: number;
  inText: number;
  /** All terms of the tier together count no more than this. */
  most: number;
}

/** Points by tier; set by hand, the longer a term the more it says. */
const tierWeights: Record<Tier, TierWeight> = {
  title: { inTitle: 5, inText: 1.5, most: 11 },
  strong: { inTitle: 2, inText: 1.7, most: 13 },
  clear: { inTitle: 0.7, inText: 0.6, most: 5 },
  weak: { inTitle: 0.3, inText: 0.3, most: 1 },
  against: { inTitle: -2.6, inText: -1.1, most: 8 },
};

export interface ClassScore {
  classId: ClassId;
  points: number;
  /** Terms that spoke for the class, weightiest first. */
  evidence: string[];
}

/** A term of two words or more names its class more surely than one word. */
function lengthFactor(words: number): number {
  return words === 1 ? 0.75 : words === 2 ? 1 : 1.15;
}

/** Points of every class that any term speaks for, highest first. */
export function scoreClasses(hits: readonly TermHit[], vocabulary: Vocabulary): ClassScore[] {
  const scores = vocabulary.classIds.map((classId) => scoreClass(classId, hits));
  return scores.sort((a, b) => b.points - a.points);
}

function scoreClass(classId: ClassId, hits: readonly TermHit[]): ClassScore {
  const sums: Record<Tier, number> = { title: 0, strong: 0, clear: 0, weak: 0, against: 0 };
  const spoke: { text: string; points: number }[] = [];
  const own = hits.filter((hit) => hit.term.classId === classId);
  for (const hit of own) {
    const weight = tierWeights[hit.term.tier];
    if (isPartOfLonger(hit, own)) continue;
    const points =
      (hit.inTitle ? weight.inTitle : weight.inText) *
      lengthFactor(hit.term.tokens.length) *
      (1 + 0.1 * (hit.count - 1));
    sums[hit.term.tier] += points;
    if (points > 0) spoke.push({ text: hit.term.text, points });
  }
  let points = 0;
  for (const [tier, weight] of Object.entries(tierWeights)) {
    const sum = sums[tier as Tier];
    points += Math.sign(sum) * Math.min(Math.abs(sum), weight.most);
  }
  spoke.sort((a, b) => b.points - a.points);
  return { classId, points, evidence: [...new Set(spoke.map((item) => item.text))].slice(0, 6) };
}

/** `bank statement` counts once, not again as `statement`, when both are terms of one tier. */
function isPartOfLonger(hit: TermHit, own: readonly TermHit[]): boolean {
  const glue = ` ${hit.term.tokens.join(' ')} `;
  return own.some(
    (other) =>
      other !== hit &&
      other.term.tier === hit.term.tier &&
      other.term.tokens.length > hit.term.tokens.length &&
      other.count >= hit.count &&
      ` ${other.term.tokens.join(' ')} `.includes(glue),
  );
}
