import { execFile } from 'node:child_process';
import { existsSync } from 'node:fs';
import http from 'node:http';
import type { AddressInfo } from 'node:net';
import { promisify } from 'node:util';
import { Client } from 'pg';
import { startThrowawayCluster } from './throwaway-cluster.ts';
import type { ThrowawayCluster } from './throwaway-cluster.ts';

const template = 'slackwater_template';

export interface ClusterBroker {
  url: string;
  close: () => Promise<void>;
}

interface ReadyCluster {
  cluster: ThrowawayCluster;
  admin: Client;
}

/**
 * A door on loopback through which test processes get databases. The cluster behind it starts with
 * the first request, so tests that need no database do not wait for one.
 *
 * `POST /databases?from=template|nothing` answers `{name, url}`; `DELETE /databases/NAME` drops it.
 */
export async function startClusterBroker(): Promise<ClusterBroker> {
  let ready: Promise<ReadyCluster> | null = null;
  let migrated: Promise<void> | null = null;
  let queue: Promise<unknown> = Promise.resolve();
  let count = 0;

  /** One statement at a time: PostgreSQL refuses to copy a template that is being copied. */
  function inTurn<T>(work: (cluster: ReadyCluster) => Promise<T>): Promise<T> {
    const turn = queue.then(async () => work(await (ready ??= startCluster())));
    queue = turn.catch(() => undefined);
    return turn;
  }

  const server = http.createServer((request, response) => {
    void answer(request).then(
      (body) => response.end(JSON.stringify(body)),
      (error: unknown) => {
        response.statusCode = 500;
        response.end(error instanceof Error ? error.message : String(error));
      },
    );
  });

  async function answer(request: http.IncomingMessage): Promise<object> {
    const url = new URL(request.url ?? '/', 'http://broker');
    if (request.method === 'DELETE') {
      const name = url.pathname.split('/').at(-1) ?? '';
      await inTurn(({ admin }) => admin.query(`drop database if exists "${name}" with (force)`));
      return {};
    }
    count += 1;
    const name = `test_${count}`;
    const isBare = url.searchParams.get('from') === 'nothing';
    return inTurn(async ({ admin, cluster }) => {
      if (!isBare) await (migrated ??= makeTemplate({ admin, cluster }));
      const source = isBare ? 'template0' : template;
      await admin.query(`create database "${name}" template "${source}"`);
      return { name, url: cluster.urlOf(name) };
    });
  }

  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return {
    url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    close: async () => {
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
      await queue;
      const started = await ready?.catch(() => null);
      if (!started) return;
      await started.admin.end();
      await started.cluster.close();
    },
  };
}

async function startCluster(): Promise<ReadyCluster> {
  const cluster = await startThrowawayCluster();
  const admin = new Client({ connectionString: cluster.urlOf('postgres') });
  admin.on('error', () => undefined);
  await admin.connect();
  return { cluster, admin };
}

async function makeTemplate({ admin, cluster }: ReadyCluster): Promise<void> {
  await admin.query(`create database "${template}"`);
  await migrateInChild(cluster.urlOf(template));
}

/** The same command as `npm run migrate`, so that the tests run what a person runs. */
async function migrateInChild(databaseUrl: string): Promise<void> {
  if (!existsSync('server/db/migrate.ts')) return;
  await promisify(execFile)(process.execPath, ['--import', 'tsx', 'server/commands/migrate.ts'], {
    env: { PATH: process.env.PATH, DATABASE_URL: databaseUrl, LOG_LEVEL: 'warn' },
  });
}
