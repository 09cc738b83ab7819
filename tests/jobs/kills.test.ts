/** Reading survives the death of worker, server and database at any moment, and makes nothing twice. */
import { expect, test } from 'vitest';
import { outliveDatabase, runKillRounds } from '../support/kill-rounds.ts';

const demo = 'tests/fixtures/demo';
const small = [
  `${demo}/pennelow/scan-058.pdf`,
  `${demo}/pennelow/scan-104.pdf`,
  `${demo}/tarrow/download-072.pdf`,
  `${demo}/pennelow/scan-018.pdf`,
];
/** Set for the long run; every fifth round takes the database and every fifth the server down as well. */
const rounds = Number(process.env.KILL_ROUNDS ?? '4');
const pile =
  rounds > 5 ? [`${demo}/tarrow/pile-b.pdf`, `${demo}/pennelow/scan-078.pdf`, ...small] : small;

test('a pile read under kills is read as in peace', async () => {
  const report = await runKillRounds({ rounds, seed: 20261107, pile });
  process.stdout.write(
    `kills: ${report.rounds} rounds, ${report.interrupted} with reading under way, ` +
      `${report.databaseCrashes} of the database, ${report.serverKills} of the server; ` +
      `${report.stormy.pages.length} pages and ${report.stormy.papers.length} papers, ` +
      `undisturbed ${report.calm.pages.length} and ${report.calm.papers.length}\n`,
  );
  expect(report.calm.pages.length).toBeGreaterThan(4);
  expect(report.stormy.pages).toEqual(report.calm.pages);
  expect(report.stormy.papers).toEqual(report.calm.papers);
  expect(report.strayFiles).toEqual([]);
  expect(report.interrupted).toBeGreaterThan(0);
}, 600_000);

test('a worker whose database dies goes on by itself', async () => {
  const { calm, stormy } = await outliveDatabase(small.slice(0, 2), rounds > 5 ? 3 : 1);
  expect(stormy.pages).toEqual(calm.pages);
  expect(stormy.papers).toEqual(calm.papers);
}, 180_000);
