import { mkdtempSync, readdirSync, rmSync, statSync } from 'node:fs';
import http from 'node:http';
import os from 'node:os';
import path from 'node:path';
import { createTransport } from 'nodemailer';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { startMailCatcher } from '../../server/mail-catcher/catcher.ts';
import type { CaughtMail, MailCatcher } from '../../server/mail-catcher/catcher.ts';

let catcher: MailCatcher;
let folder: string;

beforeEach(async () => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'caught-'));
  catcher = await startMailCatcher({ folder });
});

afterEach(async () => {
  await catcher.close();
  rmSync(folder, { recursive: true });
});

async function sendMail(message: object): Promise<void> {
  const transport = createTransport(catcher.smtpUrl);
  try {
    await transport.sendMail({ from: 'Practice <p@x.example>', to: 'a@x.example', ...message });
  } finally {
    transport.close();
  }
}

async function readPage(page: string): Promise<string> {
  const response = await fetch(new URL(page, catcher.url));
  return response.text();
}

describe('the mail catcher', () => {
  test('keeps text, HTML, headers, attachments and every recipient', async () => {
    await sendMail({
      bcc: 'hidden@x.example',
      subject: 'Grüße',
      text: 'Hello',
      html: '<p>Hello</p>',
      headers: { 'List-Unsubscribe': '<https://x.example/u>' },
      attachments: [{ filename: 'list.pdf', content: Buffer.from('%PDF-1.7') }],
    });
    expect(catcher.messages()).toHaveLength(1);
    const [mail] = catcher.messages();
    expect(mail).toMatchObject({ id: 1, subject: 'Grüße', from: '"Practice" <p@x.example>' });
    expect(mail?.to).toEqual(['a@x.example', 'hidden@x.example']);
    expect(mail?.text.trim()).toBe('Hello');
    expect(mail?.html).toContain('<p>Hello</p>');
    expect(mail?.headers['list-unsubscribe']).toBe('<https://x.example/u>');
    expect(mail?.attachments).toMatchObject([{ name: 'list.pdf', sizeBytes: 8 }]);
  });

  test('keeps each mail as a file that only its owner can read', async () => {
    await sendMail({ subject: 'One', text: '.' });
    await sendMail({ subject: 'Two', text: '.' });
    const files = readdirSync(folder);
    expect(files).toHaveLength(2);
    expect(statSync(path.join(folder, files[0]!)).mode & 0o777).toBe(0o600);
  });

  test('lists the newest mail first, and programs get the same as JSON', async () => {
    await sendMail({ subject: 'First one', text: '.' });
    await sendMail({ subject: 'Second one', text: '.' });
    const page = await readPage('/');
    expect(page.indexOf('Second one')).toBeGreaterThan(0);
    expect(page.indexOf('Second one')).toBeLessThan(page.indexOf('First one'));
    const list = JSON.parse(await readPage('/messages.json')) as CaughtMail[];
    expect(list.map((mail) => mail.subject)).toEqual(['First one', 'Second one']);
  });

  test('shows a mail’s matter as text, and its HTML only inside a frame that runs nothing', async () => {
    await sendMail({
      subject: '<script>alert(1)</script>',
      text: 'Reset: https://x.example/reset?a=1&b=2. "quoted" <b>',
      html: '<script>alert(2)</script><p title="x">Hi</p>',
    });
    const page = await readPage('/mails/1');
    expect(page).not.toContain('<script');
    expect(page).not.toContain('<b>');
    expect(page).toContain('srcdoc="&lt;base target=&quot;_blank&quot;&gt;&lt;script&gt;');
    expect(page).toMatch(/sandbox="allow-popups allow-popups-to-escape-sandbox"/);
    expect(page).toContain('href="https://x.example/reset?a=1&amp;b=2"');
  });

  test('answers 404 for a mail that does not exist', async () => {
    const response = await fetch(new URL('/mails/7', catcher.url));
    expect(response.status).toBe(404);
  });

  test('hides the mails from a page that reaches it under another name', async () => {
    await sendMail({ subject: 'Private', text: '.' });
    const status = await new Promise((resolve, reject) => {
      const options = { headers: { host: 'elsewhere.example' } };
      http
        .get(new URL('/messages.json', catcher.url), options, (response) => {
          response.resume();
          resolve(response.statusCode);
        })
        .on('error', reject);
    });
    expect(status).toBe(403);
  });

  test('can fail for a while, as a real server does, and then takes mail again', async () => {
    catcher.refuseNext(1);
    await expect(sendMail({ subject: 'Once', text: '.' })).rejects.toMatchObject({
      responseCode: 451,
    });
    expect(catcher.messages()).toHaveLength(0);
    await sendMail({ subject: 'Again', text: '.' });
    expect(catcher.messages().map((mail) => mail.subject)).toEqual(['Again']);
  });

  test('lets a test wait for a mail, and says what came instead', async () => {
    const waiting = catcher.awaitMessage((mail) => mail.subject === 'Late');
    await sendMail({ subject: 'Early', text: '.' });
    await sendMail({ subject: 'Late', text: '.' });
    expect((await waiting).id).toBe(2);
    await expect(catcher.awaitMessage(() => false, 10)).rejects.toThrow(
      'Subjects caught: Early; Late',
    );
  });
});
