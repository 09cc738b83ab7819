import { afterAll, beforeEach, describe, expect, test } from 'vitest';
import type { ShredList } from '../../server/contract/shred-lists.ts';
import { HouseholdModel } from '../../server/db/models/household-model.ts';
import { MailModel } from '../../server/db/models/mail-model.ts';
import type { Paper } from '../../server/contract/papers.ts';
import { startTestApp, type TestApp, type Visitor } from '../support/app.ts';
import { change, enter, enterOldBill, gather, sayNoBusiness } from '../support/papers.ts';
import { addMember, addPractice, testPassword, type TestPractice } from '../support/people.ts';

let app: TestApp | null = null;
let practice: TestPractice;
let owner: Visitor;
let client: Visitor;
let round = 0;
const today = '2026-11-07';
const paperless = { place: 'at home', method: 'cross-cut shredder', witness: 'Ada Client' };

beforeEach(async () => {
  app ??= await startTestApp();
  app.clock.set(`${today}T10:00:00Z`);
  round += 1;
  practice = await addPractice(`round${round}`);
  owner = await app.signIn(practice.emails.owner, testPassword);
  client = await app.signIn(practice.emails.client, testPassword);
  await sayNoBusiness(owner, practice.householdId);
});
afterAll(() => app?.close());

const approve = (by: Visitor, list: Pick<ShredList, 'id' | 'version'>, more = {}) =>
  by.post(`/api/shred-lists/${list.id}/approval`, { version: list.version, ...more });
const carryOut = (by: Visitor, list: ShredList, more: object = {}) =>
  by.post(`/api/shred-lists/${list.id}/destruction`, {
    on: today,
    ...paperless,
    rows: list.rows.map((row) => ({ paper: row.paper, outcome: 'destroyed' })),
    ...more,
  });
const readPaper = async (id: string) => (await owner.get(`/api/papers/${id}`)).body as Paper;
const oldBill = () => enterOldBill(owner, practice.householdId);

/** A list of two old bills. */
async function gatherTwo(): Promise<ShredList> {
  await oldBill();
  await oldBill();
  return gather(owner, practice.householdId, { on: today });
}

describe('gathering', () => {
  test('takes what may go and names what stays out, each with its reason', async () => {
    const bill = await oldBill();
    const young = await enter(owner, practice.householdId, 'utility-bill', {
      facts: { dates: { issued: '2025-01-01' } },
    });
    await change(owner, young, { pile: 'shred' });
    const overdue = await enter(owner, practice.householdId, 'utility-bill', {
      facts: { dates: { issued: '2011-01-01' } },
    });
    await change(owner, overdue, { pile: 'file-here', keptBecause: 'duty' });
    const list = await gather(owner, practice.householdId, { on: today });
    expect(list.rows.map((row) => row.paper)).toEqual([bill.id]);
    expect(list.leftOut.map((row) => [row.paper, row.reasons[0]?.code])).toEqual([
      [young.id, 'not-yet'],
      [overdue.id, 'kept'],
    ]);
    // ISO 216 area times paper weight: a sheet of 80 g/m2 weighs 5 g.
    expect([list.sheets, list.weightGrams]).toEqual([1, 5]);
    const again = await gather(owner, practice.householdId, { on: today, papers: [bill.id] });
    expect(again.leftOut[0]?.reasons[0]?.code).toBe('on-list');
  });

  test('shows an adviser only rows of the shared groups, counts included', async () => {
    await oldBill();
    const statement = await enter(owner, practice.householdId, 'card-statement', {
      facts: { dates: { periodEnd: '2010-01-31', issued: '2010-01-31' } },
      sheets: 3,
    });
    await change(owner, statement, { pile: 'shred', answers: { usedForTax: false } });
    const list = await gather(owner, practice.householdId, { on: today });
    const adviser = await app!.signIn(practice.emails.adviser, testPassword);
    const seen = (await adviser.get(`/api/shred-lists/${list.id}`)).body as ShredList;
    expect([list.rows.length, list.sheets]).toEqual([2, 4]);
    expect(seen.rows.map((row) => row.paper)).toEqual([statement.id]);
    expect([seen.sheets, seen.weightGrams]).toEqual([3, 15]);
  });
});

