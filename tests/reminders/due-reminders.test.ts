import { describe, expect, test } from 'vitest';
import { addDays, addMonths } from '../../server/reminders/days.ts';
import type { ReminderPerson } from '../../server/reminders/due-reminders.ts';
import { comingReminders, dueReminders } from '../../server/reminders/due-reminders.ts';
import type { DatedPaper } from '../../server/reminders/paper-dates.ts';
import { makePaper, passport, statement } from './dated-paper.ts';

const household = { leadDays: {} };
const all = { see: 'all', decide: 'all', approve: 'all', export: 'all' } as const;

function makePerson(
  userId: string,
  membership: Partial<ReminderPerson['membership']> = {},
): ReminderPerson {
  return {
    userId,
    name: `Person ${userId}`,
    membership: {
      role: 'client',
      rights: all,
      sharedGroups: null,
      startsOn: '2026-01-01',
      endsOn: null,
      ...membership,
    },
  };
}
const ada = makePerson('ada');
const owner = makePerson('owner', { role: 'owner', rights: null });

function keysOn(
  today: string,
  papers: DatedPaper[],
  people: ReminderPerson[] = [ada],
  leadDays: Record<string, number> = {},
): string[] {
  return dueReminders({ papers, people, household: { leadDays }, today }).map(({ key }) => key);
}

describe('an expiry', () => {
  const key = `expiry:${passport.id}:2027-10-01`;

  test('of a passport is told from 270 days before', () => {
    expect(addDays('2027-10-01', -270)).toBe('2027-01-04');
    expect(keysOn('2027-01-03', [passport])).toEqual([]);
    expect(keysOn('2027-01-04', [passport])).toEqual([key]);
  });

  test('is told on its own day and no longer on the day after', () => {
    expect(keysOn('2027-10-01', [passport])).toEqual([key]);
    expect(keysOn('2027-10-02', [passport])).toEqual([]);
  });

  test("follows the household's own days of notice", () => {
    expect(keysOn('2027-09-20', [passport], [ada], { passport: 10 })).toEqual([]);
    expect(keysOn('2027-09-21', [passport], [ada], { passport: 10 })).toEqual([key]);
    expect(keysOn('2027-09-30', [passport], [ada], { passport: 0 })).toEqual([]);
    expect(keysOn('2027-10-01', [passport], [ada], { passport: 0 })).toEqual([key]);
  });

  test('of a class without days of its own is told 30 days before', () => {
    const membership = makePaper({ class: 'membership', expiresOn: '2027-03-31' });
    expect(keysOn('2027-02-28', [membership])).toEqual([]);
    expect(keysOn('2027-03-01', [membership])).toHaveLength(1);
  });

  test('counts although the paper is held, permanent, dear or not looked at yet', () => {
    const papers = [
      { ...passport, held: true },
      { ...passport, permanent: true },
      { ...passport, keptBecause: 'dear' as const },
      { ...passport, status: 'to-review' as const },
    ];
    for (const paper of papers) expect(keysOn('2027-05-01', [paper])).toEqual([key]);
  });

  test('of a paper that has left is not told', () => {
    expect(keysOn('2027-05-01', [{ ...passport, status: 'left' }])).toEqual([]);
  });
});

describe('the end of keeping', () => {
  const key = `keep-until:${statement.id}:2027-01-31`;

  test('is told from the day after the last day of keeping', () => {
    expect(keysOn('2027-01-31', [statement])).toEqual([]);
    expect(keysOn('2027-02-01', [statement])).toEqual([key]);
    expect(keysOn('2031-02-01', [statement])).toEqual([key]);
  });

  test('waits for the day advised, unless somebody stepped down from it', () => {
    const advised = { ...statement, advisedUntil: '2027-06-30' };
    expect(keysOn('2027-06-30', [advised])).toEqual([]);
    expect(keysOn('2027-07-01', [advised])).toEqual([`keep-until:${statement.id}:2027-06-30`]);
    expect(keysOn('2027-02-01', [{ ...advised, isSteppedDown: true }])).toEqual([key]);
  });

  test.each<[string, Partial<DatedPaper>]>([
    ['kept for use', { keptBecause: 'use' }],
    ['held dear', { keptBecause: 'dear' }],
    ['permanent', { permanent: true }],
    ['open', { open: true }],
    ['on hold', { held: true }],
    ['leaving already', { status: 'leaving' }],
    ['gone', { status: 'left' }],
    ['not looked at yet', { status: 'to-review' }],
    ['without a date', { keepUntil: null }],
  ])('is never told of a paper that is %s', (_what, changes) => {
    expect(keysOn('2040-01-01', [{ ...statement, ...changes }])).toEqual([]);
  });

  test.each<[string, Partial<DatedPaper>]>([
    ['kept without a reason', { keptBecause: null }],
    ['kept as a duty', { keptBecause: 'duty' }],
    ['still undecided', { status: 'undecided', keptBecause: null }],
  ])('is told of a paper that is %s', (_what, changes) => {
    expect(keysOn('2027-02-01', [{ ...statement, ...changes }])).toEqual([key]);
  });
});

