/** Every screen at both widths: barriers (axe-core, a general-purpose checker of WCAG), width, title, noise. */
import { QueryClient } from '@tanstack/react-query';
import type { Browser, Page } from 'playwright-core';
import { matchPath, type RouteObject } from 'react-router-dom';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { createRoutes } from '../../src/app/router.tsx';
import {
  launchBrowser,
  openPage,
  requireAccessible,
  requireNoSidewaysScroll,
  viewports,
} from '../support/browser.ts';
import { callFrom, type DemoRole, signInAs } from '../support/demo-visitor.ts';
import { type RunningProduct, startProduct } from '../support/running-product.ts';

interface Places {
  household: string;
  box: string;
  paper: string;
  list: string;
}

/** Addresses of the owner's screens; one at least for each route of the client. */
const screens: Record<string, (at: Places) => string> = {
  households: () => '/',
  'new household': () => '/households/new',
  household: (at) => `/households/${at.household}`,
  about: (at) => `/households/${at.household}/about`,
  boxes: (at) => `/households/${at.household}/boxes`,
  box: (at) => `/boxes/${at.box}`,
  papers: (at) => `/households/${at.household}/papers`,
  'papers, nothing found': (at) => `/households/${at.household}/papers?q=zzzz`,
  review: (at) => `/households/${at.household}/review`,
  'review of one paper': (at) => `/households/${at.household}/review/${at.paper}`,
  'shred lists': (at) => `/households/${at.household}/shred-lists`,
  'shred list': (at) => `/shred-lists/${at.list}`,
  holds: (at) => `/households/${at.household}/holds`,
  subjects: (at) => `/households/${at.household}/subjects`,
  reminders: (at) => `/households/${at.household}/reminders`,
  activity: (at) => `/households/${at.household}/activity`,
  'rule tables': () => '/rules',
  'rule table': () => '/rules/GB',
  mail: () => '/mail',
  'reading quality': () => '/reading-quality',
  'not found': () => '/nothing/here',
};
/** Screens that other people see differently. */
const shared = ['household', 'papers', 'review of one paper', 'shred lists', 'shred list', 'holds'];
const others: Record<Exclude<DemoRole, 'owner'>, string[]> = {
  assistant: ['households', 'boxes', ...shared],
  client: [...shared, 'reminders'],
  adviser: ['household', 'papers', 'shred lists', 'holds'],
};

let product: RunningProduct;
let browser: Browser;
let places: Places;

beforeAll(async () => {
  product = await startProduct({ hasDemo: true, hasWorker: false });
  browser = await launchBrowser();
  const { page, context } = await openPage(browser);
  await signInAs(page, product.url, 'owner');
  places = await findPlaces(page);
  await context.close();
});
afterAll(async () => {
  await browser.close();
  await product.close();
});

async function findPlaces(page: Page): Promise<Places> {
  type Items = { items: { id: string; name?: string }[] };
  const { items } = await callFrom<Items>(page, '/api/households');
  const household = items.find(({ name }) => name === 'Pennelow')?.id ?? '';
  const under = `/api/households/${household}`;
  const { today } = await callFrom<{ today: string }>(page, under);
  const waiting = await callFrom<Items>(page, `${under}/papers?status=to-review`);
  const list = await callFrom<{ id: string }>(page, `${under}/shred-lists`, {
    method: 'POST',
    body: { on: today },
  });
  return {
    household,
    box: (await callFrom<Items>(page, `${under}/boxes`)).items[0]?.id ?? '',
    paper: waiting.items[0]?.id ?? '',
    list: list.id,
  };
}

async function checkScreen(page: Page, address: string): Promise<string> {
  await page.goto(product.url + address);
  await page.getByRole('heading', { level: 1 }).first().waitFor({ state: 'attached' });
  await page.waitForLoadState('networkidle');
  expect(await page.getByRole('heading', { level: 1 }).count(), `h1 of ${address}`).toBe(1);
  await requireNoSidewaysScroll(page);
  await requireAccessible(page);
  return page.title();
}

describe('every screen', () => {
  test('is in this test', () => {
    const patterns = listPatterns(createRoutes(new QueryClient()));
    const anywhere: Places = { household: 'h', box: 'b', paper: 'p', list: 'l' };
    const addresses = [...Object.values(screens).map((make) => make(anywhere)), '/sign-in'];
    const missing = patterns.filter(
      (pattern) =>
        !addresses.some((address) => matchPath(pattern, new URL(address, 'http://a').pathname)),
    );
    expect(missing).toEqual([]);
  });

  for (const viewport of Object.keys(viewports) as (keyof typeof viewports)[]) {
    test(`is free of barriers for the owner at ${String(viewports[viewport].width)} px`, async () => {
      const { page, context, requireQuiet, expectNoise } = await openPage(browser, { viewport });
      await checkScreen(page, '/sign-in');
      await signInAs(page, product.url, 'owner');
      const titles = new Map<string, string>();
      for (const [name, make] of Object.entries(screens)) {
        const title = await checkScreen(page, make(places));
        expect(title, name).toMatch(/\S/);
        titles.set(name, title);
      }
      expect(titles.get('boxes')).not.toBe(titles.get('papers'));
      expectNoise(/404/);
      requireQuiet();
      await context.close();
    });
  }

  for (const role of Object.keys(others) as (keyof typeof others)[]) {
    test(`is free of barriers for the ${role}`, async () => {
      const { page, context, requireQuiet } = await openPage(browser, { viewport: 'phone' });
      await signInAs(page, product.url, role);
      for (const name of others[role]) await checkScreen(page, screens[name]?.(places) ?? '');
      requireQuiet();
      await context.close();
    });
  }
});

/** Patterns of the routes that show a screen. */
function listPatterns(routes: RouteObject[], under = ''): string[] {
  return routes.flatMap((route) => {
    const pattern = route.path ? `${under}/${route.path}`.replace(/\/+/g, '/') : under || '/';
    if (route.children) return listPatterns(route.children, pattern === '/' ? '' : pattern);
    return [pattern];
  });
}
