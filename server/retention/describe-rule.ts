/** A rule as a plain sentence, for screens and printed tables. */
import { wordDay, wordPeriod } from './dates.ts';
import { momentLabel } from './moments.ts';
import { periodOf } from './rule-set.ts';
import type { Keep, PeriodKeep, Rule } from './rule-schema.ts';

const months = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
];

/** "31 January" for `01-31`. */
function wordMonthDay(monthDay: string): string {
  return `${Number(monthDay.slice(3))} ${months[Number(monthDay.slice(0, 2)) - 1] ?? ''}`;
}

function wordTrigger(keep: Extract<Keep, { trigger: unknown }>): string {
  const labels = [...new Set(keep.trigger.map(momentLabel))];
  if (labels.length === 1 || keep.pick === 'first') {
    const [first = '', second] = labels;
    return second ? `${first} (or else ${second})` : first;
  }
  return `the latest of ${labels.slice(0, 3).join(', ')}`;
}

function wordLength(keep: PeriodKeep): string {
  if (typeof keep.period === 'string') return wordPeriod(periodOf(keep.period));
  return {
    contract: "the country's limitation period",
    deed: "the country's limitation period for deeds",
    injury: "the country's limitation period for injuries",
  }[keep.period.limitation];
}

function describePeriod(keep: PeriodKeep): string {
  if (keep.period === 'P0D') return `kept until ${wordTrigger(keep)}`;
  const joint = keep.counting === 'beginning-with' ? 'beginning with' : 'after';
  const yearEnd = {
    trigger: '',
    'end-of-calendar-year': 'the end of the year of ',
    'end-of-month': 'the end of the month of ',
  }[keep.startAt];
  const child = keep.notBeforeAge
    ? `, for a child not before the ${keep.notBeforeAge}th birthday`
    : '';
  return `kept for ${wordLength(keep)} ${joint} ${yearEnd}${wordTrigger(keep)}${child}`;
}

function describeKeep(keep: Keep): string {
  switch (keep.how) {
    case 'permanent':
      return 'kept for ever';
    case 'none':
      return 'nothing asks for it to be kept';
    case 'owner-decides':
      return 'the owner decides, the program never schedules it';
    case 'open':
      return `open. ${keep.because.replace(/\.$/, '')}`;
    case 'period':
      return describePeriod(keep);
    case 'return-window': {
      const length = wordPeriod(periodOf(keep.period));
      const from = keep.anchor
        ? `the ${wordMonthDay(keep.anchor)} that follows ${wordTrigger(keep)}`
        : wordTrigger(keep);
      return `kept for ${length} after ${from}; longer after a late or amended return`;
    }
    case 'late-restart':
      return `kept for ${wordPeriod(periodOf(keep.period))} after ${wordTrigger(keep)}; a late return starts the time again ${keep.restartAt === 'delivery' ? 'on the day it arrives' : 'at the end of the year in which it arrives'}`;
    case 'filing-start': {
      const from =
        keep.startFrom === 'due'
          ? 'the day the return was due'
          : 'the return was filed, an early one counting from the day it was due';
      return `kept for ${wordPeriod(periodOf(keep.period))} after ${from}`;
    }
    case 'change-over':
      return `kept for ${wordPeriod(periodOf(keep.period))} after the end of the year of ${wordTrigger(keep)} (${wordPeriod(periodOf(keep.formerPeriod))} before ${wordDay(keep.changedFrom)})`;
    case 'filing-year':
      return `kept for ${wordPeriod(periodOf(keep.period))} after the end of the year in which the return was filed`;
  }
}

/** What the rule says in one sentence: which papers, how long, from when, and what is waited for. */
export function describeRule(rule: Rule): string {
  const { keep } = rule;
  const waits =
    'waitsFor' in keep && keep.waitsFor ? `; open until ${momentLabel(keep.waitsFor)}` : '';
  const regions = rule.regions ? ` (${rule.regions.join(', ')})` : '';
  return `${rule.title}${regions}: ${describeKeep(keep)}${waits}.`;
}
