/** Keeping the launcher's children running, and stopping them in order. */
import { spawn } from 'node:child_process';
import {
  closeSync,
  existsSync,
  mkdirSync,
  openSync,
  readFileSync,
  renameSync,
  statSync,
} from 'node:fs';
import path from 'node:path';
import { signalGroup } from './instance-lock.mjs';

const largestLogBytes = 10 * 1024 * 1024;

/**
 * @typedef {object} ChildPlan
 * @property {string} name in sentences and as the name of its log file
 * @property {string[]} args for Node.js
 * @property {NodeJS.ProcessEnv} env
 * @property {boolean} isRestarted whether it comes back after a crash; otherwise everything ends
 */

/**
 * How long to wait before a crashed child is started again: a second, doubled with each crash,
 * half a minute at most.
 * @param {number} crashes so far, from 1
 * @returns {number} milliseconds
 */
export function decideRestartDelay(crashes) {
  return Math.min(30_000, 1000 * 2 ** (crashes - 1));
}

/**
 * @param {object} options
 * @param {string} options.projectDir
 * @param {string | null} options.logDir null shows everything in the terminal
 * @param {(line: string) => void} options.say
 * @param {(pid: number) => void} options.onSpawn
 * @param {(name: string, code: number | null) => void} options.onFatal a child that is not restarted has ended
 */
export function createChildren({ projectDir, logDir, say, onSpawn, onFatal }) {
  /** @type {Map<string, import('node:child_process').ChildProcess>} */
  const running = new Map();
  /** @type {Set<NodeJS.Timeout>} */
  const timers = new Set();
  let isStopping = false;

  /**
   * @param {ChildPlan} plan
   * @param {number} crashes
   */
  function start(plan, crashes = 0) {
    const log = logDir === null ? 'inherit' : openLog(logDir, plan.name);
    const child = spawn(process.execPath, plan.args, {
      cwd: projectDir,
      env: plan.env,
      stdio: ['ignore', log, log, 'ipc'],
      // A group of its own: Ctrl-C reaches the launcher alone, which then stops the rest in order.
      detached: true,
    });
    if (typeof log === 'number') closeSync(log);
    running.set(plan.name, child);
    if (child.pid) onSpawn(child.pid);
    const startedAtMs = performance.now();
    child.once('error', () => undefined);
    child.once('exit', (code, signal) => {
      running.delete(plan.name);
      if (isStopping) return;
      if (!plan.isRestarted) {
        onFatal(plan.name, code);
        return;
      }
      const sum = performance.now() - startedAtMs > 60_000 ? 1 : crashes + 1;
      const delayMs = decideRestartDelay(sum);
      say(`The ${plan.name} ended (${signal ?? code}); it starts again in ${delayMs / 1000} s.`);
      const timer = setTimeout(() => {
        timers.delete(timer);
        start(plan, sum);
      }, delayMs);
      timers.add(timer);
    });
    return child;
  }

  /**
   * Asks the named children to finish, and ends them when they have not after `patienceMs`.
   * @param {string[]} names
   * @param {number} patienceMs
   */
  async function stop(names, patienceMs) {
    isStopping = true;
    for (const timer of timers) clearTimeout(timer);
    await Promise.all(
      names.map(async (name) => {
        const child = running.get(name);
        if (!child?.pid || child.exitCode !== null || child.signalCode !== null) return;
        const { pid } = child;
        const ended = new Promise((resolve) => child.once('exit', resolve));
        signalGroup(pid, 'SIGTERM');
        const timer = setTimeout(() => signalGroup(pid, 'SIGKILL'), patienceMs);
        await ended;
        clearTimeout(timer);
      }),
    );
  }

  return {
    start,
    stop,
    /** Ends everything at once, without waiting. */
    kill() {
      isStopping = true;
      for (const child of running.values()) if (child.pid) signalGroup(child.pid, 'SIGKILL');
    },
  };
}

/**
 * @param {string} logDir
 * @param {string} name
 */
function openLog(logDir, name) {
  mkdirSync(logDir, { recursive: true, mode: 0o700 });
  const file = logFileOf(logDir, name);
  if (existsSync(file) && statSync(file).size > largestLogBytes) renameSync(file, `${file}.old`);
  return openSync(file, 'a', 0o600);
}

/**
 * @param {string} logDir
 * @param {string} name
 */
export function logFileOf(logDir, name) {
  return path.join(logDir, `${name.replaceAll(' ', '-')}.log`);
}

/**
 * The last lines of a child's log, for a message about its end.
 * @param {string} logDir
 * @param {string} name
 * @param {number} [lines]
 */
export function readLogTail(logDir, name, lines = 15) {
  const file = logFileOf(logDir, name);
  if (!existsSync(file)) return '';
  return readFileSync(file, 'utf8').trimEnd().split('\n').slice(-lines).join('\n');
}
