/** The calls that outsiders rely on, one by one and through HTTP, as the README of the interface describes them. */
import { Validator } from '@seriousme/openapi-schema-validator';
import { parse } from 'csv-parse/sync';
import ICAL from 'ical.js';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Assessment } from '../../server/contract/assessments.ts';
import type { BoxRecord } from '../../server/contract/boxes.ts';
import { endpoints } from '../../server/contract/endpoints.ts';
import type { Endpoint } from '../../server/contract/endpoint.ts';
import type { Household } from '../../server/contract/households.ts';
import type { Paper, PaperRow } from '../../server/contract/papers.ts';
import type { Problem } from '../../server/contract/problems.ts';
import type { Scan, UploadResult } from '../../server/contract/scans.ts';
import type { ShredList } from '../../server/contract/shred-lists.ts';
import { createApp } from '../../server/app.ts';
import { readPages } from '../print/read-pdf.ts';
import { startTestApp, type TestApp, type Visitor } from '../support/app.ts';
import { addScannedPapers, change, enter, enterOldBill, sayNoBusiness } from '../support/papers.ts';
import { addPractice, testPassword, type TestPractice } from '../support/people.ts';

let app: TestApp;
let practice: TestPractice;
let owner: Visitor;
let client: Visitor;
let house: string;

const today = '2026-11-07';
const pngOfOnePage = await makePicture();

beforeAll(async () => {
  app = await startTestApp();
  practice = await addPractice();
  owner = await app.signIn(practice.emails.owner, testPassword);
  client = await app.signIn(practice.emails.client, testPassword);
  await sayNoBusiness(owner, practice.householdId);
  house = `/api/households/${practice.householdId}`;
});
afterAll(() => app.close());

async function makePicture(): Promise<Buffer> {
  const { default: sharp } = await import('sharp');
  return sharp({ create: { width: 600, height: 800, channels: 3, background: 'white' } })
    .png()
    .toBuffer();
}

function fieldsOf(problem: Problem): string[] {
  return (problem.fields ?? []).map(({ field }) => field);
}

describe('the session', () => {
  const credentials = () => ({ email: practice.emails.client, password: testPassword });

  test('tells who nobody is, signs in with the token, tells who one is, signs out', async () => {
    const agent = request.agent(app.app);
    const before = await agent.get('/api/session');
    expect([before.status, before.body.user, before.body.memberships]).toEqual([200, null, []]);
    const token = before.body.csrfToken as string;

    const without = await agent.post('/api/session').send(credentials());
    expect(without.status).toBe(403);
    const signedIn = await agent
      .post('/api/session')
      .set('X-CSRF-Token', token)
      .send(credentials());
    expect(signedIn.status).toBe(200);
    expect(signedIn.body.user).toMatchObject({ email: practice.emails.client });
    expect(signedIn.body.memberships).toHaveLength(1);
    expect(signedIn.body.memberships[0]).toMatchObject({
      role: 'client',
      standing: 'self',
      householdId: practice.householdId,
      rights: { see: 'all', decide: 'all', approve: 'all', export: 'all' },
    });

    const after = await agent.get('/api/session');
    expect(after.body.user).toMatchObject({ email: practice.emails.client });
    expect(after.body.csrfToken).not.toBe(token);
    const stale = await agent.delete('/api/session').set('X-CSRF-Token', token);
    expect(stale.status).toBe(403);
    const fresh = after.body.csrfToken as string;
    const out = await agent.delete('/api/session').set('X-CSRF-Token', fresh);
    expect(out.status).toBe(204);
    expect((await agent.get('/api/session')).body.user).toBeNull();
  });

  test('does not open with a wrong password, and says where the input does not fit', async () => {
    const visitor = await app.visit();
    const wrong = await visitor.post('/api/session', {
      ...credentials(),
      password: 'not this one',
    });
    expect(wrong.status).toBe(401);
    expect(wrong.headers['content-type']).toContain('application/problem+json');
    expect(wrong.body).toMatchObject({ status: 401, title: expect.any(String) });
    const empty = await visitor.post('/api/session', {});
    expect([empty.status, fieldsOf(empty.body as Problem).sort()]).toEqual([
      422,
      ['email', 'password'],
    ]);
  });
});

