/** The web application with everything behind it: a real queue, workers that read, and a mail server. */
import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { startQueue } from '../../server/jobs/queue.ts';
import { startWorker, type Worker, type WorkerDeps } from '../../server/jobs/worker.ts';
import { startMailCatcher, type MailCatcher } from '../../server/mail-catcher/catcher.ts';
import { startTestApp, type TestApp, type TestAppOptions } from './app.ts';

export interface WorkingApp extends TestApp {
  /** Where it listens, for requests that a test library cannot make. */
  url: string;
  mail: MailCatcher;
  workerDeps: WorkerDeps;
  /** Starts another worker; it ends with `close`. */
  startWorker(): Promise<Worker>;
}

/** Starts it without a worker, so that a test says when work begins. */
export async function startWorkingApp(options: TestAppOptions = {}): Promise<WorkingApp> {
  const mail = await startMailCatcher();
  let queue: Awaited<ReturnType<typeof startQueue>> | null = null;
  const app = await startTestApp({
    ...options,
    env: { SMTP_URL: mail.smtpUrl, READER_WORKERS: '2', ...options.env },
    openQueue: async (databaseUrl, database) => {
      queue = await startQueue(databaseUrl, database, () => undefined, { supervise: true });
      return queue;
    },
  });
  const ownQueue = requireQueue(queue);
  const workerDeps: WorkerDeps = { ...app.deps, queue: ownQueue };
  const workers: Worker[] = [];
  const server = createServer(app.app);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return {
    ...app,
    url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    mail,
    workerDeps,
    async startWorker() {
      const worker = await startWorker(workerDeps);
      workers.push(worker);
      return worker;
    },
    async close() {
      await closeServer(server);
      await Promise.all(workers.map((worker) => worker.stop()));
      await ownQueue.stop();
      await mail.close();
      await app.close();
    },
  };
}

type OpenQueue = Awaited<ReturnType<typeof startQueue>>;

function requireQueue(queue: OpenQueue | null): OpenQueue {
  if (!queue) throw new Error('The queue was not opened.');
  return queue;
}

async function closeServer(server: Server): Promise<void> {
  server.closeAllConnections();
  await new Promise((resolve) => server.close(resolve));
}
