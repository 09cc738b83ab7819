import { randomBytes } from 'node:crypto';
import {
  chmodSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { startCluster } from '../../server/commands/support/postgres-cluster.mjs';
import { requirePostgres } from '../../server/commands/support/postgres-programs.mjs';
import { findProcessStart, isAlive } from '../../server/commands/support/process.mjs';

const prefix = 'slackwater-test-';

export interface ThrowawayCluster {
  port: number;
  urlOf: (database: string) => string;
  /** Kills the server as a power cut would, and starts it again on the same port. */
  crash: () => Promise<void>;
  /** Stops the server and deletes its files. */
  close: () => Promise<void>;
}

/** Starts a PostgreSQL in the system's temp folder, on a free port. Needs under two seconds. */
export async function startThrowawayCluster(): Promise<ThrowawayCluster> {
  sweepAbandonedClusters();
  const programs = await requirePostgres((line) => process.stderr.write(`${line}\n`));
  const folder = mkdtempSync(path.join(os.tmpdir(), prefix));
  writeFileSync(path.join(folder, 'owner'), `${process.pid} ${findProcessStart(process.pid)}`);
  // Whoever runs the server must be able to pass through this folder, not read it.
  chmodSync(folder, 0o711);
  const cluster = await startCluster({
    programs,
    dataDir: path.join(folder, 'data'),
    password: randomBytes(12).toString('hex'),
    isThrowaway: true,
  });
  return {
    port: cluster.port,
    urlOf: cluster.urlOf,
    crash: async () => {
      const file = path.join(folder, 'data', 'postmaster.pid');
      process.kill(Number(readFileSync(file, 'utf8').split('\n')[0]), 'SIGKILL');
      await cluster.restart();
    },
    close: async () => {
      await cluster.stop();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

/** Stops and deletes what test runs left behind that were killed. */
function sweepAbandonedClusters(): void {
  for (const name of readdirSync(os.tmpdir())) {
    if (!name.startsWith(prefix)) continue;
    const folder = path.join(os.tmpdir(), name);
    try {
      if (statSync(folder).uid !== process.getuid?.()) continue;
      const [pid, startedAt] = readFileSync(path.join(folder, 'owner'), 'utf8').split(' ');
      if (isAlive(Number(pid), startedAt)) continue;
      stopServerIn(path.join(folder, 'data'));
      rmSync(folder, { recursive: true, force: true });
    } catch {
      // Another run is making or sweeping it.
    }
  }
}

function stopServerIn(dataDir: string): void {
  try {
    const pid = Number(readFileSync(path.join(dataDir, 'postmaster.pid'), 'utf8').split('\n')[0]);
    const command = readFileSync(`/proc/${pid}/cmdline`, 'utf8');
    if (pid > 0 && command.includes(dataDir)) process.kill(pid, 'SIGQUIT');
  } catch {
    // It has no server any more.
  }
}
