/** Reads a pile while server, worker and database are killed again and again, and once in peace. */
import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { Client } from 'pg';
import { findFreePort } from '../../server/commands/support/process.mjs';
import { tsxArgs } from '../../server/commands/support/project.mjs';
import { signInOverHttp, type HttpVisitor } from '../../server/commands/demo/http-visitor.ts';
import { boxEndpoints } from '../../server/contract/boxes.ts';
import { scanEndpoints } from '../../server/contract/scans.ts';
import { connectDatabase, type Database } from '../../server/db/connection.ts';
import { migrate } from '../../server/db/migrate.ts';
import { selectRows } from '../../server/db/repositories/sql.ts';
import { createFixedClock } from '../../server/clock.ts';
import { openScanStorage } from '../../server/storage/scan-storage.ts';
import { sweepLeftovers } from '../../server/use-cases/scans/sweep-leftovers.ts';
import { eventually } from './eventually.ts';
import { addPractice, testPassword, type TestPractice } from './people.ts';
import { startThrowawayCluster, type ThrowawayCluster } from './throwaway-cluster.ts';

export interface KillReport {
  rounds: number;
  /** Rounds in which something was still unread when the worker died. */
  interrupted: number;
  databaseCrashes: number;
  serverKills: number;
  calm: Reading;
  stormy: Reading;
  /** Files in the folder of the household, beside those of scans and pages that are on record. */
  strayFiles: string[];
}

/** What was read, without ids and running numbers. */
export interface Reading {
  pages: object[];
  papers: object[];
}

interface Stage {
  cluster: ThrowawayCluster;
  database: Database;
  env: NodeJS.ProcessEnv;
  url: string;
  parts: Set<ChildProcess>;
}

const files = { server: 'server/index.ts', worker: 'server/commands/worker.ts' };

/**
 * @param options.seed the same seed chooses the same moments
 * @param options.pile paths of the files
 */
export async function runKillRounds(options: {
  rounds: number;
  seed: number;
  pile: string[];
}): Promise<KillReport> {
  return onStage(async (stage, uploadsDir) => {
    let server = await startServer(stage);
    const calm = await readInPeace(stage, options.pile);

    const practice = await addPractice('storm');
    const { visitor, boxId } = await openBox(stage, practice);
    const random = createRandom(options.seed);
    const report = { rounds: options.rounds, interrupted: 0, databaseCrashes: 0, serverKills: 0 };
    const [first = '', ...later] = options.pile;
    // The rest of the pile arrives while things break.
    await visitor.upload(boxId, [loadFile(first), ...later.slice(1).map(loadFile)]);
    for (let round = 0; round < options.rounds; round += 1) {
      const worker = await startWorker(stage);
      await pause(random() * 1800);
      if (round % 5 === 1) {
        await stage.cluster.crash();
        report.databaseCrashes += 1;
        await eventually(() => isWell(stage), 'the server well after the database came back');
        await pause(random() * 1500);
      }
      if (round % 5 === 3) {
        const sending = visitor.upload(boxId, later.map(loadFile)).catch(() => null);
        await pause(random() * 60);
        await kill(server);
        await sending;
        report.serverKills += 1;
        server = await startServer(stage);
      }
      await kill(worker);
      if ((await countUnread(practice.householdId)) > 0) report.interrupted += 1;
    }
    await visitor.upload(boxId, later.map(loadFile));
    await readToTheEnd(stage, visitor, boxId);
    // As the start of a server two hours later does.
    const hoursLater = createFixedClock(new Date(Date.now() + 2 * 60 * 60 * 1000));
    await sweepLeftovers({ storage: openScanStorage(uploadsDir), clock: hoursLater });
    return {
      ...report,
      calm,
      stormy: await describeReading(practice.householdId),
      strayFiles: await findStrayFiles(uploadsDir, practice.householdId),
    };
  });
}

/** One worker reads a pile while the database dies under it; nobody starts the worker again. */
export async function outliveDatabase(
  pile: string[],
  crashes: number,
): Promise<{ calm: Reading; stormy: Reading }> {
  return onStage(async (stage) => {
    await startServer(stage);
    const calm = await readInPeace(stage, pile);
    const practice = await addPractice('storm');
    const { visitor, boxId } = await openBox(stage, practice);
    await visitor.upload(boxId, pile.map(loadFile));
    await startWorker(stage);
    for (let crash = 0; crash < crashes; crash += 1) {
      const before = await countPages(practice.householdId);
      await eventually(
        async () => (await countPages(practice.householdId)) > before,
        'another page read',
      );
      await stage.cluster.crash();
      await eventually(() => isWell(stage), 'the server well after the database came back');
    }
    await eventually(
      async () => (await countUnread(practice.householdId)) === 0,
      'everything read by the worker that was there',
    );
    return { calm, stormy: await describeReading(practice.householdId) };
  });
}

/** A database, a folder and processes of their own, all gone afterwards. */
async function onStage<T>(work: (stage: Stage, uploadsDir: string) => Promise<T>): Promise<T> {
  const uploadsDir = mkdtempSync(path.join(os.tmpdir(), 'slackwater-kills-'));
  const cluster = await startThrowawayCluster();
  const stage = await setUp(cluster, uploadsDir);
  try {
    return await work(stage, uploadsDir);
  } finally {
    for (const part of stage.parts) part.kill('SIGKILL');
    await stage.database.close();
    await cluster.close();
    rmSync(uploadsDir, { recursive: true, force: true });
  }
}

