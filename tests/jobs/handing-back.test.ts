/** A worker that is asked to stop finishes the page under way and leaves the rest to the next. */
import { readFile } from 'node:fs/promises';
import { PDFDocument } from 'pdf-lib';
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { BoxRecord } from '../../server/contract/boxes.ts';
import type { Scan } from '../../server/contract/scans.ts';
import { ScanModel } from '../../server/db/models/scan-model.ts';
import type { Visitor } from '../support/app.ts';
import { eventually } from '../support/eventually.ts';
import { addPractice, testPassword } from '../support/people.ts';
import { startWorkingApp, type WorkingApp } from '../support/working-app.ts';

let app: WorkingApp;
let owner: Visitor;
let url: string;

beforeAll(async () => {
  app = await startWorkingApp({ env: { READER_WORKERS: '1' } });
  const practice = await addPractice();
  owner = await app.signIn(practice.emails.owner, testPassword);
  const made = await owner.post(`/api/households/${practice.householdId}/boxes`, {});
  url = `/api/boxes/${(made.body as BoxRecord).id}/scans`;
});
afterAll(() => app.close());

/** The first pages of a pile, so that there is something left to hand back each time. */
async function makePile(): Promise<Buffer> {
  const pile = await PDFDocument.load(await readFile('tests/fixtures/demo/tarrow/pile-b.pdf'));
  const short = await PDFDocument.create();
  for (const page of await short.copyPages(pile, [0, 1, 2, 3, 4, 5, 6, 7])) short.addPage(page);
  return Buffer.from(await short.save());
}

async function readScan(): Promise<Scan | undefined> {
  return ((await owner.get(url)).body as { items: Scan[] }).items[0];
}

test('stopping twice over loses no page and counts as no failure', async () => {
  await owner.agent
    .post(url)
    .set('X-CSRF-Token', owner.csrfToken)
    .attach('files', await makePile(), 'pile.pdf');
  let pagesRead = 0;
  for (let round = 0; round < 2; round += 1) {
    const worker = await app.startWorker();
    await eventually(async () => ((await readScan())?.pagesRead ?? 0) > pagesRead, 'another page');
    await worker.stop();
    const scan = await readScan();
    expect([scan?.status, scan?.reason]).toEqual(['reading', null]);
    expect(scan?.pagesRead).toBeGreaterThan(pagesRead);
    pagesRead = scan?.pagesRead ?? 0;
    // Nothing goes on behind the back of a worker that has stopped.
    expect((await readScan())?.pagesRead).toBe(pagesRead);
  }
  expect((await ScanModel.findOne())?.attempts).toBe(0);
  await app.startWorker();
  const read = await eventually(async () => {
    const scan = await readScan();
    return scan?.status === 'read' && scan;
  }, 'the pile read');
  expect([read.pages, read.pagesRead]).toEqual([8, 8]);
  expect(read.papers).toBeGreaterThan(1);
}, 120_000);