describe('households', () => {
  test('are added, listed, read and changed at the version that was seen', async () => {
    const made = await owner.post('/api/households', {
      name: 'Elderfield',
      country: 'US',
      region: 'WA',
      timeZone: 'America/Los_Angeles',
      circumstances: { selfEmployed: { answer: 'yes', from: '2020-01-01' } },
    });
    expect(made.status).toBe(201);
    const household = made.body as Household;
    expect(household).toMatchObject({
      name: 'Elderfield',
      country: 'US',
      region: 'WA',
      version: 1,
    });
    expect(household.circumstances.selfEmployed).toEqual({
      answer: 'yes',
      from: '2020-01-01',
      to: null,
    });
    const listed = (await owner.get('/api/households')).body as {
      items: Household[];
      total: number;
    };
    expect(listed.total).toBe(2);
    expect(listed.items.map(({ name }) => name)).toContain('Elderfield');
    expect((await client.get('/api/households')).body.total).toBe(1);
    const url = `/api/households/${household.id}`;
    expect((await client.get(url)).status).toBe(404);
    expect((await owner.get(url)).body).toMatchObject({ id: household.id });

    expect((await owner.patch(url, { name: 'New' })).status).toBe(428);
    const changed = await owner.patch(url, { name: 'New' }, household.version);
    expect(changed.body).toMatchObject({ name: 'New', version: 2 });
    const stale = await owner.patch(url, { name: 'Other' }, household.version);
    expect([stale.status, stale.body.current.name]).toEqual([412, 'New']);
  });

  test('refuse what does not fit by the name of the field', async () => {
    const good = { name: 'X', country: 'GB', timeZone: 'Europe/London' };
    const refuse = async (more: object) => {
      const answer = await owner.post('/api/households', { ...good, ...more });
      return [answer.status, ...fieldsOf(answer.body as Problem)];
    };
    expect(await refuse({ name: '' })).toEqual([422, 'name']);
    expect(await refuse({ country: 'XX' })).toEqual([422, 'country']);
    expect(await refuse({ country: 'gb' })).toEqual([422, 'country']);
    expect(await refuse({ timeZone: 'Mars/Base' })).toEqual([422, 'timeZone']);
    expect(await refuse({ region: 'atlantis' })).toEqual([422, 'region']);
    const unreadable = await owner
      .post('/api/households')
      .set('Content-Type', 'application/json')
      .send('{"name":');
    expect(unreadable.status).toBe(400);
  });
});

describe('boxes', () => {
  test('are added with a code, read, and have a label and separators to print', async () => {
    const made = await owner.post(`${house}/boxes`, { label: 'Attic' });
    expect(made.status).toBe(201);
    const box = made.body as BoxRecord;
    expect(box).toMatchObject({ label: 'Attic', householdId: practice.householdId });
    expect(box.code).toMatch(/^B-\d{2,}$/);
    expect((await client.get(`/api/boxes/${box.id}`)).body).toMatchObject({ code: box.code });
    const label = await owner.get(`/api/boxes/${box.id}/label.pdf`).buffer(true);
    const [page] = await readPages(label.body as Uint8Array);
    expect(page?.text).toContain(box.code);
    const sizeOf = async (query: string) => {
      const sheet = await owner.get(`${house}/separator-sheet.pdf${query}`).buffer(true);
      const [first] = await readPages(sheet.body as Uint8Array);
      return [Math.round(first?.width ?? 0), Math.round(first?.height ?? 0)];
    };
    // ISO 216 A4 and US Letter in points.
    expect(await sizeOf('')).toEqual([595, 842]);
    expect(await sizeOf('?paper=Letter')).toEqual([612, 792]);
    expect((await owner.get(`${house}/separator-sheet.pdf?paper=A3`)).status).toBe(422);
  });

  test('take many files at once: each is accepted or refused, a repetition makes no copy', async () => {
    const made = await owner.post(`${house}/boxes`, { label: 'Desk' });
    const { id } = made.body as BoxRecord;
    const send = async (files: [Buffer, string][]) => {
      const post = owner.agent.post(`/api/boxes/${id}/scans`).set('X-CSRF-Token', owner.csrfToken);
      for (const [bytes, name] of files) void post.attach('files', bytes, name);
      return post;
    };
    const first = await send([
      [pngOfOnePage, 'one.png'],
      [Buffer.from('just words'), 'two.pdf'],
      [pngOfOnePage, 'the same under another name.jpg'],
    ]);
    expect(first.status).toBe(202);
    const items = (first.body as { items: UploadResult[] }).items;
    expect(items.map(({ name, accepted }) => [name, accepted])).toEqual([
      ['one.png', true],
      ['two.pdf', false],
      ['the same under another name.jpg', true],
    ]);
    expect(items[1]?.reason).toMatch(/\.$/);
    expect(items[2]).toMatchObject({ alreadyHere: true, scan: { id: items[0]?.scan?.id } });
    const other = await owner.post(`${house}/boxes`, { label: 'Elsewhere' });
    const again = await owner.agent
      .post(`/api/boxes/${(other.body as BoxRecord).id}/scans`)
      .set('X-CSRF-Token', owner.csrfToken)
      .attach('files', pngOfOnePage, 'one.png');
    expect((again.body as { items: UploadResult[] }).items[0]).toMatchObject({
      alreadyHere: true,
      scan: { id: items[0]?.scan?.id },
    });
    const listed = (await owner.get(`/api/boxes/${id}/scans`)).body as { items: Scan[] };
    expect(listed.items).toHaveLength(1);
    expect(listed.items[0]).toMatchObject({ status: 'waiting', pages: null, pagesRead: 0 });
    expect(app.jobs.filter(({ name }) => name === 'read-scan')).toHaveLength(1);
    const none = await send([]);
    expect([none.status, fieldsOf(none.body as Problem)]).toEqual([422, ['files']]);
  });
});

