/** What the application is built from; tests hand in their own clock, folder and queue. */
import type { Clock } from './clock.ts';
import type { Config } from './config.ts';
import type { JobQueue } from './jobs/queue.ts';
import type { Logger } from './log.ts';
import type { RuleSet } from './retention/rule-set.ts';
import type { Database } from './db/connection.ts';
import type { ScanStorage } from './storage/scan-storage.ts';

export interface Deps {
  config: Config;
  clock: Clock;
  log: Logger;
  database: Database;
  ruleSet: RuleSet;
  storage: ScanStorage;
  queue: JobQueue;
}
