/** One launcher per folder: a file says which process it is and which children it started. */
import { mkdirSync, openSync, closeSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { findProcessStart, isAlive, pause, PlainError } from './process.mjs';

/** @typedef {{ pid: number, startedAt: string | null }} ProcessMark */
/** @typedef {ProcessMark & { address: string | null, children: ProcessMark[] }} LockContent */

/**
 * @param {number} pid
 * @returns {ProcessMark}
 */
function markProcess(pid) {
  return { pid, startedAt: findProcessStart(pid) };
}

/**
 * Takes the lock of a folder. What a killed launcher left running is ended first.
 * @param {string} folder
 * @throws {PlainError} when another launcher holds it
 */
export async function acquireInstanceLock(folder) {
  mkdirSync(folder, { recursive: true });
  const file = path.join(folder, 'running.json');
  /** @type {LockContent} */
  const content = { ...markProcess(process.pid), address: null, children: [] };
  const write = () => writeFileSync(file, JSON.stringify(content), { mode: 0o600 });

  for (let attempt = 0; ; attempt += 1) {
    try {
      closeSync(openSync(file, 'wx', 0o600));
      break;
    } catch (error) {
      if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'EEXIST') throw error;
    }
    const holder = await readLock(file);
    if (holder && isAlive(holder.pid, holder.startedAt)) {
      const where = holder.address ? ` at ${holder.address}` : '';
      throw new PlainError(
        `Slackwater is already running from this folder${where} (process ${holder.pid}). ` +
          'Stop that one first.',
      );
    }
    if (attempt > 2) throw new PlainError('.data/running.json cannot be replaced. Remove it.');
    await endLeftovers(holder?.children ?? []);
    rmSync(file, { force: true });
  }
  write();

  return {
    /** @param {number} pid */
    addChild(pid) {
      content.children = content.children.filter((child) => isAlive(child.pid, child.startedAt));
      content.children.push(markProcess(pid));
      write();
    },
    /** @param {string} address */
    setAddress(address) {
      content.address = address;
      write();
    },
    release() {
      rmSync(file, { force: true });
    },
  };
}

/**
 * @param {string} file
 * @returns {Promise<LockContent | null>} null when the file says nothing useful
 */
async function readLock(file) {
  // Its owner may be about to write it.
  for (let attempt = 0; attempt < 5; attempt += 1) {
    try {
      const value = JSON.parse(readFileSync(file, 'utf8'));
      if (typeof value.pid === 'number' && Array.isArray(value.children)) return value;
    } catch {
      // half-written or gone
    }
    await pause(100);
  }
  return null;
}

/** @param {ProcessMark[]} children */
async function endLeftovers(children) {
  const living = () => children.filter((child) => isAlive(child.pid, child.startedAt));
  for (const signal of /** @type {const} */ (['SIGTERM', 'SIGKILL'])) {
    for (const { pid } of living()) signalGroup(pid, signal);
    for (let waited = 0; waited < 50 && living().length > 0; waited += 1) await pause(100);
  }
}

/**
 * Children lead a process group of their own, so a watcher's own child hears the signal too.
 * @param {number} pid
 * @param {NodeJS.Signals} signal
 */
export function signalGroup(pid, signal) {
  for (const target of [-pid, pid]) {
    try {
      process.kill(target, signal);
      return;
    } catch {
      // no such group, or already gone
    }
  }
}
