/** The checks behind `npm test`. */
import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import process from 'node:process';
import { requireChromium } from './chromium.mjs';
import { ensureDependencies } from './dependencies.mjs';
import { requirePostgres } from './postgres-programs.mjs';
import { PlainError } from './process.mjs';
import { projectDir, tsxArgs } from './project.mjs';

/**
 * @typedef {object} Check
 * @property {string} name
 * @property {string[]} args for Node.js
 * @property {string} [report] where vitest writes its counts
 */
/** @typedef {{ passed: number, failed: number }} Counts */
/** @typedef {{ code: number, output: string, seconds: number }} Outcome */

/** @param {string} line */
const say = (line) => console.log(line);

/**
 * Runs all checks and prints how many tests passed and failed.
 * @returns {Promise<number>} the exit status: 0 when everything is well
 */
export async function runAllChecks() {
  process.chdir(projectDir);
  const startedAtMs = performance.now();
  const reportDir = mkdtempSync(path.join(os.tmpdir(), 'slackwater-report-'));
  /** @type {string[]} */
  const reports = [];
  let isWell = true;
  try {
    await ensureDependencies(projectDir, say);
    await requirePostgres(say);
    await requireChromium(say);
    for (const group of listCheckGroups(reportDir)) {
      const outcomes = await Promise.all(group.map(runCheck));
      for (const [index, check] of group.entries()) {
        const outcome = /** @type {Outcome} */ (outcomes[index]);
        if (check.report) reports.push(check.report);
        const word = outcome.code === 0 ? 'well' : 'FAILED';
        say(`${check.name}: ${word} in ${outcome.seconds.toFixed(1)} s`);
        if (outcome.code === 0) continue;
        isWell = false;
        say(outcome.output.trimEnd());
      }
      if (!isWell) break;
    }
  } catch (error) {
    if (!(error instanceof PlainError)) throw error;
    console.error(error.message);
    return 1;
  } finally {
    const counts = sumCounts(reports);
    rmSync(reportDir, { recursive: true, force: true });
    say(`All in ${((performance.now() - startedAtMs) / 1000).toFixed(0)} s.`);
    // A check that fails outside the tests must not look like a clean run.
    const failed = counts.failed + (isWell || counts.failed > 0 ? 0 : 1);
    say(`${counts.passed} passed, ${failed} failed`);
  }
  return isWell ? 0 : 1;
}

/**
 * What runs when: checks within a group run beside each other, on two cores.
 * @param {string} reportDir
 * @returns {Check[][]}
 */
function listCheckGroups(reportDir) {
  /** @param {string} file @param {string[]} args */
  const tool = (file, ...args) => [path.join('node_modules', file), ...args];
  /** @param {string} name @param {string[]} projects @returns {Check} */
  const tests = (name, ...projects) => {
    const report = path.join(reportDir, `${projects.join('-')}.json`);
    const args = ['run', '--reporter=default', '--reporter=json', `--outputFile.json=${report}`];
    const chosen = projects.map((project) => `--project=${project}`);
    return { name, report, args: tool('vitest/vitest.mjs', ...args, ...chosen) };
  };
  const rulesCheck = 'server/commands/rules-check.ts';
  return [
    [
      {
        name: 'format',
        args: tool('prettier/bin/prettier.cjs', '--check', '--log-level=warn', '.'),
      },
      { name: 'types', args: tool('typescript/bin/tsc', '--noEmit') },
    ],
    [
      {
        name: 'lint',
        args: tool(
          'eslint/bin/eslint.js',
          '--config',
          '.eslint.config.js',
          '--max-warnings=0',
          '.',
        ),
      },
      { name: 'client build', args: tool('vite/bin/vite.js', 'build', '--logLevel=warn') },
      ...(existsSync(rulesCheck) ? [{ name: 'rule tables', args: tsxArgs(rulesCheck) }] : []),
    ],
    [tests('unit, API and client tests', 'server', 'client')],
    [tests('journeys in the browser', 'journeys')],
  ];
}

/**
 * @param {Check} check
 * @returns {Promise<Outcome>}
 */
function runCheck(check) {
  const startedAtMs = performance.now();
  return new Promise((resolve) => {
    const child = spawn(process.execPath, check.args, {
      cwd: projectDir,
      env: { ...listCleanEnvironment(), FORCE_COLOR: '0', CI: '1' },
      // Tests speak while they run; the short checks only when they fail.
      stdio: ['ignore', check.report ? 'inherit' : 'pipe', check.report ? 'inherit' : 'pipe'],
    });
    let output = '';
    for (const stream of [child.stdout, child.stderr]) {
      stream?.on('data', (/** @type {Buffer} */ chunk) => {
        output += chunk.toString('utf8');
      });
    }
    child.on('error', (error) => resolve({ code: 127, output: error.message, seconds: 0 }));
    child.on('close', (code) =>
      resolve({ code: code ?? 1, output, seconds: (performance.now() - startedAtMs) / 1000 }),
    );
  });
}

/** The tests bring their own settings; those of a running product would lead them astray. */
function listCleanEnvironment() {
  const env = { ...process.env };
  for (const name of [
    'DATABASE_URL',
    'SMTP_URL',
    'NODE_ENV',
    'PORT',
    'HOST',
    'PUBLIC_URL',
    'UPLOADS_DIR',
    'SESSION_SECRET',
    'TRUST_PROXY',
  ]) {
    delete env[name];
  }
  return env;
}

/**
 * Adds up what vitest's reports say. A report that is missing or cut off counts as one failure.
 * @param {string[]} reports
 * @returns {Counts}
 */
export function sumCounts(reports) {
  const sum = { passed: 0, failed: 0 };
  for (const file of reports) {
    const counts = readCounts(file);
    sum.passed += counts.passed;
    sum.failed += counts.failed;
  }
  return sum;
}

/**
 * @param {string} file
 * @returns {Counts}
 */
function readCounts(file) {
  try {
    const report = JSON.parse(readFileSync(file, 'utf8'));
    const failedFiles = report.testResults.filter(
      (/** @type {{ status: string, assertionResults: unknown[] }} */ result) =>
        result.status === 'failed' && result.assertionResults.length === 0,
    );
    // A file that could not be loaded has no tests to count; it still failed.
    return {
      passed: report.numPassedTests,
      failed: report.numFailedTests + failedFiles.length,
    };
  } catch {
    return { passed: 0, failed: 1 };
  }
}
