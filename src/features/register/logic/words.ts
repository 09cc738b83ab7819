import type { PaperRow, PaperStatus } from '../../../../server/contract/papers.ts';
import { formatDay } from '../../../lib/format.ts';

export const statusWords: Record<PaperStatus, string> = {
  'to-review': 'to look at',
  undecided: 'undecided',
  kept: 'kept',
  leaving: 'leaving',
  left: 'left',
};

export const keptWords = { duty: 'a duty', use: 'use', dear: 'it is dear' } as const;

/** The same as a sentence that stands alone. */
export function describeStayAlone(row: PaperRow): string {
  const stay = describeStay(row);
  if (row.permanent && !row.leftOn) return 'stays for good';
  return row.keepUntil && stay === formatDay(row.keepUntil) ? `keep until ${stay}` : stay;
}

/** Until when a paper stays, in words. */
export function describeStay(row: PaperRow): string {
  if (row.leftOn) return `left on ${formatDay(row.leftOn)}`;
  if (row.permanent) return 'for good';
  if (row.held) return "don't destroy yet";
  if (row.open) return describeOpen(row);
  if (row.keepUntil) return formatDay(row.keepUntil);
  return row.shredFrom ? `may go from ${formatDay(row.shredFrom)}` : 'no date yet';
}

/** A paper without a date, which may still say until when it is valid. */
function describeOpen({ expiresOn }: PaperRow): string {
  return expiresOn ? `no date yet; runs out ${formatDay(expiresOn)}` : 'no date yet';
}
