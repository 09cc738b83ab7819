/** The main job through its real parts: HTTP, PostgreSQL, queue, worker, character recognition, SMTP, PDF. */
import { readFile } from 'node:fs/promises';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Paper, PaperRow } from '../../server/contract/papers.ts';
import type { Reminder } from '../../server/contract/reminders.ts';
import type { Scan, UploadResult } from '../../server/contract/scans.ts';
import type { ShredList } from '../../server/contract/shred-lists.ts';
import { queueNames } from '../../server/jobs/queue.ts';
import { sendReminders } from '../../server/use-cases/reminders/send-reminders.ts';
import { readPages } from '../print/read-pdf.ts';
import type { Visitor } from '../support/app.ts';
import { eventually } from '../support/eventually.ts';
import { change, enter, sayNoBusiness } from '../support/papers.ts';
import { addPractice, testPassword, type TestPractice } from '../support/people.ts';
import { startWorkingApp, type WorkingApp } from '../support/working-app.ts';

let app: WorkingApp;
let practice: TestPractice;
let owner: Visitor;
let client: Visitor;
let boxId: string;

const demo = 'tests/fixtures/demo/pennelow';
/** A day on which the bill of 2026 has served its time and the passport is about to expire. */
const now = '2032-10-01T10:00:00Z';
const today = '2032-10-01';

beforeAll(async () => {
  app = await startWorkingApp({ now });
  practice = await addPractice();
  owner = await app.signIn(practice.emails.owner, testPassword);
  client = await app.signIn(practice.emails.client, testPassword);
  await sayNoBusiness(owner, practice.householdId);
  const box = await owner.post(`/api/households/${practice.householdId}/boxes`, { label: 'Hall' });
  boxId = (box.body as { id: string }).id;
  await app.startWorker();
});
afterAll(() => app.close());

async function upload(...files: string[]): Promise<UploadResult[]> {
  const request = owner.agent
    .post(`/api/boxes/${boxId}/scans`)
    .set('X-CSRF-Token', owner.csrfToken);
  for (const file of files) void request.attach('files', await readFile(file), 'a name.bin');
  const answer = await request;
  expect(answer.status).toBe(202);
  return (answer.body as { items: UploadResult[] }).items;
}

async function listScans(): Promise<Scan[]> {
  return ((await owner.get(`/api/boxes/${boxId}/scans`)).body as { items: Scan[] }).items;
}

async function awaitRead(): Promise<Scan[]> {
  return eventually(
    async () => {
      const scans = await listScans();
      return scans.every((scan) => scan.status === 'read' || scan.status === 'failed') && scans;
    },
    'all scans read',
    110_000,
  );
}

async function findPaper(classId: string): Promise<Paper> {
  const found = await owner.get(`/api/households/${practice.householdId}/papers?class=${classId}`);
  const [row] = (found.body as { items: PaperRow[] }).items;
  if (!row) throw new Error(`No paper was read as ${classId}.`);
  return (await owner.get(`/api/papers/${row.id}`)).body as Paper;
}

describe('from the box to the record', () => {
  test('files are read by the worker and wait for review, classed, dated and assessed', async () => {
    const items = await upload(`${demo}/scan-058.pdf`, `${demo}/IMG_090.jpg`);
    expect(items.map(({ accepted, alreadyHere }) => [accepted, alreadyHere])).toEqual([
      [true, false],
      [true, false],
    ]);
    const scans = await awaitRead();
    expect(scans.map(({ status, reason }) => [status, reason])).toEqual([
      ['read', null],
      ['read', null],
    ]);
    expect(scans.map(({ pages, pagesRead }) => pages === pagesRead)).toEqual([true, true]);

    const bill = await findPaper('utility-bill');
    expect(bill).toMatchObject({ status: 'to-review', country: 'GB', keyDate: '2026-04-09' });
    // Common practice, Limitation Act 1980 s.5: six years after the bill.
    expect(bill.assessment.keepUntil).toBe('2032-04-09');
    expect(bill.assessment.steps.length).toBeGreaterThan(0);
    expect(bill.text).toContain('Normoor');
    const [page] = bill.pages;
    const picture = await owner.get(`/api/pages/${page?.id}/image`);
    expect([picture.status, picture.headers['content-type']]).toEqual([200, 'image/jpeg']);

    const passport = await findPaper('passport');
    expect(passport.expiresOn).toBe('2033-05-22');
    expect(passport.gate.map(({ code }) => code)).toContain('not-reviewed');
  }, 120_000);

  test('the same files again make no second copy', async () => {
    const before = await listScans();
    const items = await upload(`${demo}/scan-058.pdf`);
    expect(items.map(({ accepted, alreadyHere }) => [accepted, alreadyHere])).toEqual([
      [true, true],
    ]);
    expect(await listScans()).toEqual(before);
  });

  test('a decided paper goes on a list, is approved, destroyed and stays on record', async () => {
    const bill = await findPaper('utility-bill');
    await change(owner, bill, { pile: 'shred', answers: { usedForTax: false } });
    const passport = await findPaper('passport');
    await change(owner, passport, { pile: 'file-here', keptBecause: 'use' });

    const gathered = await owner.post(`/api/households/${practice.householdId}/shred-lists`, {
      on: today,
    });
    expect(gathered.status).toBe(201);
    const list = gathered.body as ShredList;
    expect(list.rows.map(({ paper }) => paper)).toEqual([bill.id]);
    const printed = await owner.get(`/api/shred-lists/${list.id}.pdf`).buffer(true);
    expect(printed.headers['content-type']).toBe('application/pdf');

    const approved = await client.post(`/api/shred-lists/${list.id}/approval`, {
      version: list.version,
      keepBack: [],
    });
    expect([approved.status, approved.body.status]).toEqual([200, 'approved']);
    const done = await owner.post(`/api/shred-lists/${list.id}/destruction`, {
      on: today,
      place: 'Kitchen',
      method: 'cross-cut shredder',
      level: 'P-4',
      witness: 'Ada Client',
      rows: [{ paper: bill.id, outcome: 'destroyed' }],
    });
    expect([done.status, done.body.status]).toEqual([200, 'done']);
    expect(await findPaper('utility-bill')).toMatchObject({ status: 'left', leftOn: today });

    const record = await owner.get(`/api/shred-lists/${list.id}/record.pdf`).buffer(true);
    const pages = await readPages(record.body as Uint8Array);
    expect(pages.map(({ text }) => text).join(' ')).toContain('Kitchen');
    const activity = await owner.get(`/api/households/${practice.householdId}/activity`);
    const actions = (activity.body.items as { action: string }[]).map(({ action }) => action);
    expect(actions).toEqual(expect.arrayContaining(['scan.uploaded', 'scan.read']));
  });
});

