import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Paper } from '../../server/contract/papers.ts';
import { startTestApp, type TestApp, type Visitor } from '../support/app.ts';
import { addScannedPapers } from '../support/papers.ts';
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

const bill = (sum: string) =>
  `Brackwater Energy electricity bill
Account number 77142209 Bill number 50411
Electricity used 686 kWh at 24.1p 165.33
Standing charge 90 days 46.80 VAT at 5% 10.61
Total to pay ${sum} by Direct Debit`;

async function view(id: string): Promise<Paper> {
  return (await owner.get(`/api/papers/${id}`)).body as Paper;
}

describe('a paper that was scanned twice', () => {
  test('is marked as the copy of the one that was there, and the other is not', async () => {
    const [first = ''] = await addScannedPapers(app, practice.householdId, [[bill('222.74')]]);
    const [again = '', strange = ''] = await addScannedPapers(app, practice.householdId, [
      [bill('222.74')],
      [
        'Larkspur Mobile your bill 12.00 plan 20 GB calls 1.40 total 13.40 due 19 February account 441770',
      ],
    ]);
    expect((await view(again)).likelyCopyOf?.id).toBe(first);
    expect((await view(first)).likelyCopyOf).toBeNull();
    expect((await view(strange)).likelyCopyOf).toBeNull();
  });

  test('is found within one scan too', async () => {
    const text = `Norshire Water metered bill customer 8812007
Readings 411 to 462 is 51 cubic metres fresh water 96.90
Sewerage 110.22 surface water drainage 18.00 total 225.12`;
    const [one = '', two = ''] = await addScannedPapers(app, practice.householdId, [
      [text],
      [text],
    ]);
    expect((await view(two)).likelyCopyOf?.id).toBe(one);
    expect((await view(one)).likelyCopyOf).toBeNull();
  });
});
