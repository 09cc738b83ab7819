/** Holds, enquiries and objections: while one is in force the paper is open, whatever the schedule says. */
import type { Assessment } from '../contract/assessments.ts';
import type { CaseInputs } from '../contract/cases.ts';
import type { IsoDate } from '../contract/dates.ts';
import { findLatest, laterOf, wordDay } from './dates.ts';

export type HeldBy = Assessment['heldBy'][number];

export interface Stops {
  /** Those in force on the day asked about. */
  readonly heldBy: HeldBy[];
  /** The latest day on which one that has ended was lifted; null when there is none. */
  readonly releasedOn: IsoDate | null;
  readonly releaseText: string | null;
  readonly assumed: string[];
}

const noStops: Stops = { heldBy: [], releasedOn: null, releaseText: null, assumed: [] };

interface Stop {
  readonly reason: string | null;
  readonly from: IsoDate | null;
  /** null while it still runs. */
  readonly to: IsoDate | null;
  readonly endText: string;
}

function listStops(inputs: CaseInputs, assumed: string[]): Stop[] {
  const stops: Stop[] = [];
  const holds = [...(inputs.hold ? [inputs.hold] : []), ...(inputs.holds ?? [])];
  for (const hold of holds) {
    stops.push({
      reason: hold.reason ?? null,
      from: hold.placedOn ?? null,
      to: hold.releasedOn ?? null,
      endText: 'Hold released',
    });
  }
  if (inputs.enquiry) {
    stops.push({
      reason: 'An enquiry by the authority is open.',
      from: inputs.enquiry.openedOn ?? null,
      to: inputs.enquiry.closedOn ?? null,
      endText: 'Enquiry completed',
    });
  }
  if (inputs.objection) {
    const { resolvedOn, furtherAppealExpiresOn } = inputs.objection;
    if (resolvedOn && furtherAppealExpiresOn === undefined) {
      assumed.push(
        'Whether the decision could be appealed further is not known: counted as final.',
      );
    }
    // A further appeal whose last day is said not to have come can still be made.
    const isFinal = resolvedOn && furtherAppealExpiresOn !== null;
    stops.push({
      reason: 'An objection or appeal is running.',
      from: null,
      to: isFinal ? resolvedOn : null,
      endText: 'Objection or appeal resolved',
    });
  }
  return stops;
}

/** Which stops are in force on a day, and when the others ended. */
export function findStops(inputs: CaseInputs, on: IsoDate): Stops {
  if (!inputs.hold && !inputs.holds && !inputs.enquiry && !inputs.objection) return noStops;
  const heldBy: HeldBy[] = [];
  const assumed: string[] = [];
  let releasedOn: IsoDate | null = null;
  let releaseText: string | null = null;
  for (const stop of listStops(inputs, assumed)) {
    if (stop.from !== null && stop.from > on) continue;
    if (stop.to === null || stop.to > on) {
      heldBy.push({ reason: stop.reason, placedOn: stop.from });
    } else if (releasedOn === null || stop.to > releasedOn) {
      releasedOn = stop.to;
      releaseText = `${stop.endText} on ${wordDay(stop.to)}.`;
    }
  }
  const appealEnds = inputs.objection?.resolvedOn ? inputs.objection.furtherAppealExpiresOn : null;
  if (appealEnds && (releasedOn === null || appealEnds > releasedOn)) {
    releasedOn = appealEnds;
    releaseText = `A further appeal was possible until ${wordDay(appealEnds)}.`;
  }
  return { heldBy, releasedOn, releaseText, assumed };
}

/** The stops of all owners together: a hold on one owner holds the paper. */
export function mergeStops(all: readonly Stops[]): Stops {
  if (all.length === 1 && all[0]) return all[0];
  const releasedOn = findLatest(all.map((stops) => stops.releasedOn));
  const heldBy: HeldBy[] = [];
  for (const stop of all.flatMap((stops) => stops.heldBy)) {
    const isListed = heldBy.some((h) => h.reason === stop.reason && h.placedOn === stop.placedOn);
    if (!isListed) heldBy.push(stop);
  }
  return {
    heldBy,
    releasedOn,
    releaseText: all.find((stops) => stops.releasedOn === releasedOn)?.releaseText ?? null,
    assumed: all.flatMap((stops) => stops.assumed),
  };
}

/** The scheduled day, moved to the day a stop ended when that is later. */
export function extendToRelease(scheduled: IsoDate, stops: Stops): IsoDate {
  return stops.releasedOn === null ? scheduled : laterOf(scheduled, stops.releasedOn);
}