describe('the register', () => {
  test('enters a paper and a bundle without a scan', async () => {
    const paper = await owner.post(`${house}/papers`, { class: 'utility-bill' });
    expect([paper.status, paper.body.status, paper.body.title]).toEqual([201, 'to-review', null]);
    const bundle = await owner.post(`${house}/papers`, {
      class: 'bank-statement',
      title: 'Statements 2009 to 2014',
      bundle: true,
      bundleFrom: '2009-01-01',
      bundleTo: '2014-12-31',
      sheets: 60,
    });
    expect(bundle.body).toMatchObject({ bundle: true, sheets: 60, bundleTo: '2014-12-31' });
    const unknown = await owner.post(`${house}/papers`, { class: 'no-such-class' });
    expect([unknown.status, fieldsOf(unknown.body as Problem)]).toEqual([422, ['class']]);
  });

  test('filters by every name of the interface, together, and pages and sorts', async () => {
    const box = (await owner.post(`${house}/boxes`, {})).body as BoxRecord;
    const inBox = { boxId: box.id };
    const kept = await enter(owner, practice.householdId, 'payslip', { ...inBox, title: 'Heron' });
    await change(owner, kept, { pile: 'file-here', keptBecause: 'duty' });
    await enter(owner, practice.householdId, 'payslip', { ...inBox, title: 'Curlew' });
    await enter(owner, practice.householdId, 'warranty', { ...inBox, title: 'Curlew oven' });
    const find = async (query: string) => {
      const answer = await owner.get(`${house}/papers?box=${box.id}&${query}`);
      expect(answer.status).toBe(200);
      const { items, total } = answer.body as { items: PaperRow[]; total: number };
      return [total, ...items.map(({ title }) => title)];
    };
    expect(await find('')).toEqual([3, 'Heron', 'Curlew', 'Curlew oven']);
    expect(await find('class=payslip')).toEqual([2, 'Heron', 'Curlew']);
    expect(await find('class=payslip,warranty&status=to-review')).toEqual([
      2,
      'Curlew',
      'Curlew oven',
    ]);
    expect(await find('pile=file-here')).toEqual([1, 'Heron']);
    expect(await find('status=kept')).toEqual([1, 'Heron']);
    expect(await find('q=curlew&class=warranty')).toEqual([1, 'Curlew oven']);
    expect(await find('sort=-title&pageSize=2')).toEqual([3, 'Heron', 'Curlew oven']);
    expect(await find('sort=title&pageSize=2&page=2')).toEqual([3, 'Heron']);
    expect((await owner.get(`${house}/papers?pageSize=200`)).status).toBe(200);
    for (const bad of ['pageSize=201', 'page=0', 'sort=nothing', 'pile=moon', 'box=1']) {
      const answer = await owner.get(`${house}/papers?${bad}`);
      expect([bad, answer.status, fieldsOf(answer.body as Problem)]).toEqual([
        bad,
        422,
        [bad.split('=')[0]],
      ]);
    }
  });

  test('comes as CSV with the same filters', async () => {
    const answer = await client.get(`${house}/papers.csv?class=warranty`);
    expect(answer.headers['content-type']).toContain('text/csv');
    const rows = parse(answer.text, { columns: true, bom: true });
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({ Title: 'Curlew oven' });
  });
});

