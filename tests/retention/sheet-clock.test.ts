/** Sheet and scan as two clocks: nothing goes early unless every condition is on record. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Assessment } from '../../server/contract/assessments.ts';
import { mayLeave } from '../../server/retention/departure-gate.ts';
import {
  describeEarlyCondition,
  type EarlySheetRecord,
  findSheetClocks,
} from '../../server/retention/sheet-clock.ts';

const on = '2026-12-01';

const assessment: Assessment = {
  keepUntil: '2030-01-31',
  shredFrom: '2030-02-01',
  permanent: false,
  open: false,
  openBecause: null,
  heldBy: [],
  scheduledUntil: '2030-01-31',
  provisional: null,
  advisedUntil: null,
  advisedBecause: null,
  assumed: [],
  disposal: 'shred',
  securityLevel: 'P-4',
  original: 'scan-is-enough',
  rules: [],
  steps: [],
  cautions: [],
};
const record: EarlySheetRecord = {
  agreedOn: '2026-10-01',
  withdrawnOn: null,
  pagesConfirmedOn: '2026-11-02',
  copyDeliveredOn: '2026-11-20',
  backupVerifiedOn: '2026-11-05',
};
const held = { ...assessment, heldBy: [{ reason: 'claim', placedOn: null }] };

/** Asks the gate about shredding the sheet on a day. */
function ask(
  early: EarlySheetRecord | null,
  changed: Partial<Assessment> = {},
  day = on,
): string[] {
  return mayLeave({
    paper: {
      class: 'supplier-invoice',
      status: 'leaving',
      pile: 'shred',
      isReviewed: true,
      isSteppedDown: false,
    },
    assessment: { ...assessment, ...changed },
    holds: [],
    how: 'shred',
    on: day,
    today: null,
    early,
  }).map(({ code }) => code);
}

describe('sheet and scan', () => {
  it('run together while nothing was agreed', () => {
    expect(findSheetClocks(assessment, null, on)).toEqual({
      sheetFrom: '2030-02-01',
      isEarly: false,
      scanUntil: '2030-01-31',
      missing: ['agreement', 'pages', 'copy', 'backup'],
    });
    expect(ask(null)).toEqual(['not-yet']);
  });

  it('part when every condition is on record: the sheet from the last of them, the scan to the end', () => {
    expect(findSheetClocks(assessment, record, on)).toEqual({
      sheetFrom: '2026-11-20',
      isEarly: true,
      scanUntil: '2030-01-31',
      missing: [],
    });
    expect(ask(record)).toEqual([]);
    expect(ask(record, {}, '2026-11-19')).toEqual(['not-yet']);
  });

  it.each([
    ['agreedOn', 'agreement'],
    ['pagesConfirmedOn', 'pages'],
    ['copyDeliveredOn', 'copy'],
    ['backupVerifiedOn', 'backup'],
  ] as const)('stay together without %s', (name, condition) => {
    const lacking = { ...record, [name]: null };
    expect(findSheetClocks(assessment, lacking, on)).toMatchObject({
      isEarly: false,
      sheetFrom: '2030-02-01',
      missing: [condition],
    });
    expect(ask(lacking)).toEqual(['not-yet']);
    expect(describeEarlyCondition(condition)).toMatch(/^[A-Z].+\.$/);
  });

  it('stay together again when the agreement is taken back', () => {
    const withdrawn = { ...record, withdrawnOn: '2026-11-30' };
    expect(ask(withdrawn)).toEqual(['not-yet']);
    expect(ask(withdrawn, {}, '2026-11-29')).toEqual([]);
  });

  it.each(['required', 'conditional'] as const)(
    'stay together where the original is %s',
    (original) => {
      expect(findSheetClocks({ ...assessment, original }, record, on).missing).toEqual([
        'original',
      ]);
      expect(ask(record, { original })).toContain('not-yet');
    },
  );

  it('stay together under a hold, without a date, and for ever', () => {
    expect(findSheetClocks(held, record, on).missing).toContain('held');
    const none = { keepUntil: null, shredFrom: null, scheduledUntil: null };
    expect(ask(record, { ...none, open: true })).toEqual(['open']);
    expect(ask(record, { ...none, permanent: true })).toEqual(['permanent']);
    expect(findSheetClocks({ ...assessment, ...none, open: true }, record, on)).toMatchObject({
      sheetFrom: null,
      scanUntil: null,
      missing: ['no-date'],
    });
  });

  it('keep the scan to the advised day', () => {
    const advised = { ...assessment, advisedUntil: '2032-01-31' };
    expect(findSheetClocks(advised, record, on).scanUntil).toBe('2032-01-31');
  });

  it('is about shredding: nothing is given back or passed on early', () => {
    const reasons = mayLeave({
      paper: {
        class: 'supplier-invoice',
        status: 'leaving',
        pile: 'pass-on',
        isReviewed: true,
        isSteppedDown: false,
      },
      assessment,
      holds: [],
      how: 'pass-on',
      on,
      today: null,
      early: record,
    });
    expect(reasons.map(({ code }) => code)).toEqual(['not-yet']);
  });

  it('never part before the last condition, and the scan never ends before the rules do', () => {
    const day = fc.date({
      min: new Date('2024-01-01'),
      max: new Date('2032-12-31'),
      noInvalidDate: true,
    });
    const maybeDay = fc.option(day.map((d) => d.toISOString().slice(0, 10)));
    const anyRecord = fc.record({
      agreedOn: maybeDay,
      withdrawnOn: maybeDay,
      pagesConfirmedOn: maybeDay,
      copyDeliveredOn: maybeDay,
      backupVerifiedOn: maybeDay,
    });
    fc.assert(
      fc.property(anyRecord, maybeDay, (early, asked) => {
        const clocks = findSheetClocks(assessment, early, asked ?? on);
        const { withdrawnOn, ...conditions } = early;
        const days = Object.values(conditions);
        expect(clocks.scanUntil).toBe('2030-01-31');
        if (!clocks.isEarly) expect(clocks.sheetFrom).toBe('2030-02-01');
        else {
          for (const condition of days) {
            expect(condition !== null && condition <= (clocks.sheetFrom ?? '')).toBe(true);
          }
          expect(withdrawnOn === null || withdrawnOn > (asked ?? on)).toBe(true);
        }
      }),
      { numRuns: 500, seed: 20261201 },
    );
  });
});
