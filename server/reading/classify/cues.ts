/** What a paper shows beside its vocabulary: a machine-readable zone, hardly any words, who writes to whom. */
import type { ClassId } from '../../contract/document-classes.ts';
import type { Mrz } from '../../contract/readings.ts';
import type { PaperLine } from '../facts/paper-lines.ts';
import type { ClassScore } from './score-classes.ts';

export interface PaperCues {
  mrz: Mrz | null;
  /** The issuer is one of the household's own businesses. */
  isOwnBusiness: boolean;
  /** The addressee is a trade or firm. */
  isToBusiness: boolean;
}

const postal =
  /\b[A-Z]{1,2}\d[A-Z\d]?\s?\d[A-Z]{2}\b|\b[A-Z]{2}\.?\s\d{5}(?:-\d{4})?\b|\b[A-Z]\d[A-Z]\s?\d[A-Z]\d\b|\b(?:NSW|VIC|QLD|SA|WA|TAS|ACT|NT)\s\d{4}\b|\b\d{5}\s[A-ZÄÖÜ][a-z]/;

/** Sixteen figures in fours, as they are raised on cards. */
const cardNumber = /\b\d{4}[ -]\d{4}[ -]\d{4}[ -]\d{4}\b/;

/** The scores with what the cues add, highest first again. */
export function applyCues(
  scores: readonly ClassScore[],
  lines: readonly PaperLine[],
  cues: PaperCues,
): ClassScore[] {
  const extra = new Map<ClassId, { points: number; evidence: string }>();
  const add = (classId: ClassId, points: number, evidence: string): void => {
    const old = extra.get(classId);
    extra.set(classId, {
      points: (old?.points ?? 0) + points,
      evidence: old?.evidence ?? evidence,
    });
  };
  if (cues.mrz) {
    const code = cues.mrz.lines[0]?.[0];
    if (code === 'P') add('passport', 12, 'machine-readable zone');
    else if (code === 'V') add('immigration-paper', 8, 'machine-readable zone');
    else add('immigration-paper', 4, 'machine-readable zone');
  }
  if (cues.isOwnBusiness) {
    add('sales-invoice', 6, 'issued by the own business');
    add('supplier-invoice', -4, '');
  } else if (cues.isToBusiness) {
    add('supplier-invoice', 3, 'addressed to a business');
    add('sales-invoice', -2, '');
  }
  const text = lines.map((line) => line.text).join('\n');
  const words = lines.reduce((sum, line) => sum + line.words.length, 0);
  if (words <= 45 && postal.test(text) && !/dear|total|£\s?\d|\$\s?\d|certif/i.test(text)) {
    add('envelope', words <= 30 ? 4 : 2.5, 'little but an address');
  }
  if (words <= 60 && cardNumber.test(text) && /valid|expires|thru|member since/i.test(text)) {
    add('payment-card', 5, 'a card number and its dates');
  }
  return scores
    .map((score) => {
      const more = extra.get(score.classId);
      if (!more) return score;
      const evidence =
        more.points > 0 && more.evidence ? [more.evidence, ...score.evidence] : score.evidence;
      return { ...score, points: score.points + more.points, evidence };
    })
    .sort((a, b) => b.points - a.points);
}
