import { insertMail } from '../../db/repositories/mail-repository.ts';
import type { Transaction } from '../../db/transaction.ts';
import type { Deps } from '../../deps.ts';
import { queueNames } from '../../jobs/queue.ts';
import type { ComposedMail } from '../../mail/letter.ts';

export interface MailTo {
  practiceId: string;
  userId: string | null;
  address: string;
}

/** Puts a message on record and queues its sending, in the caller's transaction; answers its id. */
export async function queueMail(
  to: MailTo,
  message: ComposedMail,
  { queue }: Pick<Deps, 'queue'>,
  transaction: Transaction,
): Promise<string> {
  const mailId = await insertMail({ ...to, ...message }, transaction);
  await queue.send(queueNames.sendMail, { mailId }, { transaction });
  return mailId;
}
