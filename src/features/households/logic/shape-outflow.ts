import type { Outflow } from '../../../../server/contract/households.ts';

export interface OutflowStep {
  year: number;
  /** Sheets that leave in it. */
  leaving: number;
  /** Sheets in the house before and after it. */
  before: number;
  after: number;
}

export interface OutflowShape {
  /** Sheets in the house now. */
  total: number;
  /** Sheets that stay for good: the bed of the estuary. */
  bed: number;
  /** Sheets whose time nobody knows yet, those not looked at included. */
  unsettled: number;
  dueNow: number;
  steps: OutflowStep[];
  /** The picture in one or two sentences. */
  sentence: string;
}

function countSheets(count: number): string {
  return `${count} ${count === 1 ? 'sheet' : 'sheets'}`;
}

function describeOutflow(outflow: Outflow, total: number): string {
  if (total === 0) return 'No paper is on record in this household yet.';
  const last = outflow.years.findLast((y) => y.sheets > 0);
  const leaving = outflow.years.reduce((sum, y) => sum + y.sheets, 0);
  const parts = [
    outflow.dueNow > 0 ? `${countSheets(outflow.dueNow)} may leave now` : '',
    last ? `${countSheets(leaving)} may leave year by year until ${last.year}` : '',
    outflow.permanent > 0 ? `${countSheets(outflow.permanent)} stay for good` : '',
    outflow.open > 0 ? `for ${countSheets(outflow.open)} it is not settled yet` : '',
    outflow.toReview > 0 ? `${countSheets(outflow.toReview)} wait to be looked at` : '',
  ].filter(Boolean);
  const tail = parts.length > 1 ? `${parts.slice(0, -1).join(', ')} and ${parts.at(-1)}` : parts[0];
  return `${countSheets(total)} in the house: ${tail}.`;
}

/** Years shown at least, so that a tide has room to go out. */
const fewestYears = 5;

/**
 * The levels of the outflow picture, from what the server counted: every year from this one to the last
 * in which something leaves (a few at least), each with the sheets in the house before and after it.
 */
export function shapeOutflow(outflow: Outflow): OutflowShape {
  const byYear = new Map(outflow.years.map((y) => [y.year, y.sheets]));
  const leavingLater = outflow.years.reduce((sum, y) => sum + y.sheets, 0);
  const unsettled = outflow.open + outflow.toReview;
  const total = outflow.dueNow + leavingLater + outflow.permanent + unsettled;
  const first = Number(outflow.today.slice(0, 4));
  const last = Math.max(first + fewestYears - 1, ...outflow.years.map((y) => y.year));
  const steps: OutflowStep[] = [];
  let level = total - outflow.dueNow;
  for (let year = Math.min(first, ...byYear.keys()); year <= last; year += 1) {
    const leaving = byYear.get(year) ?? 0;
    steps.push({ year, leaving, before: level, after: level - leaving });
    level -= leaving;
  }
  return {
    total,
    bed: outflow.permanent,
    unsettled,
    dueNow: outflow.dueNow,
    steps,
    sentence: describeOutflow(outflow, total),
  };
}

/** Every how many years the axis is labelled so that `width` pixels hold the labels. */
export function chooseYearStep(years: number, width: number): number {
  const most = Math.max(2, Math.floor(width / 64));
  return [1, 2, 5, 10, 20, 50].find((step) => years / step <= most) ?? 100;
}
