/**
 * `npm run screenshots [-- ADDRESS]`: takes the pictures of README from a running product with its demo, as the
 * owner sees it.
 */
import { mkdir } from 'node:fs/promises';
import path from 'node:path';
import { chromium, type Page } from 'playwright-core';
import { demoPassword } from '../auth/passwords.ts';
import { endpoints } from '../contract/endpoints.ts';
import { demoEmails } from '../db/seeds/demo-people.ts';
import { signInOverHttp } from './demo/http-visitor.ts';
import { findChromium } from './support/chromium.mjs';

const address = process.argv[2] ?? 'http://127.0.0.1:4180';
const folder = path.resolve(import.meta.dirname, '../../.docs/walk');
const executablePath = findChromium();
if (!executablePath) {
  console.error('Chromium is missing. Run "sudo apt-get install chromium" and try again.');
  process.exit(1);
}

const browser = await chromium.launch({ executablePath });
try {
  await mkdir(folder, { recursive: true });
  const page = await browser.newPage({
    viewport: { width: 1280, height: 800 },
    locale: 'en-GB',
    reducedMotion: 'reduce',
  });
  await takePictures(page);
} finally {
  await browser.close();
}

async function takePictures(page: Page): Promise<void> {
  await page.goto(`${address}/sign-in`);
  await page.getByLabel('E-mail').fill(demoEmails.owner);
  await page.getByLabel('Password', { exact: true }).fill(demoPassword);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.getByRole('link', { name: /Pennelow/ }).click();
  await page.waitForURL(/\/households\/[0-9a-f-]{36}$/);
  const household = new URL(page.url()).pathname;
  await take(page, household, 'household');
  await page.goto(`${address}${household}/boxes`);
  await page.getByRole('link', { name: /B-02/ }).click();
  await page.waitForURL(/\/boxes\//);
  await take(page, new URL(page.url()).pathname, 'box');
  await take(page, `${household}/review`, 'review');
  await take(page, `${household}/papers`, 'register');
  await take(page, await findList(path.basename(household)), 'shred-list');
  await take(page, `${household}/reminders`, 'reminders');
}

/** The list that is there, or else one gathered now. */
async function findList(householdId: string): Promise<string> {
  const owner = await signInOverHttp(address, { email: demoEmails.owner, password: demoPassword });
  const params = { id: householdId };
  const { items } = await owner.call(endpoints.listShredLists, { params });
  if (items[0]) return `/shred-lists/${items[0].id}`;
  const { today } = await owner.call(endpoints.getHousehold, { params });
  const list = await owner.call(endpoints.createShredList, { params, body: { on: today } });
  return `/shred-lists/${list.id}`;
}

async function take(page: Page, where: string, name: string): Promise<void> {
  await page.goto(address + where);
  await page.getByRole('heading', { level: 1 }).waitFor({ state: 'attached' });
  await page.waitForLoadState('networkidle');
  await page.screenshot({
    path: path.join(folder, `${name}.jpg`),
    type: 'jpeg',
    quality: 80,
    animations: 'disabled',
  });
  console.log(`.docs/walk/${name}.jpg`);
}
