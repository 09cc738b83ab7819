/** What server and worker have in common: the parts that the application is built from. */
import { systemClock } from './clock.ts';
import type { Config } from './config.ts';
import { connectDatabase } from './db/connection.ts';
import type { WorkerDeps } from './jobs/worker.ts';
import { startQueue } from './jobs/queue.ts';
import { createLog } from './log.ts';
import { loadRuleTables } from './rule-tables.ts';
import { openScanStorage } from './storage/scan-storage.ts';

/** Opens database, queue and storage, and reads the rule tables. */
export async function openDeps(
  config: Config,
  options: { supervise: boolean },
): Promise<WorkerDeps & { close(): Promise<void> }> {
  const log = createLog(config.logLevel);
  const ruleSet = loadRuleTables();
  const database = connectDatabase(config.databaseUrl);
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
