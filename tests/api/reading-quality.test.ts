import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Paper } from '../../server/contract/papers.ts';
import type { ReadingQuality } from '../../server/contract/reading-quality.ts';
import { startTestApp, type TestApp, type Visitor } from '../support/app.ts';
import { addScannedPapers, change, enterOldBill } from '../support/papers.ts';
import { addPractice, testPassword, type TestPractice } from '../support/people.ts';

let app: TestApp;
let practice: TestPractice;
let owner: Visitor;

beforeAll(async () => {
  app = await startTestApp();
  practice = await addPractice();
  owner = await app.signIn(practice.emails.owner, testPassword);
});
afterAll(() => app.close());

const quality = async () => (await owner.get('/api/reading-quality')).body as ReadingQuality;

describe('how well papers are read', () => {
  test('counts what people decided beside what was read', async () => {
    const ids = await addScannedPapers(app, practice.householdId, [['one'], ['two'], ['three']]);
    expect(await quality()).toMatchObject({ papers: 0, months: [], classes: [] });
    const [first, second] = await Promise.all(
      ids.map(async (id) => (await owner.get(`/api/papers/${id}`)).body as Paper),
    );
    if (!first || !second) throw new Error('no papers');
    await change(owner, first, { pile: 'file-here', keptBecause: 'duty' });
    await change(owner, second, {
      class: 'telecom-bill',
      facts: { dates: { issued: '2011-04-02' } },
      pile: 'file-here',
      keptBecause: 'duty',
    });
    // Entered by hand: nobody read it.
    await enterOldBill(owner, practice.householdId);
    expect(await quality()).toMatchObject({
      papers: 2,
      kindCorrected: 1,
      dateCorrected: 1,
      months: [{ month: app.clock.todayIn('Europe/London').slice(0, 7), papers: 2 }],
      classes: [
        {
          class: 'telecom-bill',
          papers: 1,
          kindCorrected: 1,
          takenFor: [{ class: 'utility-bill', papers: 1 }],
        },
        { class: 'utility-bill', papers: 1, kindCorrected: 0, takenFor: [] },
      ],
    });
  });

  test('is for the owner, and of the own practice alone', async () => {
    const assistant = await app.signIn(practice.emails.assistant, testPassword);
    expect((await assistant.get('/api/reading-quality')).status).toBe(403);
    const other = await addPractice('second');
    const stranger = await app.signIn(other.emails.owner, testPassword);
    expect((await stranger.get('/api/reading-quality')).body).toMatchObject({ papers: 0 });
  });
});
