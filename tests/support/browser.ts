import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { AxeBuilder } from '@axe-core/playwright';
import { chromium } from 'playwright-core';
import type { Browser, BrowserContext, Page } from 'playwright-core';
import { findChromium } from '../../server/commands/support/chromium.mjs';

/** The two widths every screen is made for: a laptop on a kitchen table, a phone over a box. */
export const viewports = {
  laptop: { width: 1280, height: 800 },
  phone: { width: 390, height: 844 },
} as const;

/** Starts Debian's Chromium without a window. */
export function launchBrowser(): Promise<Browser> {
  const executablePath = findChromium();
  if (!executablePath) {
    throw new Error('Chromium is missing. Run "sudo apt-get install chromium" and try again.');
  }
  return chromium.launch({
    executablePath,
    args: ['--disable-background-networking', '--disable-gpu', '--disable-dev-shm-usage'],
  });
}

export interface WatchedPage {
  page: Page;
  context: BrowserContext;
  /** Throws when the page threw, or its console reported an error that was not expected. */
  requireQuiet: () => void;
  /** Says that errors matching `pattern` belong to this journey, such as a refused sign-in. */
  expectNoise: (pattern: RegExp) => void;
}

export interface PageOptions {
  viewport?: keyof typeof viewports;
  /** Set for a finger instead of a mouse; usual on the phone. */
  hasTouch?: boolean;
  baseUrl?: string;
}

/** A page in a browser profile of its own, whose console is listened to. */
export async function openPage(browser: Browser, options: PageOptions = {}): Promise<WatchedPage> {
  const viewport = options.viewport ?? 'laptop';
  const context = await browser.newContext({
    viewport: viewports[viewport],
    hasTouch: options.hasTouch ?? viewport === 'phone',
    locale: 'en-GB',
    timezoneId: 'Europe/London',
    reducedMotion: 'reduce',
    ...(options.baseUrl ? { baseURL: options.baseUrl } : {}),
  });
  context.setDefaultTimeout(20_000);
  const page = await context.newPage();
  const noise: string[] = [];
  const expected: RegExp[] = [];
  page.on('pageerror', (error) => noise.push(`thrown: ${error.message}`));
  page.on('console', (message) => {
    if (message.type() !== 'error') return;
    noise.push(`console: ${message.text()} (${message.location().url})`);
  });
  return {
    page,
    context,
    expectNoise: (pattern) => {
      expected.push(pattern);
    },
    requireQuiet: () => {
      const left = noise.filter((line) => !expected.some((pattern) => pattern.test(line)));
      if (left.length > 0) throw new Error(`The page complained:\n${left.join('\n')}`);
    },
  };
}

/**
 * Fails when axe finds something serious or critical on the page, or on a part of it, naming the
 * rule, the reason and each element.
 */
export async function requireAccessible(page: Page, within?: string): Promise<void> {
  const builder = new AxeBuilder({ page });
  const { violations } = await (within ? builder.include(within) : builder).analyze();
  const grave = violations.filter(({ impact }) => impact === 'serious' || impact === 'critical');
  if (grave.length === 0) return;
  const report = grave.map(({ id, help, nodes }) => {
    const places = nodes.map(
      (node) => `    ${node.target.join(' ')}: ${node.failureSummary?.replace(/\s+/g, ' ') ?? ''}`,
    );
    return `  ${id}: ${help}\n${places.join('\n')}`;
  });
  throw new Error(`axe found barriers at ${page.url()}:\n${report.join('\n')}`);
}

/** Fails when the page can be scrolled sideways, which it never should at any width. */
export async function requireNoSidewaysScroll(page: Page): Promise<void> {
  const { wide, view } = await page.evaluate(() => ({
    wide: document.documentElement.scrollWidth,
    view: document.documentElement.clientWidth,
  }));
  if (wide > view) throw new Error(`${page.url()} is ${wide} px wide in a window of ${view} px.`);
}

/**
 * Saves a picture of the page when SCREENSHOTS names a folder, as the script for the README does;
 * otherwise does nothing.
 */
export async function takeScreenshot(page: Page, name: string): Promise<void> {
  const folder = process.env.SCREENSHOTS;
  if (!folder) return;
  mkdirSync(folder, { recursive: true });
  await page.screenshot({ path: path.join(folder, `${name}.png`), animations: 'disabled' });
}
