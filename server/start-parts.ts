/** What server and worker have in common: the parts that the application is built from. */
import { systemClock } from './clock.ts';
import type { Config } from './config.ts';
import { connectDatabase } from './db/connection.ts';
import { describeDatabaseFailure } from './db/describe-failure.ts';
import { listPendingMigrations } from './db/migrate.ts';
import type { WorkerDeps } from './jobs/worker.ts';
import { startQueue } from './jobs/queue.ts';
import { createLog } from './log.ts';
import { loadRuleTables } from './rule-tables.ts';
import { openScanStorage } from './storage/scan-storage.ts';

/** What both commands begin with; a fault that a person can mend is one sentence and exit status 1. */
export async function openDepsOrExit(
  config: Config,
  options: { supervise: boolean },
): Promise<Awaited<ReturnType<typeof openDeps>>> {
  try {
    const deps = await openDeps(config, options);
    if (await deps.storage.check()) return deps;
    throw new StartError(
      `The folder for scans, ${config.uploadsDir}, cannot be written to. Make it writable for this account, free some space, or set UPLOADS_DIR.`,
    );
  } catch (error) {
    const sentence = error instanceof StartError ? error.message : describeDatabaseFailure(error);
    if (sentence === null) throw error;
    process.stderr.write(`${sentence}\n`);
    process.exit(1);
  }
}

class StartError extends Error {}

/** Opens database, queue and storage, and reads the rule tables. */
export async function openDeps(
  config: Config,
  options: { supervise: boolean },
): Promise<WorkerDeps & { close(): Promise<void> }> {
  const log = createLog(config.logLevel);
  const ruleSet = loadRuleTables();
  const database = connectDatabase(config.databaseUrl);
  if ((await listPendingMigrations(database)).length > 0) {
    throw new StartError(
      'The database is not up to date. Run "npm run migrate", then start again.',
    );
  }
  const queue = await startQueue(
    config.databaseUrl,
    database,
    (error) => log.warn({ code: error.name }, 'queue connection lost'),
    options,
  );
  return {
    config,
    clock: systemClock,
    log,
    database,
    ruleSet,
    storage: openScanStorage(config.uploadsDir),
    queue,
    async close() {
      await queue.stop();
      await database.close();
    },
  };
}

/** Calls `stop` once on the first SIGINT or SIGTERM, then exits; a second signal exits at once. */
export function stopOnSignal(stop: () => Promise<void>): void {
  let isStopping = false;
  const onSignal = () => {
    if (isStopping) process.exit(1);
    isStopping = true;
    stop().then(
      () => process.exit(0),
      () => process.exit(1),
    );
  };
  process.on('SIGINT', onSignal);
  process.on('SIGTERM', onSignal);
}
