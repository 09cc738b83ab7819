/** Ranked classes of a paper, with the words that speak for them. */
import type { Candidate } from '../../contract/readings.ts';
import type { PaperLine } from '../facts/paper-lines.ts';
import { applyCues } from './cues.ts';
import type { PaperCues } from './cues.ts';
import { findTermHits } from './page-terms.ts';
import { scoreClasses } from './score-classes.ts';
import { loadVocabulary } from './vocabulary.ts';
import type { Vocabulary } from './vocabulary.ts';

/** Under this confidence the reader does not name a class. */
export const recognitionLine = 0.2;
/** How many points apart two classes are when one is e times as likely. */
const temperature = 1.7;
/** Points that half convince when there is no rival. */
const halfPoints = 3;

export interface Classification {
  candidates: Candidate[];
  class: Candidate['class'];
  confidence: number;
}

/** All classes that anything speaks for, likeliest first; `unrecognised` under the line. */
export function classifyPaper(
  lines: readonly PaperLine[],
  cues: PaperCues,
  vocabulary: Vocabulary = loadVocabulary(),
): Classification {
  const scores = applyCues(scoreClasses(findTermHits(lines, vocabulary), vocabulary), lines, cues);
  const best = scores[0];
  if (!best || best.points <= 0) return { candidates: [], class: 'unrecognised', confidence: 0 };
  const weights = scores.map((score) => Math.exp((score.points - best.points) / temperature));
  const sum = weights.reduce((total, weight) => total + weight, 0);
  const mass = 1 - 0.5 ** (best.points / halfPoints);
  const candidates = scores
    .map((score, index) => ({
      class: score.classId,
      confidence: Math.round(((weights[index] ?? 0) / sum) * mass * 1000) / 1000,
      evidence: score.evidence,
    }))
    .filter((candidate, index) => index === 0 || candidate.confidence >= 0.01)
    .slice(0, 8);
  const confidence = candidates[0]?.confidence ?? 0;
  const isSure = confidence >= recognitionLine;
  return { candidates, class: isSure ? best.classId : 'unrecognised', confidence };
}