async function setUp(cluster: ThrowawayCluster, uploadsDir: string): Promise<Stage> {
  const admin = new Client({ connectionString: cluster.urlOf('postgres') });
  await admin.connect();
  await admin.query('create database kills');
  await admin.end();
  const databaseUrl = cluster.urlOf('kills');
  await migrate(databaseUrl);
  const port = await findFreePort();
  const url = `http://127.0.0.1:${port}`;
  return {
    cluster,
    database: connectDatabase(databaseUrl, 3),
    url,
    parts: new Set(),
    env: {
      PATH: process.env.PATH,
      DATABASE_URL: databaseUrl,
      SESSION_SECRET: 'only for tests, never anywhere else',
      UPLOADS_DIR: uploadsDir,
      PORT: String(port),
      PUBLIC_URL: url,
      LOG_LEVEL: 'info',
      READER_WORKERS: '2',
    },
  };
}

async function readInPeace(stage: Stage, pile: string[]): Promise<Reading> {
  const practice = await addPractice('calm');
  const { visitor, boxId } = await openBox(stage, practice);
  await visitor.upload(boxId, pile.map(loadFile));
  await readToTheEnd(stage, visitor, boxId);
  return describeReading(practice.householdId);
}

async function readToTheEnd(stage: Stage, visitor: HttpVisitor, boxId: string): Promise<void> {
  const worker = await startWorker(stage);
  await eventually(
    async () => {
      const { items } = await visitor.call(scanEndpoints.listScans, { params: { id: boxId } });
      return items.every(({ status }) => status === 'read' || status === 'failed');
    },
    'everything read',
    240_000,
  );
  const ended = once(worker, 'exit');
  worker.kill('SIGTERM');
  await ended;
}

async function openBox(stage: Stage, practice: TestPractice) {
  const visitor = await signInOverHttp(stage.url, {
    email: practice.emails.owner,
    password: testPassword,
  });
  const { id } = await visitor.call(boxEndpoints.createBox, {
    params: { id: practice.householdId },
    body: { label: 'Pile' },
  });
  return { visitor, boxId: id };
}

function loadFile(file: string): { name: string; bytes: Uint8Array<ArrayBuffer> } {
  return { name: path.basename(file), bytes: Uint8Array.from(readFileSync(file)) };
}

async function startServer(stage: Stage): Promise<ChildProcess> {
  const server = startPart(stage, 'server');
  await eventually(() => isWell(stage), 'the server up');
  return server;
}

/** Resolves when the worker takes jobs. */
async function startWorker(stage: Stage): Promise<ChildProcess> {
  const worker = startPart(stage, 'worker');
  let output = '';
  for (const stream of [worker.stdout, worker.stderr]) {
    stream?.on('data', (chunk: Buffer) => {
      output += chunk.toString('utf8');
    });
  }
  await eventually(() => Promise.resolve(output.includes('worker ready')), 'the worker ready');
  return worker;
}

function startPart(stage: Stage, part: keyof typeof files): ChildProcess {
  const child = spawn(process.execPath, tsxArgs(files[part]), {
    env: stage.env,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  child.stdout.resume();
  child.stderr.resume();
  stage.parts.add(child);
  return child;
}

async function kill(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const ended = once(child, 'exit');
  child.kill('SIGKILL');
  await ended;
}

async function isWell({ url }: Stage): Promise<boolean> {
  return fetch(`${url}/api/health`).then(
    ({ status }) => status === 200,
    () => false,
  );
}

async function countPages(householdId: string): Promise<number> {
  const rows = await selectRows<{ count: number }>(
    'select count(*)::int as count from pages where household_id = $householdId',
    { householdId },
  );
  return rows[0]?.count ?? 0;
}

async function countUnread(householdId: string): Promise<number> {
  const rows = await selectRows<{ count: number }>(
    `select count(*)::int as count from scans
     where household_id = $householdId and status in ('waiting', 'reading')`,
    { householdId },
  );
  return rows[0]?.count ?? 0;
}

async function describeReading(householdId: string): Promise<Reading> {
  const [pages, papers] = await Promise.all([
    selectRows(
      `select s.sha256, s.status, s.reason, g.number, g.position, g.blank, g.code, g.turned, g.source,
         g.width, g.height, g.text
       from scans s left join pages g on g.scan_id = s.id
       where s.household_id = $householdId order by s.sha256, g.number`,
      { householdId },
    ),
    selectRows(
      `select s.sha256, p.class, p.confidence, p.country, p.facts, p.text, p.sheets, p.status,
         p.key_date::text as "keyDate", p.keep_until::text as "keepUntil",
         (select array_agg(g.number order by g.number) from pages g where g.paper_id = p.id) as pages
       from papers p join scans s on s.id = p.scan_id
       where p.household_id = $householdId order by s.sha256, pages`,
      { householdId },
    ),
  ]);
  return { pages, papers };
}

/** Half-written and forgotten files; pictures of pages and scans that are on record are none. */
async function findStrayFiles(uploadsDir: string, householdId: string): Promise<string[]> {
  const { readdir } = await import('node:fs/promises');
  const scans = await selectRows<{ id: string; pages: number }>(
    `select s.id, count(g.id)::int as pages from scans s left join pages g on g.scan_id = s.id
     where s.household_id = $householdId group by s.id`,
    { householdId },
  );
  const known = new Set(scans.map(({ id }) => id));
  const names = await readdir(path.join(uploadsDir, householdId), { recursive: true });
  return names.filter((name) => {
    const [scan = '', file = ''] = name.split(path.sep);
    if (!known.has(scan)) return true;
    return file !== '' && !/^(scan|\d{4}-(image|thumbnail)\.jpg)$/.test(file);
  });
}

function pause(ms: number): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve, ms));
}

/** Mulberry32: the same numbers from 0 to 1 for the same seed. */
function createRandom(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
}
