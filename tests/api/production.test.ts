/** What holds where real people's papers lie: no demo password, cookies over TLS alone, a full disk said plainly. */
import { readdirSync } from 'node:fs';
import path from 'node:path';
import request from 'supertest';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { createApp } from '../../server/app.ts';
import { demoPassword, hashPassword } from '../../server/auth/passwords.ts';
import type { BoxRecord } from '../../server/contract/boxes.ts';
import { ScanModel } from '../../server/db/models/scan-model.ts';
import { UserModel } from '../../server/db/models/user-model.ts';
import { startTestApp, type TestApp } from '../support/app.ts';
import { addPractice, testPassword, type TestPractice } from '../support/people.ts';

let app: TestApp;
let practice: TestPractice;

const isTls = { 'X-Forwarded-Proto': 'https' };

beforeAll(async () => {
  app = await startTestApp({
    env: {
      NODE_ENV: 'production',
      SMTP_URL: 'smtp://mail.example',
      PUBLIC_URL: 'https://slackwater.example',
      TRUST_PROXY: '1',
    },
  });
  practice = await addPractice();
});
afterAll(() => app.close());

/** Signs in through a proxy that ends TLS; answers the last response and the cookie to go on with. */
async function signIn(email: string, password: string) {
  const first = await request(app.app).get('/api/session').set(isTls);
  const cookie = cookieOf(first.headers['set-cookie']);
  const answer = await request(app.app)
    .post('/api/session')
    .set(isTls)
    .set('Cookie', cookie.value)
    .set('X-CSRF-Token', (first.body as { csrfToken: string }).csrfToken)
    .send({ email, password });
  return { answer, cookie };
}

function cookieOf(header: string | string[] | undefined): { value: string; attributes: string } {
  const [line = ''] = Array.isArray(header) ? header : [header ?? ''];
  const [value = '', ...attributes] = line.split(';');
  return { value, attributes: attributes.join(';') };
}

test('the password of the demo opens nothing', async () => {
  await UserModel.update(
    { passwordHash: await hashPassword(demoPassword) },
    { where: { email: practice.emails.client } },
  );
  const { answer } = await signIn(practice.emails.client, demoPassword);
  expect(answer.status).toBe(401);
  expect((await signIn(practice.emails.owner, testPassword)).answer.status).toBe(200);
});

test('cookies go over TLS alone, out of the reach of scripts and other sites', async () => {
  const { cookie } = await signIn(practice.emails.owner, testPassword);
  expect(cookie.attributes).toMatch(/Secure/);
  expect(cookie.attributes).toMatch(/HttpOnly/);
  expect(cookie.attributes).toMatch(/SameSite=Lax/);
  const plain = await request(app.app).get('/api/session');
  expect(plain.headers['set-cookie']).toBeUndefined();
  expect(plain.headers['strict-transport-security']).toMatch(/max-age/);
});

test('a full disk refuses the upload with a sentence and leaves nothing behind', async () => {
  const full = Object.assign(new Error('no space left on device'), { code: 'ENOSPC' });
  const broken = createApp({
    ...app.deps,
    storage: { ...app.deps.storage, writeScan: () => Promise.reject(full) },
  });
  const { answer } = await signIn(practice.emails.owner, testPassword);
  const cookie = cookieOf(answer.headers['set-cookie']).value;
  const { csrfToken } = answer.body as { csrfToken: string };
  const send = (url: string) =>
    request(broken.express)
      .post(url)
      .set({ ...isTls, Cookie: cookie, 'X-CSRF-Token': csrfToken });
  const made = await send(`/api/households/${practice.householdId}/boxes`).send({});
  const upload = await send(`/api/boxes/${(made.body as BoxRecord).id}/scans`).attach(
    'files',
    'tests/fixtures/hostile/plain-bill.pdf',
  );
  await broken.close();
  expect(upload.status).toBe(507);
  expect((upload.body as { detail: string }).detail).toMatch(/disk .* is full.*\.$/);
  expect(await ScanModel.count()).toBe(0);
  expect(readdirSync(path.join(app.deps.config.uploadsDir, '.incoming'))).toEqual([]);
});
