/** Plain words for what the reader and the rules say. */
import type { AppliedRule } from '../../../../server/contract/assessments.ts';
import type { Paper } from '../../../../server/contract/papers.ts';
import type { DateRole } from '../../../../server/contract/readings.ts';
import { countDaysBetween } from '../../../lib/format.ts';

/** How sure the reader is, from 0 to 1; null when a person has set the kind. */
export function describeConfidence(confidence: number | null): string {
  if (confidence === null) return 'set by a person';
  if (confidence >= 0.9) return 'very sure';
  if (confidence >= 0.7) return 'fairly sure';
  if (confidence >= 0.45) return 'not sure';
  return 'only a guess';
}

export const basisWords: Record<AppliedRule['basis'], string> = {
  law: 'Set by law',
  guidance: 'Official guidance',
  practice: 'Common practice',
};

export const dateRoleLabels: Record<DateRole, string> = {
  issued: 'Date on the paper',
  due: 'Due',
  periodStart: 'Period from',
  periodEnd: 'Period to',
  expiry: 'Runs out',
  eventDate: 'Day it is about',
};

export const keptBecauseLabels = {
  duty: 'Duty',
  use: 'Use',
  dear: 'Dear',
} as const;
export const keptBecauseHints = {
  duty: 'a law, the tax office or a contract asks for it',
  use: 'somebody will need it',
  dear: 'somebody holds it dear',
} as const;

export type VerdictTone = 'held' | 'permanent' | 'open' | 'keep' | 'soon' | 'free';

export interface Verdict {
  tone: VerdictTone;
  /** One line, without the day. */
  headline: string;
  /** The day that the headline speaks of. */
  on: string | null;
}

const soonDays = 90;

/**
 * The one line that says what stands: a hold before all, then for good, open, a date, or free. A longer
 * advised time counts unless somebody with the right stepped down from it.
 */
export function decideVerdict(
  {
    assessment,
    steppedDown,
    expiresOn,
  }: Pick<Paper, 'assessment' | 'steppedDown'> & { expiresOn?: string | null },
  today: string,
): Verdict {
  if (assessment.heldBy.length > 0)
    return { tone: 'held', headline: 'Don’t destroy yet', on: null };
  if (assessment.permanent) return { tone: 'permanent', headline: 'Keep for good', on: null };
  if (assessment.open) {
    if (!expiresOn) return { tone: 'open', headline: 'No date yet', on: null };
    const headline = expiresOn < today ? 'No date yet; ran out on' : 'No date yet; valid until';
    return { tone: 'open', headline, on: expiresOn };
  }
  const { keepUntil } = assessment;
  const advisedUntil = steppedDown ? null : assessment.advisedUntil;
  if (keepUntil !== null && keepUntil >= today) {
    const isSoon = countDaysBetween(today, advisedUntil ?? keepUntil) <= soonDays;
    return { tone: isSoon ? 'soon' : 'keep', headline: 'Keep until', on: keepUntil };
  }
  if (advisedUntil !== null && advisedUntil >= today) {
    return { tone: 'keep', headline: 'Better kept until', on: advisedUntil };
  }
  return keepUntil === null
    ? { tone: 'free', headline: 'Need not be kept', on: null }
    : { tone: 'free', headline: 'Had to be kept until', on: keepUntil };
}

/** A sentence under the headline. */
export interface VerdictLine {
  text: string;
  tone: 'plain' | 'hold' | 'soft';
}

/** What follows from the verdict, one sentence each; `formatDay` turns an ISO day into text. */
export function listVerdictLines(
  { assessment, steppedDown }: Pick<Paper, 'assessment' | 'steppedDown'>,
  formatDay: (day: string) => string,
): VerdictLine[] {
  const lines: VerdictLine[] = [];
  const say = (text: string, tone: VerdictLine['tone'] = 'plain') => lines.push({ text, tone });
  const a = assessment;
  for (const hold of a.heldBy) say(`${hold.reason ?? 'Somebody asked for it'}.`, 'hold');
  if (a.heldBy.length > 0 && a.scheduledUntil) {
    say(`Without this it would be kept until ${formatDay(a.scheduledUntil)}.`, 'soft');
  }
  if (a.open) say(a.openBecause ?? 'No rule known here: ask the adviser.');
  if (a.provisional) {
    say(
      `It would be ${formatDay(a.provisional.keepUntil)}, assuming ${a.provisional.assuming}.`,
      'soft',
    );
  }
  if (a.shredFrom && !a.permanent && !a.open && a.heldBy.length === 0) {
    say(`May be shredded from ${formatDay(a.shredFrom)}.`);
  }
  if (a.advisedUntil && !steppedDown) {
    const why = a.advisedBecause ? `: ${a.advisedBecause}` : '.';
    say(`Better kept until ${formatDay(a.advisedUntil)}${why}`);
  }
  if (steppedDown) {
    say(`${steppedDown.byName} chose the shorter time: ${steppedDown.reason}`, 'soft');
  }
  if (a.original === 'required') say('The original itself is needed; a scan is not enough.');
  return lines;
}
