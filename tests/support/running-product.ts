import { spawn } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { ensureClientBuilt } from '../../server/commands/support/client-build.mjs';
import { findFreePort, run } from '../../server/commands/support/process.mjs';
import { tsxArgs } from '../../server/commands/support/project.mjs';
import { startMailCatcher } from '../../server/mail-catcher/catcher.ts';
import type { MailCatcher } from '../../server/mail-catcher/catcher.ts';
import { createTestDatabase } from './database.ts';

/** The product as a person runs it: real processes on a database, a folder and a mail server. */
export interface RunningProduct {
  url: string;
  databaseUrl: string;
  uploadsDir: string;
  mail: MailCatcher;
  /** Starts another server or worker; they end with `close`. */
  start: (part: ProductPart) => Promise<RunningPart>;
  server: RunningPart;
  worker: RunningPart | null;
  close: () => Promise<void>;
}

export type ProductPart = 'server' | 'worker';

export interface RunningPart {
  process: ChildProcess;
  /** What it has printed so far. */
  output: () => string;
  /** Ends it with a signal, SIGTERM unless another is named, and waits for its end. */
  end: (signal?: NodeJS.Signals) => Promise<void>;
}

export interface ProductOptions {
  /** Loads the demo practice. */
  hasDemo?: boolean;
  /** Without a worker nothing is read and no mail is sent. */
  hasWorker?: boolean;
  env?: Record<string, string>;
}

const files: Record<ProductPart, string> = {
  server: 'server/index.ts',
  worker: 'server/commands/worker.ts',
};

/** Starts server and worker; needs some ten seconds, more when the client has to be built. */
export async function startProduct(options: ProductOptions = {}): Promise<RunningProduct> {
  const projectDir = process.cwd();
  await ensureClientBuilt(projectDir, () => undefined);
  const database = await createTestDatabase();
  const mail = await startMailCatcher();
  const uploadsDir = mkdtempSync(path.join(os.tmpdir(), 'slackwater-uploads-'));
  const port = await findFreePort();
  const url = `http://127.0.0.1:${port}`;
  const env: NodeJS.ProcessEnv = {
    PATH: process.env.PATH,
    NODE_ENV: 'development',
    DATABASE_URL: database.url,
    SMTP_URL: mail.smtpUrl,
    SESSION_SECRET: 'only for tests, never anywhere else',
    UPLOADS_DIR: uploadsDir,
    PORT: String(port),
    PUBLIC_URL: url,
    LOG_LEVEL: 'warn',
    READER_WORKERS: '1',
    ...options.env,
  };
  const parts: RunningPart[] = [];
  const start = async (part: ProductPart) => {
    const running = startPart(part, env);
    parts.push(running);
    if (part === 'server') await awaitHealth(url, running);
    return running;
  };
  const close = async () => {
    await Promise.all(parts.map((part) => part.end()));
    await mail.close();
    await database.drop();
    rmSync(uploadsDir, { recursive: true, force: true });
  };
  try {
    if (options.hasDemo && existsSync('server/commands/seed.ts')) {
      const seed = await run(process.execPath, tsxArgs('server/commands/seed.ts', ['--if-empty']), {
        env,
      });
      if (seed.code !== 0) throw new Error(`The demo was not loaded: ${seed.output}`);
    }
    const server = await start('server');
    const worker = options.hasWorker === false ? null : await start('worker');
    return { url, databaseUrl: database.url, uploadsDir, mail, start, server, worker, close };
  } catch (error) {
    await close();
    throw error;
  }
}

function startPart(part: ProductPart, env: NodeJS.ProcessEnv): RunningPart {
  const child = spawn(process.execPath, tsxArgs(files[part]), {
    env,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let output = '';
  for (const stream of [child.stdout, child.stderr]) {
    stream.on('data', (chunk: Buffer) => {
      output += chunk.toString('utf8');
    });
  }
  const ended = once(child, 'exit');
  return {
    process: child,
    output: () => output,
    end: async (signal = 'SIGTERM') => {
      if (child.exitCode !== null || child.signalCode !== null) return;
      child.kill(signal);
      const timer = setTimeout(() => child.kill('SIGKILL'), 20_000);
      await ended;
      clearTimeout(timer);
    },
  };
}

async function awaitHealth(url: string, part: RunningPart): Promise<void> {
  const deadlineMs = performance.now() + 60_000;
  while (performance.now() < deadlineMs) {
    if (part.process.exitCode !== null) break;
    const status = await fetch(`${url}/api/health`).then(
      (response) => response.status,
      () => 0,
    );
    if (status === 200) return;
    await new Promise((resolve) => setTimeout(resolve, 200));
  }
  throw new Error(`The server did not come up:\n${part.output()}`);
}
