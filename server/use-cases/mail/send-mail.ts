/** Sends one message on record; a failure is written down with the time of the next attempt. */
import {
  lockWaitingMail,
  listOverdueMailIds,
  updateMail,
} from '../../db/repositories/mail-repository.ts';
import { findUser } from '../../db/repositories/user-repository.ts';
import { inTransaction } from '../../db/transaction.ts';
import type { Deps } from '../../deps.ts';
import { queueNames } from '../../jobs/queue.ts';
import { findNextAttemptAt } from '../../mail/retry.ts';
import type { Mailer } from '../../mail/transport.ts';

export interface SendMailDeps extends Pick<Deps, 'clock' | 'queue'> {
  /** Null when no mail server is set. */
  mailer: Mailer | null;
}

/**
 * Sends the message unless it was sent or is being sent. The row stays locked while the mail server is
 * spoken to, so that two workers never send it twice; the Message-ID tells a repeat after a crash.
 */
export async function sendMail(mailId: string, deps: SendMailDeps): Promise<void> {
  await inTransaction(async (transaction) => {
    const mail = await lockWaitingMail(mailId, transaction);
    if (!mail) return;
    const now = deps.clock.now();
    if (mail.nextAttemptAt && mail.nextAttemptAt > now) return;
    const attempts = mail.attempts + 1;
    const error = await attempt(mail, deps.mailer);
    if (error === null) {
      await updateMail(
        mail.id,
        { state: 'sent', attempts, sentAt: now, nextAttemptAt: null, lastError: null },
        transaction,
      );
      return;
    }
    const nextAttemptAt = findNextAttemptAt({
      failures: attempts,
      createdAt: mail.createdAt,
      failedAt: now,
    });
    await updateMail(
      mail.id,
      { state: 'failing', attempts, nextAttemptAt, lastError: error },
      transaction,
    );
    const waitMs = nextAttemptAt.getTime() - now.getTime();
    await deps.queue.send(
      queueNames.sendMail,
      { mailId },
      { transaction, startAfterSeconds: Math.max(1, Math.ceil(waitMs / 1000)) },
    );
  });
}

/** Queues every message whose time has come and whose job may have been lost. */
export async function resumeMail(deps: Pick<Deps, 'clock' | 'queue'>): Promise<void> {
  for (const mailId of await listOverdueMailIds(deps.clock.now())) {
    await deps.queue.send(queueNames.sendMail, { mailId }, { singletonKey: mailId });
  }
}

/** Null when the mail server took it, else why not. */
async function attempt(
  mail: {
    id: string;
    userId: string | null;
    address: string;
    subject: string;
    text: string;
    html: string;
  },
  mailer: Mailer | null,
): Promise<string | null> {
  if (!mailer) return 'No mail server is set. Set SMTP_URL; the message is then sent by itself.';
  const user = mail.userId ? await findUser(mail.userId) : null;
  try {
    await mailer.sendMail({
      id: mail.id,
      to: { name: user?.name ?? '', address: mail.address },
      subject: mail.subject,
      text: mail.text,
      html: mail.html,
    });
    return null;
  } catch (error) {
    return error instanceof Error ? error.message : 'The mail server did not take the message.';
  }
}
