/**
 * Sheet and scan are two clocks. By itself the sheet is kept as long as the rules say, and the scan at least as
 * long. A household may agree that sheets go early; then each condition is checked by itself, and the scan stays.
 */
import type { Assessment } from '../contract/assessments.ts';
import type { IsoDate } from '../contract/dates.ts';
import { findLatest, laterOf } from './dates.ts';

/** What is on record about letting a sheet go before its date; null where nothing is. */
export interface EarlySheetRecord {
  readonly agreedOn: IsoDate | null;
  /** The agreement was taken back. */
  readonly withdrawnOn: IsoDate | null;
  /** Somebody looked at every page and found it complete and legible. */
  readonly pagesConfirmedOn: IsoDate | null;
  /** The household has its copy of the scan. */
  readonly copyDeliveredOn: IsoDate | null;
  /** A backup that holds the scan was read back. */
  readonly backupVerifiedOn: IsoDate | null;
}

export type EarlySheetCondition =
  'no-date' | 'held' | 'original' | 'agreement' | 'pages' | 'copy' | 'backup';

const sentences: Record<EarlySheetCondition, string> = {
  'no-date': 'The rules give no date for it, so its sheet stays.',
  held: 'It must not be destroyed yet, so its sheet stays.',
  original: 'The rules do not say that a scan is enough, so its sheet stays.',
  agreement: 'The household has not agreed that sheets go early.',
  pages: 'Nobody has confirmed that its pages are complete and legible.',
  copy: 'The household has not received its copy of the scan.',
  backup: 'No backup that holds the scan has been verified.',
};

/** The condition in a sentence. */
export function describeEarlyCondition(condition: EarlySheetCondition): string {
  return sentences[condition];
}

export interface SheetClocks {
  /** First day on which the sheet may go; null while there is none. */
  readonly sheetFrom: IsoDate | null;
  /** Whether that is before the day the rules give. */
  readonly isEarly: boolean;
  /** Last day on which the scan must be kept; null where the rules give no last day. */
  readonly scanUntil: IsoDate | null;
  /** What stands in the way of letting the sheet go early, in the order in which it is asked. */
  readonly missing: EarlySheetCondition[];
}

function findMissing(
  assessment: Assessment,
  record: EarlySheetRecord | null,
  on: IsoDate,
): EarlySheetCondition[] {
  const isDone = (day: IsoDate | null | undefined): boolean => !!day && day <= on;
  const missing: EarlySheetCondition[] = [];
  if (assessment.heldBy.length > 0) missing.push('held');
  else if (assessment.permanent || assessment.open || assessment.keepUntil === null)
    missing.push('no-date');
  if (assessment.original !== 'scan-is-enough') missing.push('original');
  if (!isDone(record?.agreedOn) || isDone(record?.withdrawnOn)) missing.push('agreement');
  if (!isDone(record?.pagesConfirmedOn)) missing.push('pages');
  if (!isDone(record?.copyDeliveredOn)) missing.push('copy');
  if (!isDone(record?.backupVerifiedOn)) missing.push('backup');
  return missing;
}

/** Both clocks of a paper on a day. `record` is what is known about letting its sheet go early. */
export function findSheetClocks(
  assessment: Assessment,
  record: EarlySheetRecord | null,
  on: IsoDate,
): SheetClocks {
  const { keepUntil, shredFrom, advisedUntil } = assessment;
  const missing = findMissing(assessment, record, on);
  const scanUntil = keepUntil && advisedUntil ? laterOf(keepUntil, advisedUntil) : keepUntil;
  if (missing.length > 0 || shredFrom === null || record === null) {
    return { sheetFrom: shredFrom, isEarly: false, scanUntil, missing };
  }
  const { agreedOn, pagesConfirmedOn, copyDeliveredOn, backupVerifiedOn } = record;
  const ready = findLatest([agreedOn, pagesConfirmedOn, copyDeliveredOn, backupVerifiedOn]);
  const isEarly = ready !== null && ready < shredFrom;
  return { sheetFrom: isEarly ? ready : shredFrom, isEarly, scanUntil, missing };
}