describe('who is told', () => {
  const told = (people: ReminderPerson[], today = '2027-02-01') =>
    dueReminders({ papers: [statement], people, household, today }).map(({ userId }) => userId);

  test('every client who may see the paper, and then not the practice', () => {
    expect(told([owner, makePerson('ben'), ada])).toEqual(['ada', 'ben']);
  });

  test('no client whose right to see leaves the group out', () => {
    const onlyHealth = makePerson('eve', { rights: { ...all, see: ['health'] } });
    const withBanking = makePerson('ben', { rights: { ...all, see: ['health', 'banking'] } });
    expect(told([onlyHealth, withBanking])).toEqual(['ben']);
  });

  test('the owner where no client can be told', () => {
    const blind = makePerson('eve', { rights: { ...all, see: 'none' } });
    expect(told([owner, blind])).toEqual(['owner']);
  });

  test('never an assistant or an adviser', () => {
    expect(
      told([
        makePerson('assistant', { role: 'assistant', rights: null }),
        makePerson('adviser', { role: 'adviser', rights: null, sharedGroups: 'all' }),
      ]),
    ).toEqual([]);
  });

  test('only members of the day, first and last day included', () => {
    const member = makePerson('ada', { startsOn: '2027-02-01', endsOn: '2027-02-03' });
    expect(told([member], '2027-02-01')).toEqual(['ada']);
    expect(told([member], '2027-02-03')).toEqual(['ada']);
    expect(told([member], '2027-02-04')).toEqual([]);
    expect(told([makePerson('ada', { startsOn: '2027-02-02' })], '2027-02-01')).toEqual([]);
  });

  test('only the person for whose eyes the paper is, never another in their stead', () => {
    const eyesOnly = (userId: string) =>
      dueReminders({
        papers: [{ ...statement, eyesOnlyUserId: userId }],
        people: [ada, makePerson('ben'), owner],
        household,
        today: '2027-02-01',
      }).map((candidate) => candidate.userId);
    expect(eyesOnly('ben')).toEqual(['ben']);
    expect(eyesOnly('owner')).toEqual(['owner']);
    expect(eyesOnly('somebody-else')).toEqual([]);
  });

  test('one who belongs twice, once', () => {
    expect(told([ada, { ...ada }])).toEqual(['ada']);
  });

  test('a date that moved is a new reminder, the same date the same one', () => {
    const moved = { ...statement, keepUntil: '2027-02-28', shredFrom: '2027-03-01' };
    const first = keysOn('2027-03-01', [statement]);
    expect(keysOn('2027-04-01', [statement])).toEqual(first);
    expect(keysOn('2027-03-01', [moved])).not.toEqual(first);
  });
});

describe('what is coming', () => {
  const on = (today: string, papers: DatedPaper[]) =>
    comingReminders({ papers, household, today }).map((reminder) => reminder.on);

  test('is foreseen for 24 months, the last day included', () => {
    expect(on('2025-01-31', [statement])).toEqual([]);
    expect(on('2025-02-01', [statement])).toEqual(['2027-02-01']);
  });

  test('stands under today once it is due, and is gone when an expiry has passed', () => {
    expect(on('2027-05-05', [statement])).toEqual(['2027-05-05']);
    expect(on('2027-10-01', [passport])).toEqual(['2027-10-01']);
    expect(on('2027-10-02', [passport])).toEqual([]);
  });

  test('is sorted by the day of the message and shaped as the interface says', () => {
    const coming = comingReminders({
      papers: [statement, passport],
      household,
      today: '2026-12-01',
    });
    expect(coming.map(({ kind, on, about, state }) => ({ kind, on, about, state }))).toEqual([
      { kind: 'expiry', on: '2027-01-04', about: '2027-10-01', state: 'coming' },
      { kind: 'keep-until', on: '2027-02-01', about: '2027-01-31', state: 'coming' },
    ]);
  });

  test('leaves out what the person who looks may not see', () => {
    const coming = comingReminders({
      papers: [statement, passport],
      household,
      today: '2026-12-01',
      reach: ['identity'],
    });
    expect(coming.map(({ paperNumber }) => paperNumber)).toEqual([13]);
  });
});

describe('days', () => {
  test('cross months and leap years', () => {
    expect(addDays('2028-02-28', 1)).toBe('2028-02-29');
    expect(addDays('2027-03-01', -1)).toBe('2027-02-28');
    expect(addMonths('2027-01-31', 1)).toBe('2027-02-28');
    expect(addMonths('2026-12-15', 24)).toBe('2028-12-15');
  });
});
