import { parse } from 'csv-parse/sync';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { startTestApp, type TestApp, type Visitor } from '../support/app.ts';
import {
  addScannedPapers,
  change,
  enter,
  enterOldBill,
  keepForEyesOf,
  pageCount,
  sayNoBusiness,
} from '../support/papers.ts';
import { addMember, addPractice, testPassword, type TestPractice } from '../support/people.ts';

let app: TestApp;
let practice: TestPractice;
let owner: Visitor;
let client: Visitor;
let adviser: Visitor;
let register: string;

beforeAll(async () => {
  app = await startTestApp();
  practice = await addPractice();
  owner = await app.signIn(practice.emails.owner, testPassword);
  client = await app.signIn(practice.emails.client, testPassword);
  adviser = await app.signIn(practice.emails.adviser, testPassword);
  await sayNoBusiness(owner, practice.householdId);
  register = `/api/households/${practice.householdId}/papers`;
});
afterAll(() => app.close());

const enterHere = (classId: string, more = {}) => enter(owner, practice.householdId, classId, more);

describe('a paper', () => {
  test('keeps until the date that its class, its date and the rules give', async () => {
    const paper = await enterHere('utility-bill', { facts: { dates: { issued: '2024-02-29' } } });
    // Common practice, Limitation Act 1980 s.5: six years after the bill.
    expect(paper).toMatchObject({
      status: 'to-review',
      keyDate: '2024-02-29',
      keepUntil: '2030-02-28',
      shredFrom: '2030-03-01',
      confidence: null,
      read: null,
    });
    expect(paper.gate.map((reason) => reason.code)).toContain('not-reviewed');
  });

  test('counts a bundle from its last paper, and not at all while that is unknown', async () => {
    const bundle = { bundle: true, bundleFrom: '2009-01-01', sheets: 60 };
    const known = await enterHere('utility-bill', { ...bundle, bundleTo: '2022-06-30' });
    expect(known.keepUntil).toBe('2028-06-30');
    const unknown = await enterHere('utility-bill', {
      ...bundle,
      facts: { dates: { issued: '2009-01-01' } },
    });
    expect([unknown.keepUntil, unknown.open]).toEqual([null, true]);
  });

  test('moves its dates with a corrected fact and back with undo', async () => {
    const paper = await enterHere('utility-bill', { facts: { dates: { issued: '2020-01-10' } } });
    const moved = await change(owner, paper, { facts: { dates: { issued: '2021-01-10' } } });
    expect([paper.keepUntil, moved.keepUntil]).toEqual(['2026-01-10', '2027-01-10']);
    const undone = await owner
      .post(`/api/papers/${paper.id}/undo`)
      .set('If-Match', `"${moved.version}"`);
    expect(undone.body).toMatchObject({ keepUntil: '2026-01-10', version: moved.version + 1 });
    expect(undone.body.canUndo).toBe(false);
  });

  test('is reviewed by choosing a pile, and waits again when it is put back', async () => {
    const paper = await enterHere('payslip');
    const kept = await change(owner, paper, { pile: 'file-here', keptBecause: 'duty' });
    expect(kept).toMatchObject({ status: 'kept', reviewedByName: 'owner' });
    const back = await change(owner, kept, { status: 'to-review' });
    expect(back).toMatchObject({ status: 'to-review', pile: null, reviewedAt: null });
  });

  test('answers a stale change with the paper as it stands', async () => {
    const paper = await enterHere('payslip');
    await change(owner, paper, { note: 'first' });
    const late = await client.patch(`/api/papers/${paper.id}`, { note: 'second' }, paper.version);
    expect(late.status).toBe(412);
    expect(late.body.current).toMatchObject({ note: 'first', version: paper.version + 1 });
    const without = await client.patch(`/api/papers/${paper.id}`, { note: 'second' });
    expect(without.status).toBe(428);
  });

  test('refuses a country or a field that does not exist, by name', async () => {
    const paper = await enterHere('payslip');
    const answer = await owner.patch(`/api/papers/${paper.id}`, { colour: 'red' }, paper.version);
    expect(answer.status).toBe(422);
    expect(answer.text).toContain('colour');
  });

  test('asks both tables when the household lives elsewhere, and takes the later date', async () => {
    const paper = await enterHere('utility-bill', {
      country: 'DE',
      facts: { dates: { issued: '2024-05-02' } },
    });
    // DE: BGB 195, 199 would end on 2027-12-31; GB keeps six years.
    expect(paper.keepUntil).toBe('2030-05-02');
    expect(new Set(paper.assessment.rules.map((rule) => rule.id.split('.')[0]))).toEqual(
      new Set(['de', 'gb']),
    );
  });
});

