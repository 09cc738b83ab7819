import type { Page } from 'playwright-core';

export type DemoRole = 'owner' | 'assistant' | 'client' | 'adviser';

/** Signs in by the form, as a person does. */
export async function signInAs(page: Page, url: string, role: DemoRole): Promise<void> {
  await page.goto(`${url}/sign-in`);
  await page.getByLabel('E-mail').fill(`${role}@demo.example`);
  await page.getByLabel('Password', { exact: true }).fill('slack-water-demo');
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((address) => !address.pathname.startsWith('/sign-in'));
  await page.getByRole('heading', { level: 1 }).waitFor();
}

/** Calls the API with the page's own session. */
export async function callFrom<T>(
  page: Page,
  path: string,
  options: { method?: string; body?: unknown } = {},
): Promise<T> {
  const answer = await page.evaluate(
    async ({ path: address, method, body }) => {
      const session = (await (await fetch('/api/session')).json()) as { csrfToken: string };
      const response = await fetch(address, {
        method,
        headers: { 'Content-Type': 'application/json', 'X-CSRF-Token': session.csrfToken },
        ...(body === null ? {} : { body }),
      });
      return { ok: response.ok, text: await response.text() };
    },
    {
      path,
      method: options.method ?? 'GET',
      body: options.body === undefined ? null : JSON.stringify(options.body),
    },
  );
  if (!answer.ok) throw new Error(`${path}: ${answer.text}`);
  return JSON.parse(answer.text) as T;
}