describe('approval', () => {
  test('is bound to the version that was seen', async () => {
    const list = await gatherTwo();
    const removed = await owner.delete(
      `/api/shred-lists/${list.id}/rows/${list.rows[0]?.paper}`,
      list.version,
    );
    expect(removed.body.version).toBe(list.version + 1);
    const stale = await approve(client, list);
    expect(stale.status).toBe(412);
    expect(stale.body.current.rows).toHaveLength(1);
    const done = await approve(client, removed.body);
    expect(done.body).toMatchObject({
      status: 'approved',
      approval: { version: list.version + 1, notBefore: '2026-11-14', lapsesOn: '2027-01-06' },
    });
    expect((await approve(client, removed.body)).status).toBe(409);
  });

  test('keeps single papers back', async () => {
    const list = await gatherTwo();
    const kept = list.rows[0]?.paper ?? '';
    const done = await approve(client, list, { keepBack: [kept] });
    expect(done.body.sheets).toBe(1);
    expect(await readPaper(kept)).toMatchObject({ status: 'kept' });
    expect((await carryOut(owner, list)).status).toBe(422);
  });

  test('needs an instruction on record when the practice gives it, and tells the client', async () => {
    const list = await gatherTwo();
    expect((await approve(owner, list)).status).toBe(422);
    const instruction = { how: 'phone', on: today, words: 'Yes, all of them.' };
    const late = { ...instruction, on: '2026-11-08' };
    expect((await approve(owner, list, { instruction: late })).status).toBe(422);
    const done = await approve(owner, list, { instruction });
    expect(done.body.approval).toMatchObject({ instruction, byName: 'owner' });
    const mail = await MailModel.findOne({ where: { address: practice.emails.client } });
    expect(mail?.text).toContain('Yes, all of them.');
    expect(mail?.subject).not.toMatch(/bill|Northmere/i);
  });

  test('is never given by an assistant or an adviser', async () => {
    const list = await gatherTwo();
    for (const role of ['assistant', 'adviser'] as const) {
      const visitor = await app!.signIn(practice.emails[role], testPassword);
      const answer = await approve(visitor, list);
      expect([role, answer.status]).toEqual([role, 403]);
    }
  });

  test("an attorney's right ends with a death in the household", async () => {
    const email = `attorney@round${round}.example`;
    await addMember({
      role: 'client',
      email,
      practiceId: practice.practiceId,
      householdId: practice.householdId,
      standing: 'attorney',
      rights: { see: 'all', decide: 'all', approve: 'all', export: 'all' },
    });
    const attorney = await app!.signIn(email, testPassword);
    const list = await gatherTwo();
    await HouseholdModel.update(
      { people: [{ name: 'Ada Client', birthDate: null, diedOn: '2026-11-01' }] },
      { where: { id: practice.householdId } },
    );
    expect((await attorney.get(`/api/shred-lists/${list.id}`)).body.can.approve).toBe(false);
    expect((await approve(attorney, list)).status).toBe(403);
  });

  test('fails as a whole when one paper was held meanwhile', async () => {
    const list = await gatherTwo();
    const held = list.rows[1]?.paper;
    await client.post(`/api/households/${practice.householdId}/holds`, {
      paperId: held,
      kind: 'wish',
      reason: 'I want to read it',
    });
    const answer = await approve(client, list);
    expect(answer.status).toBe(409);
    expect(answer.body.reasons).toEqual([expect.objectContaining({ code: 'held', paper: held })]);
    expect((await owner.get(`/api/shred-lists/${list.id}`)).body.status).toBe('draft');
  });
});

