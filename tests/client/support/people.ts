import type { Household } from '../../../server/contract/households.ts';
import type { Membership } from '../../../server/contract/permissions.ts';
import type { Session } from '../../../server/contract/sessions.ts';

export const householdId = '6a1f0c5e-2d38-4b60-9a7e-0d5b7f3c1e22';
export const practiceId = '0b8d7c44-9f1e-4a53-8a2b-1c3d5e7f9a10';

/** A membership of the invented practice; what matters to a test is given. */
export function buildMembership(values: Partial<Membership>): Membership {
  return {
    id: '2c9a4e70-5b1d-4f86-8c3e-7a6b5d4c3f21',
    role: 'owner',
    practiceId,
    practiceName: 'Marram House Organising',
    householdId: null,
    householdName: null,
    standing: null,
    rights: null,
    sharedGroups: null,
    startsOn: '2026-01-01',
    endsOn: null,
    ...values,
  };
}

export const ownerSession: Session = {
  user: {
    id: '9d2e1f30-6c5b-4a79-8d8e-3f2a1b0c9d84',
    email: 'owner@practice.example',
    name: 'Rosalind Teague',
  },
  memberships: [buildMembership({})],
  csrfToken: 'token-of-the-test',
};

/** An invented household; what matters to a test is given. */
export function buildHousehold(values: Partial<Household> = {}): Household {
  return {
    id: householdId,
    name: 'Pennelow',
    country: 'GB',
    region: 'scotland',
    timeZone: 'Europe/London',
    circumstances: {},
    people: [{ name: 'Winifred Pennelow', birthDate: '1951-05-17', diedOn: null }],
    businessNames: [],
    hopes: '',
    leadDays: {},
    practiceId,
    practiceName: 'Marram House Organising',
    version: 4,
    createdAt: '2026-11-02T09:00:00Z',
    counts: {
      toReview: 0,
      undecided: 0,
      kept: 0,
      leaving: 0,
      left: 0,
      reading: 0,
      holds: 0,
      boxes: 1,
    },
    today: '2026-12-01',
    ...values,
  };
}
