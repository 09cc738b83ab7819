/** Several rules, one paper: permanent, then open, then the latest date. */
import type { Assessment } from '../contract/assessments.ts';
import type { IsoDate } from '../contract/dates.ts';
import { laterOf } from './dates.ts';
import type { Outcome } from './outcome.ts';

export type Verdict =
  | {
      readonly kind: 'permanent' | 'none';
      readonly until: null;
      readonly from: IsoDate | null;
      readonly because: null;
      readonly provisional: null;
    }
  | {
      readonly kind: 'dated';
      readonly until: IsoDate;
      readonly from: null;
      readonly because: null;
      readonly provisional: null;
    }
  | {
      readonly kind: 'open';
      readonly until: null;
      readonly from: null;
      readonly because: string;
      readonly provisional: Assessment['provisional'];
    };

const ownerDecides = 'The owner decides: the program never schedules it.';

/** The one date that the one missing answer would give; null when several answers are missing. */
function findProvisional(
  outcomes: readonly Outcome[],
  latest: IsoDate | null,
): Assessment['provisional'] {
  let missing: string | null = null;
  let assuming: string | null = null;
  let until = latest;
  for (const outcome of outcomes) {
    if (outcome.kind === 'owner-decides') return null;
    if (outcome.kind !== 'open') continue;
    if (outcome.missing === null) return null;
    if (missing !== null && missing !== outcome.missing) return null;
    ({ missing } = outcome);
    assuming ??= outcome.assuming;
    if (outcome.provisional)
      until = until ? laterOf(until, outcome.provisional) : outcome.provisional;
  }
  return until && assuming ? { keepUntil: until, assuming } : null;
}

/** Puts the outcomes of all rules and owners together; there must be at least one. */
export function combineOutcomes(says: readonly { readonly outcome: Outcome }[]): Verdict {
  let latest: IsoDate | null = null;
  let from: IsoDate | null = null;
  let because: string | null = null;
  for (const { outcome } of says) {
    switch (outcome.kind) {
      case 'permanent':
        return { kind: 'permanent', until: null, from: null, because: null, provisional: null };
      case 'owner-decides':
        because ??= ownerDecides;
        break;
      case 'open':
        because ??= outcome.because;
        break;
      case 'dated':
        if (latest === null || outcome.until > latest) latest = outcome.until;
        break;
      case 'none':
        from = from ? laterOf(from, outcome.from) : outcome.from;
        break;
      case 'not-in-force':
        break;
    }
  }
  if (because !== null) {
    const provisional = findProvisional(
      says.map((say) => say.outcome),
      latest,
    );
    return { kind: 'open', until: null, from: null, because, provisional };
  }
  // What may go from the day it came never goes before it.
  if (latest !== null && (from === null || from <= latest))
    return { kind: 'dated', until: latest, from: null, because: null, provisional: null };
  return { kind: 'none', until: null, from, because: null, provisional: null };
}
