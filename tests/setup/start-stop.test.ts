/** Server and worker on a bad day: one clear sentence and exit status 1; and what they leave when they are stopped. */
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import net from 'node:net';
import type { AddressInfo } from 'node:net';
import os from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { run } from '../../server/commands/support/process.mjs';
import { tsxArgs } from '../../server/commands/support/project.mjs';
import { createBareDatabase, createTestDatabase, type TestDatabase } from '../support/database.ts';
import { startOldPostgres } from '../support/old-postgres.ts';

const parts = { server: 'server/index.ts', worker: 'server/commands/worker.ts' };
const migrate = 'server/commands/migrate.ts';

let database: TestDatabase;
let folder: string;

beforeAll(async () => {
  database = await createTestDatabase();
  folder = mkdtempSync(path.join(os.tmpdir(), 'slackwater-start-'));
});
afterAll(async () => {
  await database.drop();
  rmSync(folder, { recursive: true, force: true });
});

function environment(env: Record<string, string> = {}): NodeJS.ProcessEnv {
  return {
    PATH: process.env.PATH,
    DATABASE_URL: database.url,
    SESSION_SECRET: 'only for tests, never anywhere else',
    UPLOADS_DIR: folder,
    PORT: '0',
    LOG_LEVEL: 'warn',
    ...env,
  };
}

/** Starts a part, waits until it says that it is ready, and ends it with a signal. */
async function startAndEnd(file: string, ready: RegExp, signal: NodeJS.Signals) {
  const child = spawn(process.execPath, tsxArgs(file), {
    env: environment({ LOG_LEVEL: 'info' }),
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let output = '';
  const ended = once(child, 'exit');
  for (const stream of [child.stdout, child.stderr]) {
    stream.on('data', (chunk: Buffer) => {
      if (!ready.test(output) && ready.test((output += chunk.toString('utf8')))) child.kill(signal);
    });
  }
  const [code, by] = (await ended) as [number | null, string | null];
  return { code, by, said: ready.test(output) };
}

async function start(file: string, env: Record<string, string> = {}) {
  const { code, output } = await run(process.execPath, tsxArgs(file), {
    env: environment(env),
  });
  return { code, lines: output.trim().split('\n') };
}

function withUrl(change: (url: URL) => void): string {
  const url = new URL(database.url);
  change(url);
  return url.href;
}

/** One line, which ends as a sentence does, and exit status 1. */
function expectSentence(outcome: { code: number; lines: string[] }, words: RegExp): void {
  expect(outcome).toEqual({ code: 1, lines: [expect.stringMatching(words)] });
  expect(outcome.lines[0]).toMatch(/^[A-Z].*\.$/);
}

describe.each(Object.entries(parts))('the %s', (_name, file) => {
  test('says that the database does not answer', async () => {
    const url = withUrl((u) => {
      u.port = '1';
    });
    expectSentence(await start(file, { DATABASE_URL: url }), /does not answer/);
  });

  test('says that the password is refused', async () => {
    const url = withUrl((u) => {
      u.password = 'wrong';
    });
    expectSentence(await start(file, { DATABASE_URL: url }), /refuses the account or password/);
  });

  test('says that the database does not exist', async () => {
    const url = withUrl((u) => {
      u.pathname = '/nowhere';
    });
    expectSentence(await start(file, { DATABASE_URL: url }), /does not exist/);
  });

  test('says that the database is not up to date', async () => {
    const bare = await createBareDatabase();
    const outcome = await start(file, { DATABASE_URL: bare.url });
    await bare.drop();
    expectSentence(outcome, /npm run migrate/);
  });

  test('says that the folder for scans cannot be written to', async () => {
    const blocked = path.join(folder, 'a-file');
    writeFileSync(blocked, '');
    const outcome = await start(file, { UPLOADS_DIR: path.join(blocked, 'uploads') });
    expectSentence(outcome, /cannot be written to/);
  });

  test('makes nothing up in production', async () => {
    const { code, lines } = await start(file, {
      NODE_ENV: 'production',
      DATABASE_URL: '',
      SESSION_SECRET: '',
    });
    expect(code).toBe(1);
    for (const name of ['DATABASE_URL', 'SESSION_SECRET', 'SMTP_URL', 'PUBLIC_URL']) {
      expect(lines.filter((line) => line.includes(`${name} is missing`))).toHaveLength(1);
    }
  });
});

describe.each([
  ['server', parts.server, /"listening"/],
  ['worker', parts.worker, /"worker ready"/],
])('asked to stop, the %s', (_name, file, ready) => {
  test.each(['SIGTERM', 'SIGINT'] as const)('ends by itself after %s', async (signal) => {
    expect(await startAndEnd(file, ready, signal)).toEqual({ code: 0, by: null, said: true });
  });
});

describe('the server', () => {
  test('says that the port is taken', async () => {
    const other = net.createServer();
    await new Promise<void>((resolve) => other.listen(0, '127.0.0.1', resolve));
    const { port } = other.address() as AddressInfo;
    const outcome = await start(parts.server, { PORT: String(port) });
    other.close();
    expectSentence(outcome, new RegExp(`Port ${port} .* is taken`));
  });
});

describe('bringing a database up to date', () => {
  test('says that PostgreSQL is too old', async () => {
    const old = await startOldPostgres('140012');
    const outcome = await start(migrate, { DATABASE_URL: old.url });
    await old.close();
    expectSentence(outcome, /PostgreSQL 14 is too old/);
  });

  test('says that the database does not answer', async () => {
    const url = withUrl((u) => {
      u.port = '1';
    });
    expectSentence(await start(migrate, { DATABASE_URL: url }), /does not answer/);
  });
});
