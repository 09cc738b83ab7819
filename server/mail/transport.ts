/** Hands messages to the mail server named in SMTP_URL. */
import { createTransport } from 'nodemailer';
import type { ComposedMail } from './letter.ts';
import { tidyLine } from './letter.ts';

/** A message with the people at both ends. */
export interface OutgoingMail extends ComposedMail {
  /** Our own id of the message. The same id gives the same Message-ID, so that a retry is recognisable. */
  id: string;
  to: { name: string; address: string };
}

export interface Mailer {
  /** Resolves when the mail server has taken the message; rejects with a `MailError`. */
  sendMail(message: OutgoingMail): Promise<{ messageId: string }>;
  close(): void;
}

/** Why a message was not taken, in words for the practice, without addresses or what the message says. */
export class MailError extends Error {
  /** The mail server said that trying again is of no use, for example because the address does not exist. */
  readonly isRefused: boolean;

  constructor(message: string, isRefused: boolean, cause: unknown) {
    super(message, { cause });
    this.name = 'MailError';
    this.isRefused = isRefused;
  }
}

const timeoutMs = 20_000;

/**
 * @param settings.smtpUrl `smtp://` or `smtps://`, with user and secret where needed
 * @param settings.mailFrom `Name <address>`
 */
export function createMailer(settings: { smtpUrl: string; mailFrom: string }): Mailer {
  const transport = createTransport(
    {
      url: settings.smtpUrl,
      connectionTimeout: timeoutMs,
      greetingTimeout: timeoutMs,
      socketTimeout: timeoutMs,
      // A message is words we wrote: nothing in it is ever fetched from a disk or an address.
      disableFileAccess: true,
      disableUrlAccess: true,
    },
    { from: settings.mailFrom },
  );
  const domain = findDomain(settings.mailFrom);
  return {
    async sendMail(message) {
      const messageId = writeMessageId(message.id, domain);
      try {
        await transport.sendMail({
          messageId,
          to: { name: tidyLine(message.to.name), address: message.to.address },
          subject: tidyLine(message.subject),
          text: message.text,
          html: message.html,
          // RFC 3834: written by a program, so that absence notices do not answer it.
          headers: { 'Auto-Submitted': 'auto-generated' },
        });
      } catch (error) {
        throw describeMailError(error);
      }
      return { messageId };
    },
    close: () => transport.close(),
  };
}

/** The Message-ID (RFC 5322 section 3.6.4) of a message of ours. */
export function writeMessageId(id: string, domain: string): string {
  if (!/^[\w.-]+$/.test(id)) {
    throw new RangeError('The id of a message may hold letters, digits, dots and hyphens only.');
  }
  return `<${id}@${domain}>`;
}

function findDomain(mailFrom: string): string {
  return /@([\w.-]+)/.exec(mailFrom)?.[1] ?? 'localhost';
}

/** Turns a fault of the transport into a sentence. */
export function describeMailError(error: unknown): MailError {
  const { code, responseCode } = readFault(error);
  const answer = responseCode === null ? '' : ` (answer ${responseCode})`;
  // RFC 5321 section 4.2.1: 5yz is a permanent refusal, 4yz a passing one.
  const isRefused = responseCode !== null && responseCode >= 500;
  switch (code) {
    case 'EAUTH':
      return new MailError(
        `The mail server did not accept the sign-in${answer}: check SMTP_URL.`,
        false,
        error,
      );
    case 'EENVELOPE':
      return new MailError(
        isRefused
          ? `The mail server refused the address${answer}: check it with the person.`
          : `The mail server cannot take messages for this address now${answer}; it is tried again.`,
        isRefused,
        error,
      );
    case 'ECONNECTION':
    case 'ESOCKET':
    case 'EDNS':
    case 'ECONNREFUSED':
      return new MailError(
        'The mail server could not be reached: check SMTP_URL and whether the server runs. The message is tried again.',
        false,
        error,
      );
    case 'ETIMEDOUT':
      return new MailError(
        'The mail server did not answer in time. The message is tried again.',
        false,
        error,
      );
    default:
      return new MailError(
        isRefused
          ? `The mail server refused the message${answer}.`
          : `The message could not be handed over${answer}; it is tried again.`,
        isRefused,
        error,
      );
  }
}

function readFault(error: unknown): { code: string | null; responseCode: number | null } {
  if (typeof error !== 'object' || error === null) return { code: null, responseCode: null };
  const code = 'code' in error && typeof error.code === 'string' ? error.code : null;
  const responseCode =
    'responseCode' in error && typeof error.responseCode === 'number' ? error.responseCode : null;
  return { code, responseCode };
}
