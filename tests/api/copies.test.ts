import { randomUUID } from 'node:crypto';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { listPagesOfPaper } from '../../server/db/repositories/page-repository.ts';
import { readPages } from '../print/read-pdf.ts';
import { startTestApp, type TestApp, type Visitor } from '../support/app.ts';
import { addScannedPapers, enterOldBill, keepForEyesOf } from '../support/papers.ts';
import { addPractice, testPassword, type TestPractice } from '../support/people.ts';

let app: TestApp;
let practice: TestPractice;
let owner: Visitor;
let client: Visitor;
let adviser: Visitor;
let paperIds: string[];

beforeAll(async () => {
  app = await startTestApp();
  practice = await addPractice();
  owner = await app.signIn(practice.emails.owner, testPassword);
  client = await app.signIn(practice.emails.client, testPassword);
  adviser = await app.signIn(practice.emails.adviser, testPassword);
  paperIds = await addScannedPapers(app, practice.householdId, [
    ['Northmere Power\nQuarterly charge'],
    ['Second paper\nwith a page', 'and another page'],
  ]);
  const picture = await sharp({
    create: { width: 400, height: 566, channels: 3, background: '#ffffff' },
  })
    .jpeg()
    .toBuffer();
  for (const page of (await Promise.all(paperIds.map((id) => listPagesOfPaper(id)))).flat()) {
    await app.deps.storage.writePicture(
      practice.householdId,
      page.scanId,
      page.number,
      'image',
      picture,
    );
  }
});
afterAll(() => app.close());

describe('papers as a PDF', () => {
  test('carry the words of their pages', async () => {
    const answer = await owner.get(`/api/papers/${paperIds[0] ?? ''}.pdf`);
    expect(answer.status).toBe(200);
    const pages = await readPages(answer.body as Buffer);
    expect(pages.map(({ text }) => text)).toEqual([
      expect.stringContaining('Northmere Power Quarterly charge'),
    ]);
  });

  test('come all together, with an index in front, for the filter given', async () => {
    const path = `/api/households/${practice.householdId}/papers.pdf`;
    const pages = await readPages((await owner.get(path)).body as Buffer);
    expect(pages).toHaveLength(4);
    const found = await readPages((await owner.get(`${path}?q=quarterly`)).body as Buffer);
    expect(found).toHaveLength(1);
  });

  test('leave out what is for another person’s eyes', async () => {
    const [first = '', second = ''] = paperIds;
    await keepForEyesOf(first, practice.userIds.owner);
    const path = `/api/households/${practice.householdId}/papers.pdf`;
    const pages = await readPages((await client.get(path)).body as Buffer);
    expect(pages.map(({ text }) => text).join(' ')).not.toContain('Northmere');
    expect((await client.get(`/api/papers/${first}.pdf`)).status).toBe(404);
    expect((await client.get(`/api/papers/${second}.pdf`)).status).toBe(200);
  });

  test('are not for advisers, and not of papers without a picture', async () => {
    expect((await adviser.get(`/api/households/${practice.householdId}/papers.pdf`)).status).toBe(
      403,
    );
    const unscanned = await enterOldBill(owner, practice.householdId);
    const answer = await owner.get(`/api/papers/${unscanned.id}.pdf`);
    expect([answer.status, answer.body.detail]).toEqual([409, expect.stringContaining('picture')]);
    expect((await owner.get(`/api/papers/${randomUUID()}.pdf`)).status).toBe(404);
  });
});
