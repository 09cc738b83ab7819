import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Paper } from '../../server/contract/papers.ts';
import { startTestApp, type TestApp, type Visitor } from '../support/app.ts';
import { change, enter, enterOldBill } from '../support/papers.ts';
import { addPractice, testPassword, type TestPractice } from '../support/people.ts';

let app: TestApp;
let practice: TestPractice;
let people: Record<'owner' | 'assistant' | 'client' | 'adviser', Visitor>;
let holds: string;

beforeAll(async () => {
  app = await startTestApp();
  practice = await addPractice();
  const signIn = (role: keyof TestPractice['emails']) =>
    app.signIn(practice.emails[role], testPassword);
  people = {
    owner: await signIn('owner'),
    assistant: await signIn('assistant'),
    client: await signIn('client'),
    adviser: await signIn('adviser'),
  };
  holds = `/api/households/${practice.householdId}/holds`;
});
afterAll(() => app.close());

const readPaper = async (id: string) => (await people.owner.get(`/api/papers/${id}`)).body as Paper;
const lift = (by: Visitor, id: string) =>
  by.post(`/api/holds/${id}/lift`, { reason: 'All agreed' });

describe('a hold', () => {
  test('on the household takes the date of every paper, and gives it back when lifted', async () => {
    const bill = await enterOldBill(people.owner, practice.householdId);
    expect(bill.gate).toEqual([]);
    const placed = await people.client.post(holds, { kind: 'wish', reason: 'Let me read them' });
    expect(placed.status).toBe(201);
    expect(await readPaper(bill.id)).toMatchObject({ held: true, keepUntil: null, open: true });
    expect((await lift(people.client, placed.body.id)).status).toBe(200);
    // Retention convention: after the release the paper is kept to the day of release.
    expect(await readPaper(bill.id)).toMatchObject({ held: false, shredFrom: '2026-11-08' });
  });

  test('is lifted by the side that placed it, or by the owner with a reason', async () => {
    const paper = await enter(people.owner, practice.householdId, 'bank-statement');
    const place = async (by: Visitor) => {
      const body = { paperId: paper.id, kind: 'claim', reason: 'A claim is running' };
      return (await by.post(holds, body)).body.id as string;
    };
    const byAdviser = await place(people.adviser);
    expect((await lift(people.assistant, byAdviser)).status).toBe(403);
    expect((await lift(people.client, byAdviser)).status).toBe(403);
    expect((await lift(people.adviser, byAdviser)).status).toBe(200);
    expect((await lift(people.adviser, byAdviser)).status).toBe(409);
    const byClient = await place(people.client);
    expect((await lift(people.adviser, byClient)).status).toBe(403);
    expect((await lift(people.owner, byClient)).status).toBe(200);
  });

  test('on a paper outside the shared groups is neither placed nor seen by an adviser', async () => {
    const paper = await enter(people.owner, practice.householdId, 'medical-record');
    const body = { paperId: paper.id, kind: 'other', reason: 'Wait for the answer' };
    expect((await people.adviser.post(holds, body)).status).toBe(404);
    const { id } = (await people.owner.post(holds, body)).body;
    const seen = (await people.adviser.get(holds)).body.items as { id: string }[];
    expect(seen.map((hold) => hold.id)).not.toContain(id);
    expect((await lift(people.adviser, id)).status).toBe(404);
  });
});

describe('what papers are about', () => {
  test('ending it starts the clocks of its papers', async () => {
    const subjects = `/api/households/${practice.householdId}/subjects`;
    const created = await people.owner.post(subjects, { kind: 'tenancy', name: 'Mill Lane 4' });
    expect(created.status).toBe(201);
    const lease = await enter(people.owner, practice.householdId, 'tenancy-agreement', {
      facts: { dates: { issued: '2015-02-01' } },
    });
    const linked = await change(people.owner, lease, {
      subjectId: created.body.id,
      answers: { usedForTax: false },
    });
    expect(linked).toMatchObject({ open: true, subjectName: 'Mill Lane 4' });
    const url = `/api/subjects/${created.body.id}`;
    const wrong = await people.owner.patch(
      url,
      { startedOn: '2015-02-01', endedOn: '2014-01-01' },
      1,
    );
    expect(wrong.status).toBe(422);
    const ended = await people.owner.patch(url, { endedOn: '2021-08-31' }, 1);
    expect(ended.body).toMatchObject({ endKnown: true, papers: 1, version: 2 });
    // Common practice, Limitation Act 1980 s.5: end of the tenancy and six years.
    expect(await readPaper(lease.id)).toMatchObject({ open: false, keepUntil: '2027-08-31' });
    expect((await people.owner.patch(url, { name: 'Other' }, 1)).status).toBe(412);
  });
});

describe('when a return was sent', () => {
  test('one answer settles the papers of its tax year, and of no other', async () => {
    const filings = `/api/households/${practice.householdId}/filings`;
    const slip = (issued: string) =>
      enter(people.owner, practice.householdId, 'donation-receipt', {
        facts: { dates: { issued } },
      });
    const ofYear = await slip('2022-06-01');
    const ofNext = await slip('2023-06-01');
    expect([ofYear.open, ofNext.open]).toEqual([true, true]);
    const { questions } = (await people.owner.get(filings)).body;
    expect(questions).toEqual(
      expect.arrayContaining([
        { country: 'GB', taxYear: '2022-23', papers: 1 },
        { country: 'GB', taxYear: '2023-24', papers: 1 },
      ]),
    );
    const answer = { country: 'GB', taxYear: '2022-23', answer: 'on-time' };
    const put = await people.client.put(filings, answer);
    expect(put.body).toMatchObject({ answer: 'on-time', papersWaiting: 0 });
    const settled = await readPaper(ofYear.id);
    // Roles not asked count as yes: self-employed, TMA 1970 s.12B, fifth anniversary of 31 January.
    expect(settled).toMatchObject({ open: false, keepUntil: '2029-01-31' });
    expect((await readPaper(ofNext.id)).open).toBe(true);
    const day = await people.client.put(filings, { ...answer, answer: 'on-day' });
    expect(day.status).toBe(422);
  });
});