describe('one paper', () => {
  test('has pages, facts, ranked classes, assessment and version', async () => {
    const [id = ''] = await addScannedPapers(app, practice.householdId, [['Gas bill of 2010']]);
    const paper = (await client.get(`/api/papers/${id}`)).body as Paper;
    expect(paper.pages).toHaveLength(1);
    expect(paper.facts.dates.issued?.value).toBe('2010-03-15');
    expect(Array.isArray(paper.candidates)).toBe(true);
    expect(paper.version).toBe(1);
    expect(paper.assessment).toMatchObject({
      keepUntil: expect.any(String),
      rules: expect.arrayContaining([expect.objectContaining({ id: expect.any(String) })]),
    });
  });

  test('takes each field of a change and nothing unknown', async () => {
    const paper = await enter(owner, practice.householdId, 'utility-bill');
    const url = `/api/papers/${paper.id}`;
    expect((await owner.patch(url, { note: 'x' })).status).toBe(428);
    let { version } = paper;
    for (const patch of [
      { class: 'telecom-bill' },
      { country: 'IE' },
      { facts: { dates: { issued: '2024-05-01' }, reference: 'R-1' } },
      { pile: 'act-on' },
      { keptBecause: 'use' },
      { place: 'Blue folder' },
      { note: 'Ask about it' },
      { status: 'undecided' },
    ]) {
      const answer = await owner.patch(url, patch, version);
      expect([patch, answer.status]).toEqual([patch, 200]);
      version = (answer.body as Paper).version;
    }
    const now = (await owner.get(url)).body as Paper;
    expect(now).toMatchObject({
      class: 'telecom-bill',
      country: 'IE',
      paperOn: '2024-05-01',
      reference: 'R-1',
      keptBecause: 'use',
      place: 'Blue folder',
      note: 'Ask about it',
      status: 'undecided',
      version: paper.version + 8,
    });
    const stale = await client.patch(url, { note: 'mine' }, paper.version);
    expect([stale.status, stale.body.current.note]).toEqual([412, 'Ask about it']);
    for (const [patch, field] of [
      [{ class: 'no-such-class' }, 'class'],
      [{ country: 'Ireland' }, 'country'],
      [{ pile: 'moon' }, 'pile'],
      [{ status: 'left' }, 'status'],
      [{ facts: { dates: { issued: '2024-02-30' } } }, 'facts.dates.issued'],
      [{ colour: 'red' }, 'colour'],
    ] as const) {
      const answer = await owner.patch(url, patch, version);
      expect([answer.status, fieldsOf(answer.body as Problem)]).toEqual([422, [field]]);
    }
  });
});

