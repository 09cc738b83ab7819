/** The worker: takes jobs from the queue and calls one use-case for each. */
import { setTimeout } from 'node:timers/promises';
import { z } from 'zod';
import type PgBoss from 'pg-boss';
import { isConnectionLoss, untilDatabaseAnswers } from '../db/connection-loss.ts';
import type { Deps } from '../deps.ts';
import { createMailer, type Mailer } from '../mail/transport.ts';
import { createPageReader, type PageReader } from '../reading/page-reader.ts';
import { readingLimitsOf } from '../reading/pages/limits.ts';
import { sendMail, resumeMail } from '../use-cases/mail/send-mail.ts';
import { readScan } from '../use-cases/reading/read-scan.ts';
import { rescueReading, resumeReading } from '../use-cases/reading/resume-reading.ts';
import { sendReminders } from '../use-cases/reminders/send-reminders.ts';
import { queueNames, type JobQueue } from './queue.ts';

const readScanPayload = z.object({ scanId: z.uuid() });
const sendMailPayload = z.object({ mailId: z.uuid() });

/** Every quarter of an hour: households wake up in many time zones, and each reminder goes out once. */
const remindCron = '*/15 * * * *';

/** How long a stopping worker waits for the pages under way. */
const finishMs = 12_000;

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

  const stopping = new AbortController();
  const underWay = new Set<Promise<void>>();
  /** Keeps count of what is under way; after a loss of the database the job is given back when it answers again. */
  const handle = (work: (data: unknown) => Promise<void>) => async (jobs: { data: unknown }[]) => {
    for (const job of jobs) {
      const task = work(job.data).catch(async (error: unknown) => {
        if (isConnectionLoss(error)) await untilDatabaseAnswers(deps.database, stopping.signal);
        throw error;
      });
      underWay.add(task);
      await task.finally(() => underWay.delete(task));
    }
  };

  await boss.work(
    queueNames.readScan,
    { batchSize: 1, pollingIntervalSeconds: 0.5 },
    handle(async (data) => {
      const { scanId } = readScanPayload.parse(data);
      const startedAt = performance.now();
      await readScan(scanId, { ...deps, reader, stopping: stopping.signal });
      log.info({ scanId, ms: Math.round(performance.now() - startedAt) }, 'scan read');
    }),
  );
  await boss.work(
    queueNames.sendMail,
    { batchSize: 1, pollingIntervalSeconds: 1 },
    handle((data) => sendMail(sendMailPayload.parse(data).mailId, { ...deps, mailer })),
  );
  await boss.work(
    queueNames.remind,
    { batchSize: 1, pollingIntervalSeconds: 5 },
    handle(async () => {
      await rescueReading(deps);
      const messages = await sendReminders(deps);
      if (messages > 0) log.info({ messages }, 'reminders written');
      await resumeMail(deps);
    }),
  );
  await boss.schedule(queueNames.remind, remindCron, {});
  // What a killed worker was at, and a first look at the reminders, without waiting for the schedule.
  await resumeReading(deps);
  await deps.queue.send(queueNames.remind, {}, { singletonKey: 'at-start' });

  return {
    async stop() {
      stopping.abort();
      await Promise.all(Object.values(queueNames).map((name) => boss.offWork(name)));
      // A page that takes very long is left: it is read again from its beginning.
      const timer = new AbortController();
      await Promise.race([
        Promise.allSettled(underWay),
        setTimeout(finishMs, undefined, { signal: timer.signal }).catch(() => undefined),
      ]);
      timer.abort();
      await reader.close();
      mailer?.close();
    },
  };
}
