/**
 * `npm run bench:rules [-- --papers 200000] [--assessments 1000000]`: how quick the sum is in memory, and how quick
 * stored papers follow an edit of the rules. Needs PostgreSQL's programs; makes a database of its own and removes it.
 */
import { randomBytes } from 'node:crypto';
import { chmodSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { parseArgs } from 'node:util';
import { connectDatabase } from '../db/connection.ts';
import { migrate } from '../db/migrate.ts';
import { loadRuleTables } from '../rule-tables.ts';
import { measureInDatabase } from './measuring/bench-database.ts';
import { measureInMemory } from './measuring/bench-memory.ts';
import { startCluster } from './support/postgres-cluster.mjs';
import { requirePostgres } from './support/postgres-programs.mjs';

const memoryGoal = 4;
const databaseGoal = 3;
const papersEach = 5000;

const { values } = parseArgs({
  options: {
    papers: { type: 'string', default: '200000' },
    assessments: { type: 'string', default: '1000000' },
  },
});
const say = (line: string): void => void process.stdout.write(`${line}\n`);
const ruleSet = loadRuleTables();
let isMissed = false;

function judge(what: string, ratio: number, goal: number): void {
  if (ratio > goal) isMissed = true;
  say(`${what}: ${ratio.toFixed(2)} times, ${ratio > goal ? 'MORE than' : 'within'} ${goal}.`);
}

function benchMemory(): void {
  const figures = measureInMemory(ruleSet, Number(values.assessments));
  const perSum = (figures.sumMs * 1000) / figures.assessments;
  say(
    `${figures.assessments} sums with ${figures.steps} steps: ${Math.round(figures.sumMs)} ms, ${perSum.toFixed(1)} µs each.`,
  );
  say(
    `The same ${figures.days} days parsed, added to and formatted: ${Math.round(figures.loopMs)} ms.`,
  );
  judge('Sums beside the loop', figures.sumMs / figures.loopMs, memoryGoal);
}

async function benchDatabase(): Promise<void> {
  const folder = mkdtempSync(path.join(tmpdir(), 'slackwater-bench-'));
  // The server may run under another account, which must be able to pass through.
  chmodSync(folder, 0o711);
  const cluster = await startCluster({
    programs: await requirePostgres(say),
    dataDir: path.join(folder, 'data'),
    password: randomBytes(12).toString('hex'),
    isThrowaway: true,
  });
  try {
    const url = cluster.urlOf('postgres');
    await migrate(url);
    const database = connectDatabase(url, 6);
    try {
      const households = Math.max(1, Math.round(Number(values.papers) / papersEach));
      const figures = await measureInDatabase(database, ruleSet, { households, papersEach }, say);
      const megabytes = (bytes: number): string => `${Math.round(bytes / 1024 / 1024)} MB`;
      say(
        `${figures.papers} stored papers assessed anew (${figures.moved} carry the new version): ${Math.round(figures.reassessMs)} ms.`,
      );
      say(`One UPDATE of the same columns on the same rows: ${Math.round(figures.updateMs)} ms.`);
      say(
        `Memory ${megabytes(figures.memory.before)} before, ${megabytes(figures.memory.most)} at most.`,
      );
      say(
        `Meanwhile ${figures.others.asked} pages of the register, 95 of 100 within ${Math.round(figures.others.registerMs)} ms; the event loop waited ${Math.round(figures.others.loopMs)} ms at worst.`,
      );
      if (figures.moved !== figures.papers) isMissed = true;
      judge(
        'Assessing anew beside the UPDATE',
        figures.reassessMs / figures.updateMs,
        databaseGoal,
      );
    } finally {
      await database.close();
    }
  } finally {
    await cluster.stop();
    rmSync(folder, { recursive: true, force: true });
  }
}

benchMemory();
await benchDatabase();
process.exitCode = isMissed ? 1 : 0;
