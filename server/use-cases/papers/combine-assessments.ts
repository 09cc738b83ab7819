/** Two rule tables were asked about one paper: the later date counts. */
import type { Assessment } from '../../contract/assessments.ts';
import { securityLevels } from '../../contract/assessments.ts';
import { laterOf } from '../../retention/dates.ts';

/** Permanent before open before the later date; what each table said stays readable in rules and steps. */
export function combineAssessments(own: Assessment, other: Assessment): Assessment {
  const [first, second] = isLonger(other, own) ? [other, own] : [own, other];
  return {
    ...first,
    // One open answer hides the other's date, so only the same date can be promised as provisional.
    provisional: first.open && second.open ? null : first.provisional,
    scheduledUntil:
      first.scheduledUntil && second.scheduledUntil
        ? laterOf(first.scheduledUntil, second.scheduledUntil)
        : first.scheduledUntil,
    advisedUntil: laterOrNull(first.advisedUntil, second.advisedUntil),
    advisedBecause:
      laterOrNull(first.advisedUntil, second.advisedUntil) === first.advisedUntil
        ? first.advisedBecause
        : second.advisedBecause,
    original: strictest(first.original, second.original),
    securityLevel: higherLevel(first.securityLevel, second.securityLevel),
    disposal: first.disposal === 'recycle' ? second.disposal : first.disposal,
    assumed: unite(first.assumed, second.assumed),
    rules: [...first.rules, ...second.rules.filter((r) => !first.rules.some((f) => f.id === r.id))],
    // The deciding table comes last, so that the sum still ends with its date.
    steps: [...second.steps, ...first.steps],
    cautions: unite(second.cautions, first.cautions),
  };
}

function rank(assessment: Assessment): number {
  if (assessment.permanent) return 3;
  if (assessment.open) return 2;
  return assessment.keepUntil === null ? 0 : 1;
}

function isLonger(a: Assessment, b: Assessment): boolean {
  if (rank(a) !== rank(b)) return rank(a) > rank(b);
  return lastDay(a) > lastDay(b);
}

function lastDay(assessment: Assessment): string {
  return assessment.keepUntil ?? assessment.scheduledUntil ?? assessment.shredFrom ?? '';
}

function laterOrNull(a: string | null, b: string | null): string | null {
  return a !== null && b !== null ? laterOf(a, b) : (a ?? b);
}

function strictest(a: Assessment['original'], b: Assessment['original']): Assessment['original'] {
  const order: Assessment['original'][] = ['scan-is-enough', 'conditional', 'required'];
  return order.indexOf(a) >= order.indexOf(b) ? a : b;
}

/** The higher of two ISO/IEC 21964 levels. */
export function higherLevel(
  a: Assessment['securityLevel'],
  b: Assessment['securityLevel'],
): Assessment['securityLevel'] {
  if (a === null || b === null) return a ?? b;
  return securityLevels.indexOf(a) >= securityLevels.indexOf(b) ? a : b;
}

/** Both lists without repetition; the last list's order stands at the end. */
function unite(a: string[], b: string[]): string[] {
  return [...a.filter((text) => !b.includes(text)), ...b];
}
