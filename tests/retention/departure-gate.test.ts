import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { Assessment } from '../../server/contract/assessments.ts';
import { classIds } from '../../server/contract/document-classes.ts';
import { paperStatuses, piles } from '../../server/contract/papers.ts';
import {
  departureKinds,
  type GateCode,
  type GateQuestion,
  mayLeave,
} from '../../server/retention/departure-gate.ts';

const today = '2026-11-07';

/** What the rules say of a paper whose time is up. */
const timeIsUp: Assessment = {
  keepUntil: '2026-11-06',
  shredFrom: '2026-11-07',
  permanent: false,
  open: false,
  openBecause: null,
  heldBy: [],
  scheduledUntil: '2026-11-06',
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

type Change = {
  paper?: Partial<GateQuestion['paper']>;
  assessment?: Partial<Assessment>;
} & Partial<Pick<GateQuestion, 'holds' | 'how' | 'on' | 'today'>>;

function ask(change: Change = {}): string[] {
  return mayLeave({
    holds: [],
    how: 'shred',
    on: today,
    today,
    ...change,
    paper: {
      class: 'utility-bill',
      status: 'leaving',
      pile: 'shred',
      isReviewed: true,
      isSteppedDown: false,
      ...change.paper,
    },
    assessment: { ...timeIsUp, ...change.assessment },
  }).map((reason) => reason.code);
}

describe('the gate', () => {
  test('lets a paper go that a person decided to shred and whose time is up', () => {
    expect(ask()).toEqual([]);
  });

  test('opens on the day after the last day to keep, not on that day', () => {
    expect(ask({ on: '2026-11-06' })).toEqual(['not-yet']);
    expect(ask({ on: '2026-11-07' })).toEqual([]);
  });

  test('waits for the advised day until somebody stepped down', () => {
    const assessment = { advisedUntil: '2026-11-07' };
    expect(ask({ assessment })).toEqual(['advised']);
    expect(ask({ assessment, paper: { isSteppedDown: true } })).toEqual([]);
    expect(ask({ assessment: { advisedUntil: '2026-11-06' } })).toEqual([]);
  });

  test('stepping down never goes below the rule itself', () => {
    const assessment = { shredFrom: '2026-11-08', advisedUntil: '2030-01-01' };
    expect(ask({ assessment, paper: { isSteppedDown: true } })).toEqual(['not-yet']);
  });

  test.each<[GateCode, Change]>([
    ['not-reviewed', { paper: { isReviewed: false } }],
    ['left', { paper: { status: 'left' } }],
    ['pile', { paper: { pile: 'file-here', status: 'kept' } }],
    ['pile', { paper: { status: 'undecided' } }],
    ['unrecognised', { paper: { class: 'unrecognised' } }],
    ['held', { holds: [{ reason: 'A claim is running' }] }],
    ['held', { assessment: { heldBy: [{ reason: null, placedOn: null }] } }],
    ['permanent', { assessment: { permanent: true } }],
    ['open', { assessment: { open: true } }],
    ['no-date', { assessment: { shredFrom: null } }],
    ['original', { assessment: { original: 'required' } }],
    ['recycling', { how: 'recycle', paper: { pile: 'recycle' } }],
    ['future', { on: '2026-11-08' }],
  ])('refuses with "%s"', (code, change) => {
    expect(ask(change)).toEqual([code]);
  });

  test('recycles circulars, envelopes and manuals, and only when the rules say recycle', () => {
    for (const id of ['circular', 'envelope', 'user-manual'] as const) {
      const paper = { class: id, pile: 'recycle' as const };
      expect(ask({ how: 'recycle', paper, assessment: { disposal: 'recycle' } })).toEqual([]);
      expect(ask({ how: 'recycle', paper })).toEqual(['recycling']);
    }
  });

  test('never opens for a paper that must stay, whatever else is true of it', () => {
    let opened = 0;
    const day = fc.constantFrom('2020-01-01', '2026-11-06', today, '2026-11-08', '2040-01-01');
    // Mostly the values of a paper that may go, so that single obstacles are met alone.
    const usually = <T>(value: T, others: fc.Arbitrary<T>) =>
      fc.oneof({ weight: 6, arbitrary: fc.constant(value) }, { weight: 1, arbitrary: others });
    const question = fc.record({
      paper: fc.record({
        class: usually('utility-bill' as const, fc.constantFrom(...classIds)),
        status: usually('leaving' as const, fc.constantFrom(...paperStatuses)),
        pile: usually('shred' as const, fc.constantFrom(...piles, null)),
        isReviewed: usually(true, fc.boolean()),
        isSteppedDown: fc.boolean(),
      }),
      assessment: fc.record({
        shredFrom: usually('2020-01-01', fc.option(day)),
        permanent: usually(false, fc.boolean()),
        open: usually(false, fc.boolean()),
        advisedUntil: usually(null, fc.option(day)),
        heldBy: usually<Assessment['heldBy']>(
          [],
          fc.constant([{ reason: 'A claim', placedOn: null }]),
        ),
        original: usually(
          'scan-is-enough' as const,
          fc.constantFrom('required' as const, 'conditional' as const),
        ),
        disposal: fc.constantFrom('shred' as const, 'recycle' as const),
      }),
      holds: usually<{ reason: string }[]>([], fc.constant([{ reason: 'A claim' }])),
      how: usually('shred' as const, fc.constantFrom(...departureKinds)),
      on: usually(today, day),
    });
    fc.assert(
      fc.property(question, ({ paper, assessment, holds, how, on }) => {
        if (ask({ paper, assessment, holds, how, on }).length > 0) return;
        opened += 1;
        expect(paper).toMatchObject({ isReviewed: true, status: 'leaving', pile: how });
        expect(paper.class).not.toBe('unrecognised');
        expect([...holds, ...assessment.heldBy]).toEqual([]);
        expect(assessment).toMatchObject({ permanent: false, open: false });
        expect(assessment.original).not.toBe('required');
        expect(assessment.shredFrom).not.toBeNull();
        expect((assessment.shredFrom ?? '9999') <= on).toBe(true);
        expect(on <= today).toBe(true);
        const isAdvised = assessment.advisedUntil !== null && assessment.advisedUntil >= on;
        expect(isAdvised && !paper.isSteppedDown).toBe(false);
      }),
      { numRuns: 4000, seed: 20261107 },
    );
    expect(opened).toBeGreaterThan(100);
  });
});
