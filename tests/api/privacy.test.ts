/** What a reader of some kinds of paper, and everybody but one, must not learn by any door. */
import ICAL from 'ical.js';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Activity } from '../../server/contract/activity.ts';
import type { BoxRecord } from '../../server/contract/boxes.ts';
import type { Household } from '../../server/contract/households.ts';
import type { Paper } from '../../server/contract/papers.ts';
import type { Reminder } from '../../server/contract/reminders.ts';
import type { Scan } from '../../server/contract/scans.ts';
import { MembershipModel } from '../../server/db/models/membership-model.ts';
import { sendReminders } from '../../server/use-cases/reminders/send-reminders.ts';
import { startTestApp, type TestApp, type Visitor } from '../support/app.ts';
import { addScannedPapers, change, enter, gather, keepForEyesOf } from '../support/papers.ts';
import { addMember, addPractice, testPassword, type TestPractice } from '../support/people.ts';

let app: TestApp;
let practice: TestPractice;
let owner: Visitor;
let client: Visitor;
let limited: Visitor;
let limitedId: string;
let boxId: string;
let bill: Paper;
let passport: Paper;
let secret: Paper;

const soon = { facts: { dates: { expiry: '2026-12-20' } } };

beforeAll(async () => {
  app = await startTestApp();
  practice = await addPractice();
  owner = await app.signIn(practice.emails.owner, testPassword);
  client = await app.signIn(practice.emails.client, testPassword);
  limitedId = await addMember({
    role: 'client',
    email: 'limited@first.example',
    practiceId: practice.practiceId,
    householdId: practice.householdId,
    standing: 'helper',
    rights: { see: ['insurance'], decide: ['insurance'], approve: 'none', export: 'none' },
  });
  limited = await app.signIn('limited@first.example', testPassword);
  const box = await owner.post(`/api/households/${practice.householdId}/boxes`, { label: 'Hall' });
  boxId = (box.body as BoxRecord).id;
  const keep = async (classId: string) => {
    const paper = await enter(owner, practice.householdId, classId, { ...soon, boxId });
    return change(owner, paper, { pile: 'file-here', keptBecause: 'use' });
  };
  bill = await keep('insurance-policy');
  passport = await keep('passport');
  secret = await keep('insurance-policy');
  await keepForEyesOf(secret.id, practice.userIds.client);
});
afterAll(() => app.close());

describe('the reminders', () => {
  const listFor = async (visitor: Visitor) =>
    (
      (await visitor.get(`/api/households/${practice.householdId}/reminders`)).body as {
        items: Reminder[];
      }
    ).items.map(({ paperId, state }) => [paperId, state]);

  test('tell each reader of the papers that reader may see, before and after they were sent', async () => {
    expect(await listFor(limited)).toEqual([[bill.id, 'coming']]);
    expect((await listFor(owner)).map(([id]) => id).sort()).toEqual([bill.id, passport.id].sort());
    await sendReminders(app.deps);
    expect(new Set((await listFor(limited)).map(([id]) => id))).toEqual(new Set([bill.id]));
    expect(new Set((await listFor(owner)).map(([id]) => id))).toEqual(
      new Set([bill.id, passport.id]),
    );
    expect(new Set((await listFor(client)).map(([id]) => id))).toEqual(
      new Set([bill.id, passport.id, secret.id]),
    );
  });
});

