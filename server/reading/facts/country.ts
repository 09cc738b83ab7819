/** Which country a paper's issuer belongs to, from what the paper shows. */
import { europeanSigns } from './country-signs-europe.ts';
import { overseasSigns } from './country-signs-overseas.ts';
import type { PaperLine } from './paper-lines.ts';

const signs = [...europeanSigns, ...overseasSigns];

/** Less than a hint, such as one spelling, names no country. */
const leastEvidence = 1;

export interface CountryFinding {
  country: string | null;
  /** Scores by country, for those who weigh doubts. */
  scores: Record<string, number>;
}

/**
 * The issuer's country, null when the paper does not show it. Every kind of sign counts little more when
 * it recurs, so a page full of one currency does not outvote an authority's name. The household's own
 * country tips the scales where the paper leaves a doubt; it never speaks alone.
 */
export function findCountry(
  lines: readonly PaperLine[],
  homeCountry: string | null = null,
): CountryFinding {
  const text = lines.map((line) => line.text).join('\n');
  const scores: Record<string, number> = {};
  for (const { country, weight, pattern } of signs) {
    const hits = [...text.matchAll(pattern)].length;
    if (hits === 0) continue;
    scores[country] = (scores[country] ?? 0) + weight * (hits > 1 ? 1.4 : 1);
  }
  const weigh = ([country, score]: [string, number]) => score + (country === homeCountry ? 1 : 0);
  const ranked = Object.entries(scores).sort((a, b) => weigh(b) - weigh(a));
  const [best, second] = ranked;
  if (!best || best[1] < leastEvidence) return { country: null, scores };
  if (second && weigh(best) < weigh(second) * 1.05) return { country: null, scores };
  return { country: best[0], scores };
}