describe('the reminder', () => {
  test('goes out once when two workers run the job at the same moment', async () => {
    const paper = await enterExpiring('2033-05-31');
    app.mail.clear();
    await app.startWorker();
    await Promise.all([
      sendReminders(app.deps),
      sendReminders(app.deps),
      app.deps.queue.send(queueNames.remind, {}),
      app.deps.queue.send(queueNames.remind, {}),
    ]);
    await app.mail.awaitMessage(({ to }) => to.includes(practice.emails.client), 30_000);
    await allSent();
    const sent = app.mail.messages().map(({ to }) => to.join());
    expect(new Set(sent).size).toBe(sent.length);
    const [mail] = app.mail.messages();
    expect(mail?.subject).not.toMatch(/passport|pennelow/i);
    expect(mail?.html).toContain('<');
    const { items } = (await client.get(`/api/households/${practice.householdId}/reminders`))
      .body as { items: Reminder[] };
    const told = items.filter(({ paperId }) => paperId === paper.id);
    expect(told.map(({ state, about }) => [state, about])).toEqual([['sent', '2033-05-31']]);
  });

  test('goes out once when the job died after taking it up', async () => {
    await enterExpiring('2033-06-01');
    app.mail.clear();
    const dying = {
      ...app.deps,
      queue: { ...app.deps.queue, send: () => Promise.reject(new Error('killed')) },
    };
    await expect(sendReminders(dying)).rejects.toThrow('killed');
    await sendReminders(app.deps);
    await sendReminders(app.deps);
    await app.mail.awaitMessage(({ to }) => to.includes(practice.emails.client), 30_000);
    await allSent();
    const sent = app.mail.messages().map(({ to }) => to.join());
    expect(new Set(sent).size).toBe(sent.length);
  });

  test('is tried again when the mail server fails, and the failure is shown', async () => {
    await enterExpiring('2033-06-02');
    app.mail.clear();
    app.mail.refuseNext(1000);
    await sendReminders(app.deps);
    const failing = await eventually(async () => {
      const states = await listMail();
      return states.filter(({ state }) => state === 'failing').length > 0 && states;
    }, 'a failing message on record');
    const failed = failing.find(({ state }) => state === 'failing');
    expect(failed?.lastError).toMatch(/\.$/);
    expect(Date.parse(failed?.nextAttemptAt ?? '')).toBeGreaterThan(Date.parse(now));
    expect(app.mail.messages()).toEqual([]);

    app.mail.refuseNext(0);
    app.clock.advance(24 * 60 * 60 * 1000);
    await app.deps.queue.send(queueNames.remind, {});
    await allSent();
    const sent = app.mail.messages().map(({ to, subject }) => `${to.join()} ${subject}`);
    expect(new Set(sent).size).toBe(sent.length);
    expect(sent.length).toBeGreaterThan(0);
  });
});

async function enterExpiring(expiry: string): Promise<Paper> {
  const paper = await enter(owner, practice.householdId, 'passport', {
    facts: { dates: { expiry } },
  });
  return change(owner, paper, { pile: 'file-here', keptBecause: 'use' });
}

interface MailOnRecord {
  state: string;
  lastError: string | null;
  nextAttemptAt: string | null;
}

async function listMail(): Promise<MailOnRecord[]> {
  return ((await owner.get('/api/mail')).body as { items: MailOnRecord[] }).items;
}

async function allSent(): Promise<void> {
  await eventually(async () => {
    const mails = await listMail();
    return mails.length > 0 && mails.every(({ state }) => state === 'sent');
  }, 'every message sent');
}