describe('a shred list', () => {
  test('is gathered, printed, approved by version with rows kept back, and carried out', async () => {
    const [one, two, three] = [
      await enterOldBill(owner, practice.householdId),
      await enterOldBill(owner, practice.householdId),
      await enterOldBill(owner, practice.householdId),
    ];
    const gathered = await owner.post(`${house}/shred-lists`, {
      on: today,
      papers: [one.id, two.id, three.id],
    });
    expect(gathered.status).toBe(201);
    const list = gathered.body as ShredList;
    const url = `/api/shred-lists/${list.id}`;
    expect(list).toMatchObject({ status: 'draft', version: 1, on: today });
    expect((await client.get(url)).body).toMatchObject({ id: list.id });
    const pdf = await client.get(`${url}.pdf`).buffer(true);
    expect([pdf.status, pdf.headers['content-type']]).toEqual([200, 'application/pdf']);
    const [page] = await readPages(pdf.body as Uint8Array);
    expect(page?.text).toContain('Northmere Power');

    const wrong = await client.post(`${url}/approval`, { version: 99, keepBack: [] });
    expect(wrong.status).toBe(412);
    const missing = await client.post(`${url}/approval`, {});
    expect([missing.status, fieldsOf(missing.body as Problem)]).toEqual([422, ['version']]);
    const stranger = await client.post(`${url}/approval`, {
      version: list.version,
      keepBack: [practice.householdId],
    });
    expect(stranger.status).toBe(422);
    const approved = await client.post(`${url}/approval`, {
      version: list.version,
      keepBack: [three.id],
    });
    expect(approved.body).toMatchObject({ status: 'approved', approval: { byName: 'Ada Client' } });

    const act = {
      on: today,
      place: 'Kitchen',
      method: 'cross-cut shredder',
      level: 'P-4',
      witness: 'Ada Client',
    };
    const unknown = await owner.post(`${url}/destruction`, {
      ...act,
      rows: [{ paper: one.id, outcome: 'burnt' }],
    });
    expect([unknown.status, fieldsOf(unknown.body as Problem)]).toEqual([422, ['rows.0.outcome']]);
    const done = await owner.post(`${url}/destruction`, {
      ...act,
      rows: [
        { paper: one.id, outcome: 'destroyed' },
        { paper: two.id, outcome: 'not-found' },
      ],
    });
    expect([done.status, done.body.status]).toEqual([200, 'done']);
    const states = await Promise.all(
      [one, two, three].map(
        async ({ id }) => ((await owner.get(`/api/papers/${id}`)).body as Paper).status,
      ),
    );
    expect(states).toEqual(['left', 'undecided', 'kept']);
  });

  test('never carries what may not leave', async () => {
    const will = await enter(owner, practice.householdId, 'will');
    const young = await enter(owner, practice.householdId, 'utility-bill', {
      facts: { dates: { issued: '2026-10-01' } },
    });
    const unseen = await enter(owner, practice.householdId, 'utility-bill', {
      facts: { dates: { issued: '2001-10-01' } },
    });
    await change(owner, will, { pile: 'shred' });
    await change(owner, young, { pile: 'shred', answers: { usedForTax: false } });
    const answer = await owner.post(`${house}/shred-lists`, {
      on: today,
      papers: [will.id, young.id, unseen.id],
    });
    const list = answer.body as ShredList;
    expect([answer.status, list.rows]).toEqual([201, []]);
    expect(list.leftOut.map(({ paper }) => paper).sort()).toEqual(
      [will.id, young.id, unseen.id].sort(),
    );
    for (const { reasons } of list.leftOut) expect(reasons[0]?.sentence).toMatch(/\.$/);
  });
});

describe('the retention sum', () => {
  const ask = (body: object) => owner.post('/api/assessments', body);

  test('answers a given case and stores nothing', async () => {
    const before = (await owner.get(`${house}/papers`)).body.total as number;
    const answer = await ask({
      country: 'GB',
      class: 'utility-bill',
      on: '2026-12-01',
      inputs: { documentDate: '2024-02-29', usedForTax: false, role: 'household' },
    });
    expect(answer.status).toBe(200);
    const assessment = answer.body as Assessment;
    // Common practice, Limitation Act 1980 s.5: six years.
    expect(assessment).toMatchObject({
      keepUntil: '2030-02-28',
      shredFrom: '2030-03-01',
      permanent: false,
      open: false,
      openBecause: null,
      heldBy: [],
    });
    expect(Object.keys(assessment).sort()).toEqual(
      [
        'advisedBecause',
        'advisedUntil',
        'assumed',
        'cautions',
        'disposal',
        'heldBy',
        'keepUntil',
        'open',
        'openBecause',
        'original',
        'permanent',
        'provisional',
        'rules',
        'scheduledUntil',
        'securityLevel',
        'shredFrom',
        'steps',
      ].sort(),
    );
    expect((await owner.get(`${house}/papers`)).body.total).toBe(before);
  });

  test('answers open where a country has no table', async () => {
    const answer = await ask({ country: 'FR', class: 'tax-return', on: '2026-12-01', inputs: {} });
    expect([answer.status, answer.body.open, answer.body.keepUntil]).toEqual([200, true, null]);
    expect(answer.body.openBecause).toMatch(/adviser/);
  });

  test('refuses by the name of the field and of the unknown value', async () => {
    const good = { country: 'GB', class: 'payslip', on: '2026-12-01', inputs: {} };
    const refuse = async (more: object) => {
      const answer = await ask({ ...good, ...more });
      const [problem] = (answer.body as Problem).fields ?? [];
      return [answer.status, problem?.field, problem?.message];
    };
    const named = (text: string) => expect.stringContaining(text) as string;
    expect(await refuse({ class: 'pay-slip' })).toEqual([422, 'class', named('pay-slip')]);
    expect(await refuse({ country: 'XX' })).toEqual([422, 'country', named('XX')]);
    expect(await refuse({ on: '2026-02-30' })).toEqual([422, 'on', expect.any(String)]);
    expect(await refuse({ inputs: { paidUntil: '2026-01-01' } })).toEqual([
      422,
      'inputs.paidUntil',
      named('paidUntil'),
    ]);
    expect(await refuse({ inputs: { role: 'king' } })).toEqual([
      422,
      'inputs.role',
      expect.any(String),
    ]);
    expect(await refuse({ inputs: { region: 'atlantis' } })).toEqual([
      422,
      'inputs.region',
      named('atlantis'),
    ]);
    expect(await refuse({ when: 'now' })).toEqual([422, 'when', named('when')]);
  });
});

