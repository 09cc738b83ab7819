/** The worker: takes jobs from the queue and calls one use-case for each. */
import { z } from 'zod';
import type PgBoss from 'pg-boss';
import type { Deps } from '../deps.ts';
import { createMailer, type Mailer } from '../mail/transport.ts';
import { createPageReader, type PageReader } from '../reading/page-reader.ts';
import { readingLimitsOf } from '../reading/pages/limits.ts';
import { sendMail, resumeMail } from '../use-cases/mail/send-mail.ts';
import { readScan } from '../use-cases/reading/read-scan.ts';
import { resumeReading } from '../use-cases/reading/resume-reading.ts';
import { sendReminders } from '../use-cases/reminders/send-reminders.ts';
import { queueNames, type JobQueue } from './queue.ts';

const readScanPayload = z.object({ scanId: z.uuid() });
const sendMailPayload = z.object({ mailId: z.uuid() });

/** Every quarter of an hour: households wake up in many time zones, and each reminder goes out once. */
const remindCron = '*/15 * * * *';

export interface Worker {
  /** Finishes the page under way, hands the rest back and ends. */
  stop(): Promise<void>;
}

export interface WorkerDeps extends Omit<Deps, 'queue'> {
  queue: JobQueue & { boss: PgBoss };
}

/** Starts taking jobs. Handlers are safe to run twice. */
export async function startWorker(
  deps: WorkerDeps,
  parts: { reader?: PageReader; mailer?: Mailer | null } = {},
): Promise<Worker> {
  const { boss } = deps.queue;
  const { config, log } = deps;
  const reader =
    parts.reader ??
    createPageReader({
      workers: config.readerWorkers,
      limits: readingLimitsOf(config.limits),
      onFault: (detail) => log.warn({ detail }, 'reader fault'),
    });
  const mailer =
    parts.mailer !== undefined
      ? parts.mailer
      : config.smtpUrl
        ? createMailer({ smtpUrl: config.smtpUrl, mailFrom: config.mailFrom })
        : null;

  await boss.work(
    queueNames.readScan,
    { batchSize: 1, pollingIntervalSeconds: 0.5 },
    async (jobs) => {
      for (const job of jobs) {
        const { scanId } = readScanPayload.parse(job.data);
        const startedAt = performance.now();
        await readScan(scanId, { ...deps, reader });
        log.info({ scanId, ms: Math.round(performance.now() - startedAt) }, 'scan read');
      }
    },
  );
  await boss.work(
    queueNames.sendMail,
    { batchSize: 1, pollingIntervalSeconds: 1 },
    async (jobs) => {
      for (const job of jobs)
        await sendMail(sendMailPayload.parse(job.data).mailId, { ...deps, mailer });
    },
  );
  await boss.work(queueNames.remind, { batchSize: 1, pollingIntervalSeconds: 5 }, async () => {
    const messages = await sendReminders(deps);
    if (messages > 0) log.info({ messages }, 'reminders written');
    await resumeMail(deps);
  });
  await boss.schedule(queueNames.remind, remindCron, {});
  // What a killed worker was at, and a first look at the reminders, without waiting for the schedule.
  await resumeReading(deps);
  await deps.queue.send(queueNames.remind, {}, { singletonKey: 'at-start' });

  return {
    async stop() {
      await Promise.all(Object.values(queueNames).map((name) => boss.offWork(name)));
      await reader.close();
      mailer?.close();
    },
  };
}