describe('who may see and decide', () => {
  test('a paper outside the shared groups does not exist for an adviser, counts included', async () => {
    const secret = await enterHere('medical-record');
    expect((await adviser.get(`/api/papers/${secret.id}`)).status).toBe(404);
    const all = await owner.get(`${register}?class=medical-record`);
    const shared = await adviser.get(`${register}?class=medical-record`);
    expect([all.body.total, shared.body.total]).toEqual([1, 0]);
  });

  test("the practice's note is the practice's", async () => {
    const paper = await enterHere('payslip');
    await change(owner, paper, { practiceNote: 'ask twice', note: 'for all' });
    expect((await client.get(`/api/papers/${paper.id}`)).body).toMatchObject({
      practiceNote: null,
      note: 'for all',
    });
    const version = paper.version + 1;
    const answer = await client.patch(`/api/papers/${paper.id}`, { practiceNote: 'x' }, version);
    expect(answer.status).toBe(403);
  });

  test('a right for some kinds of paper ends at the others, also by renaming one', async () => {
    const email = 'helper@first.example';
    await addMember({
      role: 'client',
      email,
      practiceId: practice.practiceId,
      householdId: practice.householdId,
      standing: 'helper',
      rights: { see: 'all', decide: ['bills'], approve: 'none', export: 'none' },
    });
    const helper = await app.signIn(email, testPassword);
    const bill = await enterHere('utility-bill');
    const slip = await enterHere('payslip');
    const tryPatch = async (id: string, patch: object) =>
      (await helper.patch(`/api/papers/${id}`, patch, 1)).status;
    expect(await tryPatch(slip.id, { pile: 'shred' })).toBe(403);
    expect(await tryPatch(bill.id, { class: 'payslip' })).toBe(403);
    expect(await tryPatch(bill.id, { pile: 'undecided' })).toBe(200);
    expect((await helper.get(`${register}.csv`)).status).toBe(403);
  });

  test("a paper for one person's eyes is there for nobody else", async () => {
    const paper = await enterHere('personal-letter');
    await keepForEyesOf(paper.id, practice.userIds.client);
    expect((await client.get(`/api/papers/${paper.id}`)).status).toBe(200);
    expect((await owner.get(`/api/papers/${paper.id}`)).status).toBe(404);
    expect((await owner.get(`${register}?class=personal-letter`)).body.total).toBe(0);
  });

  test('another practice gets a 404 for everything', async () => {
    const paper = await enterHere('payslip');
    const other = await addPractice('second');
    const stranger = await app.signIn(other.emails.owner, testPassword);
    expect((await stranger.get(`/api/papers/${paper.id}`)).status).toBe(404);
    expect((await stranger.get(register)).status).toBe(404);
    expect((await stranger.patch(`/api/papers/${paper.id}`, { note: 'x' }, 1)).status).toBe(404);
  });
});

describe('the register', () => {
  test('finds by the beginning of a word, by kind, by a phrase, and shows where', async () => {
    const { id } = await enterHere('warranty', {
      title: 'Tumble dryer',
      note: 'bought <b>second hand</b> in Larkhaven',
    });
    const search = async (q: string) => {
      const answer = await owner.get(`${register}?q=${encodeURIComponent(q)}`);
      return answer.body.items as { id: string; snippet: string }[];
    };
    expect((await search('larkh'))[0]).toMatchObject({ id });
    expect((await search('larkh'))[0]?.snippet).toContain('«Larkhaven»');
    expect((await search('"second hand"')).map((row) => row.id)).toEqual([id]);
    expect((await search('guarantee')).length + (await search('warranty')).length).toBeGreaterThan(
      0,
    );
    expect(await search('larkhaven -dryer')).toEqual([]);
    expect(await search("'); drop table papers; --")).toEqual([]);
  });

  test('sorts by known columns only, empty ones last, and pages', async () => {
    expect((await owner.get(`${register}?sort=text`)).status).toBe(422);
    expect((await owner.get(`${register}?status=lost`)).status).toBe(422);
    const items = (await owner.get(`${register}?sort=-keepUntil&pageSize=200`)).body.items as {
      keepUntil: string | null;
    }[];
    const dates = items.map((row) => row.keepUntil);
    const known = dates.filter((date) => date !== null);
    expect(known).toEqual([...known].sort().reverse());
    expect(dates.slice(known.length).every((date) => date === null)).toBe(true);
    const second = await owner.get(`${register}?pageSize=2&page=2`);
    expect(second.body.items).toHaveLength(2);
    const far = await owner.get(`${register}?pageSize=2&page=900`);
    expect([far.body.items.length, far.body.total]).toEqual([0, second.body.total]);
  });

  test('comes as CSV in which no cell runs as a formula', async () => {
    await enterHere('keepsake', { title: '=1+1, "ticket"' });
    const answer = await owner.get(`${register}.csv?class=keepsake`);
    expect(answer.headers['content-type']).toContain('text/csv');
    const rows: Record<string, string>[] = parse(answer.text, { columns: true, bom: true });
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({ Title: '\'=1+1, "ticket"', Kind: 'Keepsake' });
  });
});

