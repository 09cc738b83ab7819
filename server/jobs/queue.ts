/**
 * The job queue: pg-boss on the application's own database. A job is queued in the transaction that
 * saves its row, so that both are there or neither is.
 */
import PgBoss from 'pg-boss';
import type { Transaction } from 'sequelize';
import type { Database } from '../db/connection.ts';

export const queueNames = {
  readScan: 'read-scan',
  sendMail: 'send-mail',
  remind: 'remind',
} as const;
export type QueueName = (typeof queueNames)[keyof typeof queueNames];

export interface JobOptions {
  transaction?: Transaction;
  startAfterSeconds?: number;
  /** One waiting job per key. */
  singletonKey?: string;
  /** Higher goes first. */
  priority?: number;
}

export interface JobQueue {
  send(name: QueueName, payload: object, options?: JobOptions): Promise<void>;
  /** Whether the queue's tables answer. */
  check(): Promise<boolean>;
  stop(): Promise<void>;
}

/** Seconds after which a job whose worker vanished is handed out again. */
export const readScanExpireSeconds = 3600;

/** Starts a sender (and, through `boss`, a worker). Errors of the connection go to `onError`. */
export async function startQueue(
  databaseUrl: string,
  database: Database,
  onError: (error: Error) => void,
  options: { supervise?: boolean } = {},
): Promise<JobQueue & { boss: PgBoss }> {
  const boss = new PgBoss({
    connectionString: databaseUrl,
    schema: 'jobs',
    max: 4,
    supervise: options.supervise ?? false,
    schedule: options.supervise ?? false,
    maintenanceIntervalSeconds: 60,
  });
  boss.on('error', onError);
  await boss.start();
  await boss.createQueue(queueNames.readScan, {
    name: queueNames.readScan,
    retryLimit: 3,
    retryDelay: 5,
    retryBackoff: true,
    expireInSeconds: readScanExpireSeconds,
  });
  // Mail and reminders keep their own record of attempts; the queue only calls them.
  await boss.createQueue(queueNames.sendMail, {
    name: queueNames.sendMail,
    retryLimit: 2,
    retryDelay: 30,
  });
  await boss.createQueue(queueNames.remind, {
    name: queueNames.remind,
    retryLimit: 2,
    retryDelay: 60,
  });

  return {
    boss,
    async send(name, payload, { transaction, startAfterSeconds, singletonKey, priority } = {}) {
      await boss.send(name, payload, {
        ...(startAfterSeconds === undefined ? {} : { startAfter: startAfterSeconds }),
        ...(singletonKey === undefined ? {} : { singletonKey }),
        ...(priority === undefined ? {} : { priority }),
        ...(transaction ? { db: { executeSql: executeWith(database, transaction) } } : {}),
      });
    },
    async check() {
      try {
        await boss.getQueueSize(queueNames.readScan);
        return true;
      } catch {
        return false;
      }
    },
    async stop() {
      await boss.stop({ graceful: true, wait: true, timeout: 10_000 });
    },
  };
}

function executeWith(database: Database, transaction: Transaction) {
  return async (text: string, values: unknown[]) => {
    const [rows] = await database.query(text, {
      // Sequelize refuses undefined among bound values.
      bind: values.map((value) => (value === undefined ? null : value)),
      transaction,
    });
    return { rows };
  };
}