describe('the calendar feed', () => {
  test('is read by token alone and says what comes', async () => {
    const paper = await enter(owner, practice.householdId, 'passport', {
      facts: { dates: { expiry: '2030-03-04' } },
    });
    const made = await client.post(`${house}/calendar-address`);
    const { pathname, search } = new URL((made.body as { url: string }).url);
    expect(pathname).toBe(`${house}/calendar.ics`);
    const feed = await request(app.app).get(pathname + search);
    expect(feed.headers['content-type']).toContain('text/calendar');
    const events = new ICAL.Component(ICAL.parse(feed.text))
      .getAllSubcomponents('vevent')
      .map((event) => new ICAL.Event(event));
    const event = events.find(({ uid }) => uid.includes(paper.id));
    expect(event?.startDate.toString()).toBe('2030-03-04');
    expect(event?.startDate.isDate).toBe(true);
    expect(event?.summary).not.toMatch(/passport/i);
    expect((await request(app.app).get(pathname)).status).toBe(404);
    expect((await request(app.app).get(`${pathname}?token=x`)).status).toBe(404);
  });
});

describe('the service', () => {
  test('says that it is well, and with 503 what is not', async () => {
    const well = await request(app.app).get('/api/health');
    expect([well.status, well.body.status]).toEqual([200, 'up']);
    const broken = createApp({
      ...app.deps,
      queue: { ...app.deps.queue, check: () => Promise.resolve(false) },
    });
    const ill = await request(broken.express).get('/api/health');
    await broken.close();
    expect([ill.status, ill.body]).toEqual([
      503,
      { status: 'down', database: 'up', queue: 'down', storage: 'up' },
    ]);
  });

  test('describes every call in a valid OpenAPI 3.1 document', async () => {
    const { body: document } = (await request(app.app).get('/api/openapi.json')) as {
      body: {
        openapi: string;
        paths: Record<string, Record<string, { operationId: string; responses: object }>>;
      };
    };
    expect(document.openapi).toMatch(/^3\.1\./);
    const result = await new Validator().validate(structuredClone(document));
    expect([result.valid, result.errors]).toEqual([true, undefined]);
    for (const [operationId, { method, path, status }] of Object.entries(endpoints) as [
      string,
      Endpoint,
    ][]) {
      const operation = document.paths[path.replace(/:(\w+)/g, '{$1}')]?.[method];
      expect(operation?.operationId).toBe(operationId);
      expect(Object.keys(operation?.responses ?? {})).toContain(String(status));
    }
  });

  test('answers an address that is not there with a problem, not a page', async () => {
    const answer = await owner.get('/api/nothing/here');
    expect([answer.status, answer.headers['content-type']]).toEqual([
      404,
      expect.stringContaining('application/problem+json'),
    ]);
  });
});
