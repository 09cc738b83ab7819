/**
 * Running other programs from the launcher. Plain JavaScript without packages: it runs before
 * the packages are installed.
 */
import { spawn } from 'node:child_process';
import { accessSync, constants, readFileSync } from 'node:fs';
import net from 'node:net';
import path from 'node:path';

/** A fault that a person can do something about: its message is printed alone, without a trace. */
export class PlainError extends Error {}

/** @type {Set<import('node:child_process').ChildProcess>} */
const underWay = new Set();

/** Asks every program that `run` is waiting for to stop. */
export function endPrograms() {
  for (const child of underWay) child.kill('SIGTERM');
}

/**
 * Runs a program to its end.
 * @param {string} command
 * @param {string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, inherit?: boolean, input?: string }} [options]
 *   `inherit` shows its output to the person instead of collecting it
 * @returns {Promise<{ code: number, output: string }>} `code` is 127 when the program does not exist
 */
export function run(command, args, options = {}) {
  return new Promise((resolve) => {
    const child = spawn(command, args, {
      cwd: options.cwd,
      env: options.env ?? process.env,
      stdio: [
        options.input === undefined ? 'ignore' : 'pipe',
        options.inherit ? 'inherit' : 'pipe',
        options.inherit ? 'inherit' : 'pipe',
      ],
    });
    underWay.add(child);
    /** @type {Buffer[]} */
    const chunks = [];
    child.stdout?.on('data', (/** @type {Buffer} */ chunk) => chunks.push(chunk));
    child.stderr?.on('data', (/** @type {Buffer} */ chunk) => chunks.push(chunk));
    child.on('error', (error) => {
      underWay.delete(child);
      resolve({ code: 127, output: error.message });
    });
    child.on('close', (code) => {
      underWay.delete(child);
      resolve({ code: code ?? 128, output: Buffer.concat(chunks).toString('utf8') });
    });
    if (options.input !== undefined) child.stdin?.end(options.input);
  });
}

/**
 * Finds a program on the PATH.
 * @param {string} name
 * @returns {string | null} its full path
 */
export function findProgram(name) {
  for (const folder of (process.env.PATH ?? '').split(path.delimiter)) {
    if (!folder) continue;
    const candidate = path.join(folder, name);
    try {
      accessSync(candidate, constants.X_OK);
      return candidate;
    } catch {
      // not in this folder
    }
  }
  return null;
}

/** @returns {boolean} whether this process runs as the system's administrator */
export function isRoot() {
  return process.getuid?.() === 0;
}

/** @param {number} durationMs */
export function pause(durationMs) {
  return new Promise((resolve) => setTimeout(resolve, durationMs));
}

/**
 * Whether a process with this id lives, and, when its start is given, is still the same one: the
 * system hands ids out again.
 * @param {number} pid
 * @param {string | null} [startedAt] what `findProcessStart` said of it
 */
export function isAlive(pid, startedAt = null) {
  try {
    process.kill(pid, 0);
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'EPERM') return false;
  }
  return startedAt === null || findProcessStart(pid) === startedAt;
}

/**
 * When a process started, in the system's own count, as far as the system tells.
 * @param {number} pid
 * @returns {string | null}
 */
export function findProcessStart(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    // The name in brackets may hold spaces; field 22 is the start time, the 20th after it.
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19] ?? null;
  } catch {
    return null;
  }
}

/**
 * A free port on loopback.
 * @param {number} [wanted] taken when it is free
 * @returns {Promise<number>}
 */
export async function findFreePort(wanted = 0) {
  if (wanted > 0 && (await isPortFree(wanted))) return wanted;
  return new Promise((resolve, reject) => {
    const probe = net.createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const address = probe.address();
      const port = typeof address === 'object' && address ? address.port : 0;
      probe.close(() => resolve(port));
    });
  });
}

/**
 * @param {number} port
 * @param {string} [host]
 * @returns {Promise<boolean>}
 */
export function isPortFree(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const probe = net.createServer();
    probe.once('error', () => resolve(false));
    probe.listen(port, host, () => probe.close(() => resolve(true)));
  });
}
