/** A mail server for one's own machine: takes every mail, delivers none, shows them on a page. */
import { mkdirSync, writeFileSync } from 'node:fs';
import http from 'node:http';
import type { AddressInfo, Server } from 'node:net';
import path from 'node:path';
import { simpleParser } from 'mailparser';
import type { AddressObject, ParsedMail } from 'mailparser';
import { SMTPServer } from 'smtp-server';
import { renderInbox, renderMail } from './pages.ts';

export interface CaughtMail {
  /** Counts from 1 in the order of arrival. */
  id: number;
  from: string;
  /** Who the mail was really sent to, blind copies included. */
  to: string[];
  subject: string;
  text: string;
  html: string | null;
  /** Lower-case names; addresses and lists as one text. */
  headers: Record<string, string>;
  attachments: { name: string; contentType: string; sizeBytes: number; content: string }[];
  receivedAt: string;
}

export interface MailCatcher {
  /** For SMTP_URL. */
  smtpUrl: string;
  /** The page on which a person reads the mails; `/messages.json` gives them to programs. */
  url: string;
  messages(): readonly CaughtMail[];
  /** Forgets all mails. */
  clear(): void;
  /** Answers the next deliveries with a temporary error, as a full or failing server does. */
  refuseNext(count: number): void;
  /** The first mail for which `matches` holds, now or as soon as it arrives. */
  awaitMessage(matches: (mail: CaughtMail) => boolean, timeoutMs?: number): Promise<CaughtMail>;
  close(): Promise<void>;
}

export interface MailCatcherOptions {
  /** 0 takes any free port. */
  smtpPort?: number;
  httpPort?: number;
  /** Where each mail is kept as an `.eml` file; nowhere when left out. */
  folder?: string;
}

const largestMailBytes = 30 * 1024 * 1024;
const keptMails = 500;

/** Starts the catcher on loopback. */
export async function startMailCatcher(options: MailCatcherOptions = {}): Promise<MailCatcher> {
  let mails: CaughtMail[] = [];
  let count = 0;
  let refusals = 0;
  const listeners = new Set<(mail: CaughtMail) => void>();

  async function keep(source: Buffer, recipients: string[]): Promise<void> {
    const parsed = await simpleParser(source);
    count += 1;
    const mail = shapeMail(count, parsed, recipients);
    mails = [...mails, mail].slice(-keptMails);
    if (options.folder) writeMail(options.folder, mail, source);
    for (const listener of listeners) listener(mail);
  }

  const smtp = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    // A name may be given and is not checked: nothing leaves this machine.
    allowInsecureAuth: true,
    onAuth: (auth, _session, done) => done(null, { user: auth.username ?? 'anyone' }),
    size: largestMailBytes,
    disableReverseLookup: true,
    onData: (stream, session, done) => {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('error', done);
      stream.on('end', () => {
        if (refusals > 0) {
          refusals -= 1;
          done(Object.assign(new Error('Try again later'), { responseCode: 451 }));
          return;
        }
        const recipients = session.envelope.rcptTo.map((recipient) => recipient.address);
        keep(Buffer.concat(chunks), recipients).then(() => done(), done);
      });
    },
  });
  smtp.on('error', () => undefined);

  const web = http.createServer((request, response) => {
    answer(request, response, mails);
  });

  const smtpPort = await listen(smtp.server, options.smtpPort ?? 0);
  const httpPort = await listen(web, options.httpPort ?? 0);

  return {
    smtpUrl: `smtp://127.0.0.1:${smtpPort}`,
    url: `http://127.0.0.1:${httpPort}/`,
    messages: () => mails,
    clear: () => {
      mails = [];
    },
    refuseNext: (amount) => {
      refusals = amount;
    },
    awaitMessage: (matches, timeoutMs = 10_000) =>
      new Promise((resolve, reject) => {
        const present = mails.find(matches);
        if (present) {
          resolve(present);
          return;
        }
        const timer = setTimeout(() => {
          listeners.delete(listener);
          const subjects = mails.map((mail) => mail.subject).join('; ') || 'none';
          reject(new Error(`No such mail within ${timeoutMs} ms. Subjects caught: ${subjects}`));
        }, timeoutMs);
        const listener = (mail: CaughtMail) => {
          if (!matches(mail)) return;
          clearTimeout(timer);
          listeners.delete(listener);
          resolve(mail);
        };
        listeners.add(listener);
      }),
    close: async () => {
      web.closeAllConnections();
      await Promise.all([
        new Promise<void>((resolve) => smtp.close(() => resolve())),
        new Promise<void>((resolve) => web.close(() => resolve())),
      ]);
    },
  };
}

function listen(server: Server, port: number): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', () => resolve((server.address() as AddressInfo).port));
  });
}

function answer(
  request: http.IncomingMessage,
  response: http.ServerResponse,
  mails: readonly CaughtMail[],
): void {
  // A page elsewhere could point its own name at this machine and read the mails through it.
  const host = (request.headers.host ?? '').replace(/:\d+$/, '');
  if (!['127.0.0.1', 'localhost'].includes(host)) {
    send(response, 403, 'text/plain', 'Open this page as http://127.0.0.1');
    return;
  }
  const { pathname } = new URL(request.url ?? '/', 'http://catcher');
  const mail = mails.find(({ id }) => pathname === `/mails/${id}`);
  if (pathname === '/messages.json') {
    send(response, 200, 'application/json', JSON.stringify(mails));
  } else if (pathname === '/') {
    send(response, 200, 'text/html', renderInbox(mails));
  } else if (mail) {
    send(response, 200, 'text/html', renderMail(mail));
  } else {
    send(response, 404, 'text/plain', 'There is no such mail. It may be older than this start.');
  }
}

function send(response: http.ServerResponse, status: number, type: string, body: string): void {
  response.writeHead(status, {
    'content-type': `${type}; charset=utf-8`,
    'cache-control': 'no-store',
    'x-content-type-options': 'nosniff',
    'content-security-policy':
      "default-src 'none'; style-src 'unsafe-inline'; img-src data:; frame-src 'self'; " +
      "form-action 'none'; base-uri 'none'; frame-ancestors 'self'",
    'referrer-policy': 'no-referrer',
  });
  response.end(body);
}

function shapeMail(id: number, parsed: ParsedMail, recipients: string[]): CaughtMail {
  return {
    id,
    from: describeAddress(parsed.from),
    to: recipients,
    subject: parsed.subject ?? '',
    text: parsed.text ?? '',
    html: parsed.html || null,
    headers: Object.fromEntries(
      parsed.headerLines.map(({ key, line }) => [
        key,
        line
          .slice(line.indexOf(':') + 1)
          .replace(/\r?\n\s*/g, ' ')
          .trim(),
      ]),
    ),
    attachments: parsed.attachments.map((attachment) => ({
      name: attachment.filename ?? '',
      contentType: attachment.contentType,
      sizeBytes: attachment.size,
      content: attachment.content.toString('base64'),
    })),
    receivedAt: new Date().toISOString(),
  };
}

function describeAddress(address: AddressObject | undefined): string {
  return address?.text ?? '';
}

function writeMail(folder: string, mail: CaughtMail, source: Buffer): void {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  const stamp = mail.receivedAt.replace(/[:.]/g, '-');
  writeFileSync(path.join(folder, `${stamp}-${mail.id}.eml`), source, { mode: 0o600 });
}
