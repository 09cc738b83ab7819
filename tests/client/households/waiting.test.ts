import { describe, expect, it } from 'vitest';
import { listWaiting } from '../../../src/features/households/logic/list-waiting.ts';
import { buildHousehold } from '../support/people.ts';

const counts = buildHousehold().counts;
const nothing = { outflow: undefined, listsToApprove: [], filingQuestion: undefined };

describe('the way forward', () => {
  it('begins with what waits for a yes, then what is to be looked at', () => {
    const steps = listWaiting({
      ...nothing,
      household: buildHousehold({ counts: { ...counts, toReview: 3, undecided: 1, holds: 1 } }),
      listsToApprove: [{ id: 'list', papers: 2 }],
      may: () => true,
    });
    expect(steps.map((step) => step.key)).toEqual(['approve-list', 'review', 'undecided', 'holds']);
    expect(steps[1]?.title).toBe('3 papers to look at');
  });

  it('offers nothing that would be refused', () => {
    const steps = listWaiting({
      ...nothing,
      household: buildHousehold({ counts: { ...counts, toReview: 3, leaving: 2 } }),
      may: (permission) => permission === 'household:read',
    });
    expect(steps).toEqual([]);
  });

  it('is empty when nothing waits', () => {
    expect(listWaiting({ ...nothing, household: buildHousehold(), may: () => true })).toEqual([]);
  });
});
