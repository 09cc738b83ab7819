import { describe, expect, it } from 'vitest';
import { decideMay } from '../../../src/lib/use-may.ts';
import { buildMembership, householdId, practiceId } from '../support/people.ts';

const otherHouseholdId = '77777777-1111-4222-8333-444444444444';
const otherPracticeId = '88888888-1111-4222-8333-444444444444';

describe('what is offered to whom', () => {
  it('offers an owner everything in a household of the practice', () => {
    expect(decideMay([buildMembership({})], 'paper:review', householdId)).toBe(true);
  });

  it('offers an assistant no approval, and nothing in another household', () => {
    const assistant = [buildMembership({ role: 'assistant', householdId })];
    expect(decideMay(assistant, 'paper:review', householdId)).toBe(true);
    expect(decideMay(assistant, 'shred-list:approve', householdId)).toBe(false);
    expect(decideMay(assistant, 'paper:review', otherHouseholdId)).toBe(false);
  });

  it('offers a client what their rights reach, group by group', () => {
    const client = [
      buildMembership({
        role: 'client',
        householdId,
        rights: { see: 'all', decide: ['bills'], approve: 'none', export: 'none' },
      }),
    ];
    expect(decideMay(client, 'paper:review', householdId, 'bills')).toBe(true);
    expect(decideMay(client, 'paper:review', householdId, 'legal')).toBe(false);
    expect(decideMay(client, 'shred-list:approve', householdId)).toBe(false);
  });

  it('does not lend an owner’s powers to a household of another practice', () => {
    const both = [
      buildMembership({ practiceId }),
      buildMembership({
        role: 'client',
        practiceId: otherPracticeId,
        householdId: otherHouseholdId,
        rights: { see: 'all', decide: 'none', approve: 'none', export: 'none' },
      }),
    ];
    expect(decideMay(both, 'paper:read', otherHouseholdId)).toBe(true);
    expect(decideMay(both, 'paper:review', otherHouseholdId)).toBe(false);
    expect(decideMay(both, 'paper:review', householdId)).toBe(true);
  });

  it('offers nothing to nobody', () => {
    expect(decideMay([], 'household:create')).toBe(false);
  });
});