describe('destruction', () => {
  test('waits the agreed days unless the client is there', async () => {
    const list = await gatherTwo();
    await approve(client, list);
    const alone = { witness: 'Tom Elsewhere' };
    expect((await carryOut(owner, list, alone)).status).toBe(409);
    app!.clock.set('2026-11-14T10:00:00Z');
    const early = await carryOut(owner, list, { ...alone, on: '2026-11-13' });
    expect(early.status).toBe(409);
    const done = await carryOut(owner, list, { ...alone, on: '2026-11-14' });
    expect(done.body).toMatchObject({ status: 'done', destruction: { clientPresent: false } });
  });

  test('takes place at once with the client as witness, and leaves a record that stays', async () => {
    const list = await gatherTwo();
    await approve(client, list);
    const [first = '', second = ''] = list.rows.map((row) => row.paper);
    const done = await carryOut(owner, list, {
      rows: [
        { paper: first, outcome: 'destroyed' },
        { paper: second, outcome: 'not-found' },
      ],
    });
    expect(done.status).toBe(200);
    expect(done.body.destruction).toMatchObject({ clientPresent: true, on: today });
    expect(await readPaper(first)).toMatchObject({ status: 'left', leftOn: today });
    const lost = await readPaper(second);
    expect(lost).toMatchObject({ status: 'undecided', pile: 'undecided' });
    await change(owner, lost, { class: 'payslip' });
    const record = (await owner.get(`/api/shred-lists/${list.id}`)).body as ShredList;
    expect(record.rows.map((row) => [row.class, row.outcome])).toEqual([
      ['utility-bill', 'destroyed'],
      ['utility-bill', 'not-found'],
    ]);
    for (const path of [`${list.id}.pdf`, `${list.id}/record.pdf`]) {
      const pdf = await owner.get(`/api/shred-lists/${path}`);
      expect([pdf.status, pdf.headers['content-type']]).toEqual([200, 'application/pdf']);
    }
    expect((await carryOut(owner, list)).status).toBe(409);
  });

  test('does not take place without approval, ahead of time, after the lapse or with a row left out', async () => {
    const list = await gatherTwo();
    expect((await carryOut(owner, list)).status).toBe(409);
    await approve(client, list);
    expect((await carryOut(owner, list, { on: '2026-11-08' })).status).toBe(422);
    expect((await carryOut(owner, list, { on: '2026-11-06' })).status).toBe(422);
    expect((await carryOut(owner, list, { rows: [] })).status).toBe(422);
    app!.clock.set('2027-01-07T10:00:00Z');
    expect((await carryOut(owner, list, { on: '2027-01-07' })).status).toBe(409);
    expect((await carryOut(owner, list, { on: '2027-01-06' })).status).toBe(200);
  });

  test('refuses a paper that was changed after the approval, and then nothing is recorded', async () => {
    const list = await gatherTwo();
    await approve(client, list);
    const [first = '', second = ''] = list.rows.map((row) => row.paper);
    const changed = await change(owner, await readPaper(first), { class: 'telecom-bill' });
    expect(changed.gate).toEqual([]);
    const answer = await carryOut(owner, list);
    expect(answer.status).toBe(409);
    expect(answer.body.reasons).toEqual([
      expect.objectContaining({ code: 'changed', paper: first }),
    ]);
    expect((await readPaper(second)).status).toBe('leaving');
    const rows = [
      { paper: first, outcome: 'kept-back' },
      { paper: second, outcome: 'destroyed' },
    ];
    expect((await carryOut(owner, list, { rows })).status).toBe(200);
    expect((await readPaper(first)).status).toBe('kept');
  });

  test('a list that was given up lets its papers go on another', async () => {
    const list = await gatherTwo();
    await approve(client, list);
    const gone = await owner
      .post(`/api/shred-lists/${list.id}/voiding`, { reason: 'Wrong day' })
      .set('If-Match', `"${list.version}"`);
    expect(gone.body.status).toBe('void');
    expect((await carryOut(owner, list)).status).toBe(409);
    expect((await gather(owner, practice.householdId, { on: today })).rows).toHaveLength(2);
  });
});

describe('the outflow', () => {
  test('counts each sheet once', async () => {
    await oldBill();
    const young = await enter(owner, practice.householdId, 'utility-bill', {
      facts: { dates: { issued: '2025-01-01' } },
      sheets: 4,
    });
    await change(owner, young, { pile: 'file-here' });
    const certificate = await enter(owner, practice.householdId, 'birth-certificate');
    await change(owner, certificate, { pile: 'file-here' });
    await enter(owner, practice.householdId, 'payslip', { sheets: 7 });
    const answer = await owner.get(`/api/households/${practice.householdId}/outflow`);
    expect(answer.body).toEqual({
      today,
      left: 0,
      dueNow: 1,
      years: [{ year: 2031, sheets: 4, papers: 1 }],
      permanent: 1,
      open: 0,
      toReview: 7,
    });
  });
});