describe('the calendar address', () => {
  const makeFor = async (visitor: Visitor) => {
    const made = await visitor.post(`/api/households/${practice.householdId}/calendar-address`);
    expect(made.status).toBe(201);
    return new URL((made.body as { url: string }).url);
  };
  const numbersIn = async (url: URL) => {
    const stranger = await app.visit();
    const answer = await stranger.get(url.pathname + url.search);
    if (answer.status !== 200) return answer.status;
    expect(answer.headers['content-type']).toContain('text/calendar');
    const calendar = new ICAL.Component(ICAL.parse(answer.text));
    return calendar
      .getAllSubcomponents('vevent')
      .map((event) => Number(/\d+/.exec(new ICAL.Event(event).summary)?.[0]))
      .sort();
  };

  test('shows what its owner may see, and each person has their own', async () => {
    const ofOwner = await makeFor(owner);
    const ofLimited = await makeFor(limited);
    const ofClient = await makeFor(client);
    expect(await numbersIn(ofOwner)).toEqual([bill.number, passport.number]);
    expect(await numbersIn(ofLimited)).toEqual([bill.number]);
    expect(await numbersIn(ofClient)).toEqual([bill.number, passport.number, secret.number]);
  });

  test('stops working with a new one, with its end, and with the membership', async () => {
    const first = await makeFor(limited);
    const second = await makeFor(limited);
    expect(await numbersIn(first)).toBe(404);
    expect(await numbersIn(second)).toEqual([bill.number]);
    const end = `/api/households/${practice.householdId}/calendar-address`;
    expect((await limited.delete(end)).status).toBe(204);
    expect(await numbersIn(second)).toBe(404);
    const third = await makeFor(limited);
    await MembershipModel.update({ endsOn: '2026-11-06' }, { where: { userId: limitedId } });
    expect(await numbersIn(third)).toBe(404);
    await MembershipModel.update({ endsOn: null }, { where: { userId: limitedId } });
    expect(await numbersIn(third)).toEqual([bill.number]);
  });

  test('of one household opens no other', async () => {
    const other = await addPractice('second');
    const url = await makeFor(owner);
    url.pathname = `/api/households/${other.householdId}/calendar.ics`;
    expect(await numbersIn(url)).toBe(404);
  });

  test('is not needed for the dates of one paper', async () => {
    const file = await limited.get(`/api/papers/${bill.id}/calendar.ics`);
    const calendar = new ICAL.Component(ICAL.parse(file.text));
    const events = calendar.getAllSubcomponents('vevent').map((event) => new ICAL.Event(event));
    expect(events.map(({ startDate }) => startDate.toString())).toEqual(['2026-12-20']);
    expect((await limited.get(`/api/papers/${passport.id}/calendar.ics`)).status).toBe(404);
    const plain = await enter(owner, practice.householdId, 'keepsake');
    expect((await owner.get(`/api/papers/${plain.id}/calendar.ics`)).status).toBe(409);
  });
});

describe('counts', () => {
  test('of a household and a box leave out what the reader may not see', async () => {
    const householdOf = async (visitor: Visitor) =>
      (await visitor.get(`/api/households/${practice.householdId}`)).body as Household;
    const boxOf = async (visitor: Visitor) =>
      (await visitor.get(`/api/boxes/${boxId}`)).body as BoxRecord;
    const kept = await Promise.all(
      [limited, owner, client].map(async (v) => (await householdOf(v)).counts.kept),
    );
    expect(kept).toEqual([1, 2, 3]);
    const inList = await limited.get('/api/households');
    expect((inList.body.items as Household[])[0]?.counts.kept).toBe(1);
    const boxed = await Promise.all(
      [limited, owner, client].map(async (v) => (await boxOf(v)).counts.papers),
    );
    expect(boxed).toEqual([1, 2, 3]);
  });

  test('of holds leave out holds on hidden papers', async () => {
    await client.post(`/api/households/${practice.householdId}/holds`, {
      paperId: passport.id,
      kind: 'wish',
      reason: 'for later',
    });
    const { counts } = (await limited.get(`/api/households/${practice.householdId}`))
      .body as Household;
    expect(counts.holds).toBe(0);
  });
});

describe('the scans of a box', () => {
  test('are told of when one of their papers may be seen', async () => {
    const [paperId = ''] = await addScannedPapers(app, practice.householdId, [
      ['Gas bill of 2010'],
    ]);
    const paper = (await owner.get(`/api/papers/${paperId}`)).body as Paper;
    const list = async (visitor: Visitor) =>
      ((await visitor.get(`/api/boxes/${paper.boxId}/scans`)).body as { items: Scan[] }).items;
    expect((await list(owner)).map(({ papers }) => papers)).toEqual([1]);
    expect(await list(limited)).toEqual([]);
    await change(owner, paper, { class: 'insurance-policy' });
    expect((await list(limited)).map(({ papers }) => papers)).toEqual([1]);
  });
});

describe('the activity', () => {
  const read = async (visitor: Visitor) =>
    (await visitor.get(`/api/households/${practice.householdId}/activity?pageSize=200`)).body as {
      items: Activity[];
      total: number;
    };

  test('names no kind, no count and no paper that the reader may not see', async () => {
    await change(owner, await paperNow(passport), { class: 'driving-licence' });
    const was = await enter(owner, practice.householdId, 'medical-record');
    await change(owner, was, { class: 'insurance-policy' });
    await gather(owner, practice.householdId, { on: '2026-11-07' });
    const told = await read(limited);
    const papers = new Set(told.items.map(({ paperId }) => paperId));
    expect([papers.has(passport.id), papers.has(secret.id), papers.has(bill.id)]).toEqual([
      false,
      false,
      true,
    ]);
    const text = told.items.map(({ sentence }) => sentence).join(' ');
    expect(text).not.toMatch(/licence|medical|passport|on it|left out/i);
    expect(told.total).toBe(told.items.length);
    expect((await read(client)).items.map(({ paperId }) => paperId)).toContain(secret.id);
    expect((await read(owner)).items.map(({ paperId }) => paperId)).not.toContain(secret.id);
  });
});

async function paperNow(paper: Paper): Promise<Paper> {
  return (await owner.get(`/api/papers/${paper.id}`)).body as Paper;
}
