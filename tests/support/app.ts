/** The web application on a database of its own, with a clock that stands still and a queue that only notes. */
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { Express } from 'express';
import request from 'supertest';
import { createApp } from '../../server/app.ts';
import { createFixedClock, type FixedClock } from '../../server/clock.ts';
import { loadConfig } from '../../server/config.ts';
import { connectDatabase, type Database } from '../../server/db/connection.ts';
import type { Deps } from '../../server/deps.ts';
import type { JobQueue, QueueName } from '../../server/jobs/queue.ts';
import { silentLog } from '../../server/log.ts';
import { loadRuleTables } from '../../server/rule-tables.ts';
import { openScanStorage } from '../../server/storage/scan-storage.ts';
import { createTestDatabase } from './database.ts';

export interface QueuedJob {
  name: QueueName;
  payload: object;
}

export interface TestApp {
  app: Express;
  deps: Deps;
  clock: FixedClock;
  /** Jobs that were queued, in order. */
  jobs: QueuedJob[];
  /** A browser of its own, not signed in. */
  visit(): Promise<Visitor>;
  /** A browser that is signed in. */
  signIn(email: string, password: string): Promise<Visitor>;
  close(): Promise<void>;
}

/** Sends requests with the session's cookie and CSRF token. */
export interface Visitor {
  get(url: string): request.Test;
  post(url: string, body?: object): request.Test;
  put(url: string, body?: object): request.Test;
  patch(url: string, body: object, version?: number): request.Test;
  delete(url: string, version?: number): request.Test;
  agent: ReturnType<typeof request.agent>;
  csrfToken: string;
  /** The session's cookie, for requests that the agent cannot make. */
  cookie(): string;
}

/** The day on which tests play unless they say otherwise. */
export const testNow = '2026-11-07T10:00:00Z';

export interface TestAppOptions {
  now?: string;
  env?: Record<string, string>;
  /** A queue of one's own instead of the one that only notes; the application does not stop it. */
  openQueue?: (databaseUrl: string, database: Database) => Promise<JobQueue>;
}

export async function startTestApp(options: TestAppOptions = {}): Promise<TestApp> {
  const testDatabase = await createTestDatabase();
  const uploadsDir = await mkdtemp(path.join(tmpdir(), 'slackwater-uploads-'));
  const config = loadConfig({
    NODE_ENV: 'test',
    DATABASE_URL: testDatabase.url,
    SESSION_SECRET: 'only for tests, never anywhere else',
    UPLOADS_DIR: uploadsDir,
    PUBLIC_URL: 'http://slackwater.example',
    ...options.env,
  });
  const clock = createFixedClock(options.now ?? testNow);
  const jobs: QueuedJob[] = [];
  const database = connectDatabase(testDatabase.url, 8);
  const queue: JobQueue = (await options.openQueue?.(testDatabase.url, database)) ?? {
    send: (name, payload) => {
      jobs.push({ name, payload });
      return Promise.resolve();
    },
    check: () => Promise.resolve(true),
    stop: () => Promise.resolve(),
  };
  const deps: Deps = {
    config,
    clock,
    log: silentLog,
    database,
    ruleSet: loadRuleTables(),
    storage: openScanStorage(config.uploadsDir),
    queue,
  };
  const built = createApp(deps);
  const visit = () => openVisitor(built.express);
  return {
    app: built.express,
    deps,
    clock,
    jobs,
    visit,
    async signIn(email, password) {
      const visitor = await visit();
      const answer = await visitor.post('/api/session', { email, password });
      if (answer.status !== 200) throw new Error(`Not signed in: ${answer.text}`);
      return withToken(visitor.agent, (answer.body as { csrfToken: string }).csrfToken);
    },
    async close() {
      await built.close();
      await database.close();
      await testDatabase.drop();
      await rm(uploadsDir, { recursive: true, force: true });
    },
  };
}

async function openVisitor(app: Express): Promise<Visitor> {
  const agent = request.agent(app);
  const session = await agent.get('/api/session');
  return withToken(agent, (session.body as { csrfToken: string }).csrfToken);
}

function withToken(agent: ReturnType<typeof request.agent>, csrfToken: string): Visitor {
  const change = (test: request.Test, version?: number) => {
    void test.set('X-CSRF-Token', csrfToken);
    return version === undefined ? test : test.set('If-Match', `"${version}"`);
  };
  return {
    agent,
    csrfToken,
    cookie: () =>
      agent.jar
        .getCookies({ path: '/', domain: '127.0.0.1', secure: false, script: false })
        .toValueString(),
    get: (url) => agent.get(url),
    post: (url, body = {}) => change(agent.post(url)).send(body),
    put: (url, body = {}) => change(agent.put(url)).send(body),
    patch: (url, body, version) => change(agent.patch(url), version).send(body),
    delete: (url, version) => change(agent.delete(url), version),
  };
}
