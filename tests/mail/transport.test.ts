import { SMTPServer } from 'smtp-server';
import type { AddressInfo } from 'node:net';
import { afterEach, describe, expect, test } from 'vitest';
import type { MailCatcher } from '../../server/mail-catcher/catcher.ts';
import { startMailCatcher } from '../../server/mail-catcher/catcher.ts';
import type { Mailer, OutgoingMail } from '../../server/mail/transport.ts';
import { createMailer, MailError } from '../../server/mail/transport.ts';

const mailFrom = 'Slackwater <no-reply@slackwater.example>';
const message: OutgoingMail = {
  id: '0b5b6a0e-0000-4000-8000-000000000001',
  to: { name: 'Ada Brückner-Łukaszewicz', address: 'ada@marlow.example' },
  subject: 'Slackwater: 1 date to look at',
  text: 'Dear Ada,\n\nřádek\n',
  html: '<p>Dear Ada</p>',
};

const closers: (() => Promise<void> | void)[] = [];
afterEach(async () => {
  for (const close of closers.splice(0).reverse()) await close();
});

function openMailer(smtpUrl: string): Mailer {
  const mailer = createMailer({ smtpUrl, mailFrom });
  closers.push(() => mailer.close());
  return mailer;
}

async function openCatcher(): Promise<MailCatcher> {
  const catcher = await startMailCatcher();
  closers.push(() => catcher.close());
  return catcher;
}

async function readError(sending: Promise<unknown>): Promise<MailError> {
  const error: unknown = await sending.then(
    () => new Error('it was sent'),
    (fault: unknown) => fault,
  );
  if (!(error instanceof MailError)) throw error;
  return error;
}

describe('handing a message over', () => {
  test('carries words and names through, marked as written by a program', async () => {
    const catcher = await openCatcher();
    await openMailer(catcher.smtpUrl).sendMail(message);
    const [caught] = catcher.messages();
    expect(caught).toMatchObject({
      to: ['ada@marlow.example'],
      subject: message.subject,
      headers: { 'auto-submitted': 'auto-generated' },
    });
    expect(caught?.text).toContain('řádek');
    // RFC 2047: letters beyond ASCII travel encoded.
    expect(caught?.headers.to).toBe(
      '=?UTF-8?Q?Ada_Br=C3=BCckner-=C5=81ukaszewicz?= <ada@marlow.example>',
    );
  });

  test('gives the same message the same id every time, so that a second copy is recognised', async () => {
    const catcher = await openCatcher();
    const mailer = openMailer(catcher.smtpUrl);
    catcher.refuseNext(1);
    await readError(mailer.sendMail(message));
    const { messageId } = await mailer.sendMail(message);
    await mailer.sendMail(message);
    expect(messageId).toBe(`<${message.id}@slackwater.example>`);
    expect(catcher.messages().map(({ headers }) => headers['message-id'])).toEqual([
      messageId,
      messageId,
    ]);
  });

  test('lets no line break in a name or subject make a header', async () => {
    const catcher = await openCatcher();
    await openMailer(catcher.smtpUrl).sendMail({
      ...message,
      to: { name: 'Ada\r\nBcc: other@example.org', address: 'ada@marlow.example' },
      subject: 'Hello\r\nX-Marker: yes',
    });
    const [caught] = catcher.messages();
    expect(caught?.to).toEqual(['ada@marlow.example']);
    expect(caught?.headers).not.toHaveProperty('x-marker');
    expect(caught?.headers).not.toHaveProperty('bcc');
  });
});

describe('a fault', () => {
  test('that passes says so and names no address', async () => {
    const catcher = await openCatcher();
    catcher.refuseNext(1);
    const error = await readError(openMailer(catcher.smtpUrl).sendMail(message));
    expect(error.isRefused).toBe(false);
    expect(error.message).toContain('tried again');
    expect(error.message).not.toContain('marlow');
  });

  test('of a server that is not there says what to look at', async () => {
    const catcher = await startMailCatcher();
    await catcher.close();
    const error = await readError(openMailer(catcher.smtpUrl).sendMail(message));
    expect(error.message).toContain('could not be reached: check SMTP_URL');
    expect(error.isRefused).toBe(false);
  });

  test('that is a refusal of the address is told apart', async () => {
    const server = new SMTPServer({
      authOptional: true,
      disabledCommands: ['STARTTLS'],
      onRcptTo: (_address, _session, done) =>
        done(Object.assign(new Error('No such box: ada@marlow.example'), { responseCode: 550 })),
    });
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', () => resolve()));
    closers.push(() => new Promise<void>((resolve) => server.close(() => resolve())));
    const { port } = server.server.address() as AddressInfo;
    const error = await readError(openMailer(`smtp://127.0.0.1:${port}`).sendMail(message));
    expect(error.isRefused).toBe(true);
    expect(error.message).toBe(
      'The mail server refused the address (answer 550): check it with the person.',
    );
  });
});