describe('split and join', () => {
  const pageOne = 'NORTHMERE POWER\nElectricity bill\nDate 15 March 2010\nPage 1';
  const pageTwo = 'CITY OF LARKHAVEN\nCouncil tax bill\nDate 2 April 2011';
  const post = (url: string, version: number, body: object) =>
    owner.post(url, body).set('If-Match', `"${version}"`);

  test('splitting gives the rest a number of its own and asks for review again', async () => {
    const [id = ''] = await addScannedPapers(app, practice.householdId, [[pageOne, pageTwo]]);
    const before = (await owner.get(`/api/papers/${id}`)).body;
    expect(before).toMatchObject({ sheets: 2, status: 'to-review' });
    const answer = await post(`/api/papers/${id}/split`, before.version, { beforePage: 2 });
    expect(answer.status).toBe(200);
    const { first, second } = answer.body;
    expect([first.number, second.number > first.number]).toEqual([before.number, true]);
    expect([first.nextInScan, second.previousInScan]).toEqual([second.id, id]);
    expect([await pageCount(id), await pageCount(second.id)]).toEqual([1, 1]);

    const joined = await post(`/api/papers/${second.id}/join`, second.version, { with: id });
    expect(joined.body).toMatchObject({ id, number: before.number, sheets: 2, canUndo: false });
    expect((await owner.get(`/api/papers/${second.id}`)).status).toBe(404);
  });

  test('a hold covers both parts, and the whole after joining', async () => {
    const [id = ''] = await addScannedPapers(app, practice.householdId, [[pageOne, pageTwo]]);
    await owner.post(`/api/households/${practice.householdId}/holds`, {
      paperId: id,
      kind: 'claim',
      reason: 'A claim about the meter',
    });
    const { first, second } = (await post(`/api/papers/${id}/split`, 1, { beforePage: 2 })).body;
    expect([first.held, second.held]).toEqual([true, true]);
    expect(second.gate).toContainEqual(expect.objectContaining({ code: 'held' }));
    const joined = await post(`/api/papers/${id}/join`, first.version, { with: second.id });
    expect(joined.body.held).toBe(true);
  });

  test('only neighbours are joined', async () => {
    const ids = await addScannedPapers(app, practice.householdId, [[pageOne], [pageTwo], ['x']]);
    const answer = await post(`/api/papers/${ids[0]}/join`, 1, { with: ids[2] });
    expect(answer.status).toBe(409);
  });
});

describe('leaving without shredding', () => {
  test('a bill is never recycled unshredded', async () => {
    const bill = await enterOldBill(owner, practice.householdId);
    const recycled = await change(owner, bill, { pile: 'recycle' });
    const answer = await owner
      .post(`/api/papers/${bill.id}/departure`, { how: 'recycle', on: '2026-11-07' })
      .set('If-Match', `"${recycled.version}"`);
    expect(answer.status).toBe(409);
    expect(answer.body.reasons[0]).toMatchObject({ code: 'recycling', paper: bill.id });
  });

  test('a circular leaves, stays on record, and can no longer be changed', async () => {
    const flyer = await enterHere('circular', { facts: { dates: { issued: '2026-10-01' } } });
    const decided = await change(owner, flyer, { pile: 'recycle' });
    const depart = (on: string) =>
      owner
        .post(`/api/papers/${flyer.id}/departure`, { how: 'recycle', on })
        .set('If-Match', `"${decided.version}"`);
    expect((await depart('2026-11-08')).body.reasons[0].code).toBe('future');
    const left = await depart('2026-11-07');
    expect(left.body).toMatchObject({ status: 'left', leftOn: '2026-11-07', canUndo: false });
    const version = left.body.version as number;
    expect((await owner.patch(`/api/papers/${flyer.id}`, { note: 'x' }, version)).status).toBe(409);
    const undo = await owner.post(`/api/papers/${flyer.id}/undo`).set('If-Match', `"${version}"`);
    expect(undo.status).toBe(409);
  });

  test('an assistant cannot let anything leave', async () => {
    const assistant = await app.signIn(practice.emails.assistant, testPassword);
    const flyer = await change(owner, await enterHere('circular'), { pile: 'recycle' });
    const answer = await assistant
      .post(`/api/papers/${flyer.id}/departure`, { how: 'recycle', on: '2026-11-07' })
      .set('If-Match', `"${flyer.version}"`);
    expect(answer.status).toBe(403);
  });
});
