/** The main job once through in the browser, on the real server, worker, reader, database and mail. */
import path from 'node:path';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { readPages } from '../print/read-pdf.ts';
import { launchBrowser, openPage, type WatchedPage } from '../support/browser.ts';
import { callFrom, signInAs } from '../support/demo-visitor.ts';
import { type RunningProduct, startProduct } from '../support/running-product.ts';

type Items<T> = { items: T[] };
type Row = { id: string; number: number; class: string; status: string };

let product: RunningProduct;
let browser: Browser;
let owner: WatchedPage;
let household: string;

beforeAll(async () => {
  product = await startProduct({ hasDemo: true });
  browser = await launchBrowser();
  owner = await openPage(browser);
  await signInAs(owner.page, product.url, 'owner');
  const { items } = await callFrom<Items<{ id: string; name: string }>>(
    owner.page,
    '/api/households',
  );
  household = items.find(({ name }) => name === 'Pennelow')?.id ?? '';
});
afterAll(async () => {
  await browser.close();
  await product.close();
});

const listPapers = async (page: Page, query: string) =>
  (await callFrom<Items<Row>>(page, `/api/households/${household}/papers?${query}`)).items;

async function fetchPages(page: Page, address: string) {
  const answer = await page.context().request.get(product.url + address);
  expect(answer.status(), address).toBe(200);
  return readPages(new Uint8Array(await answer.body()));
}

describe('the main job', () => {
  test('goes from a file to a paper that was read, looked at and found again', async () => {
    const { page } = owner;
    await page.goto(`${product.url}/households/${household}/boxes`);
    await page.getByRole('link', { name: /B-03/ }).click();
    await page.waitForURL(/\/boxes\//);
    const box = path.basename(new URL(page.url()).pathname);
    await page
      .locator('input[type=file]')
      .first()
      .setInputFiles(path.resolve('tests/fixtures/try/download-074.pdf'));
    await expect
      .poll(async () => (await callFrom<Items<Row>>(page, `/api/boxes/${box}/scans`)).items.length)
      .toBe(1);
    // What is being read survives a reload.
    await page.reload();
    await page.getByText('download-074.pdf').first().waitFor();
    await expect
      .poll(async () => (await listPapers(page, `box=${box}`)).length, { timeout: 150_000 })
      .toBe(1);
    const [paper] = await listPapers(page, `box=${box}`);
    expect(paper?.status).toBe('to-review');

    await page.goto(`${product.url}/households/${household}/review/${paper?.id ?? ''}`);
    await page
      .getByRole('button', { name: /Keep it/ })
      .first()
      .waitFor();
    await page.keyboard.press('Enter');
    await expect
      .poll(async () => (await listPapers(page, `box=${box}`))[0]?.status, { timeout: 15_000 })
      .toBe('kept');

    const { text } = await callFrom<{ text: string }>(page, `/api/papers/${paper?.id ?? ''}`);
    const word = text.match(/\b[A-Za-z]{8,}\b/)?.[0] ?? '';
    await page.goto(`${product.url}/households/${household}/papers`);
    await page.getByLabel('Any word on the paper').fill(word);
    await page.waitForURL(/q=/);
    await page
      .getByText(`${paper?.number ?? ''}`, { exact: true })
      .first()
      .waitFor();
    owner.requireQuiet();
  });

  test('goes from the shred pile to the record, agreed to by the client', async () => {
    const { page } = owner;
    await page.goto(`${product.url}/households/${household}/shred-lists`);
    await page.getByRole('button', { name: 'Gather a list' }).first().click();
    await page.getByRole('button', { name: 'Gather', exact: true }).click();
    await page.waitForURL(/\/shred-lists\//);
    const list = new URL(page.url()).pathname;
    await page.getByRole('button', { name: 'Send to the client' }).click();
    await page.getByText('Sent. The client gets an e-mail').waitFor();

    const client = await openPage(browser, { viewport: 'phone' });
    await signInAs(client.page, product.url, 'client');
    await client.page.goto(product.url + list);
    await client.page
      .getByRole('button', { name: /^Keep paper/ })
      .first()
      .tap();
    await client.page.getByText('This one stays').waitFor();
    await client.page.getByRole('button', { name: 'Go on to agree' }).tap();
    await client.page.getByRole('button', { name: 'I agree' }).tap();
    await client.page.getByRole('button', { name: 'I agree' }).waitFor({ state: 'detached' });
    client.requireQuiet();
    await client.context.close();

    await page.reload();
    await page.getByRole('button', { name: 'Record the shredding' }).click();
    await page.getByRole('button', { name: 'All were shredded' }).click();
    await page.getByRole('button', { name: 'Go on to record' }).click();
    await page.getByLabel('Where').fill('Kitchen table');
    await page.getByLabel('How', { exact: true }).fill('Cross-cut shredder');
    await page.getByLabel(/Who watched/).fill('Winifred Pennelow');
    await page.getByRole('checkbox').check();
    await page.getByRole('button', { name: 'Check once more' }).click();
    await page.getByRole('button', { name: 'Yes, record it' }).click();
    await page.getByRole('button', { name: 'Yes, record it' }).waitFor({ state: 'detached' });

    const { rows } = await callFrom<{
      rows: { paper: string; paperNumber: number; outcome: string | null }[];
    }>(page, `/api${list}`);
    const gone = rows.filter(({ outcome }) => outcome === 'destroyed');
    expect([gone.length, rows.length]).toEqual([rows.length - 1, rows.length]);
    expect((await listPapers(page, 'status=left')).map(({ id }) => id).sort()).toEqual(
      gone.map(({ paper }) => paper).sort(),
    );
    const record = (await fetchPages(page, `/api${list}/record.pdf`)).map(({ text }) => text);
    expect(record.join(' ')).toContain('Winifred Pennelow');
    const printed = (await fetchPages(page, `/api${list}.pdf`)).map(({ text }) => text).join(' ');
    expect(printed).toContain('B-01');
    owner.requireQuiet();
  });
});
