/** The end of everything, in the opposite order of the start. */
import process from 'node:process';
import { endPrograms, pause } from './process.mjs';

/**
 * @typedef {object} Started what has to be taken down again
 * @property {import('./postgres-cluster.mjs').Cluster | null} cluster
 * @property {ReturnType<typeof import('./children.mjs').createChildren> | null} children
 * @property {Awaited<ReturnType<typeof import('./instance-lock.mjs').acquireInstanceLock>> | null} lock
 * @property {boolean} isEnding
 * @property {Promise<void> | null} settled when the start has come to its end, well or not
 */

const patienceMs = 25_000;

/**
 * Listens for the signals that ask for the end; a second Ctrl-C does not wait for work to finish.
 * @param {Started} started
 * @param {(line: string) => void} say
 * @returns {(code: number) => Promise<void>}
 */
export function createShutdown(started, say) {
  /** @param {number} code */
  async function end(code) {
    started.isEnding = true;
    endPrograms();
    await Promise.race([started.settled, pause(10_000)]);
    // First those that take new work, then what they need to finish the old.
    await started.children?.stop(['client', 'server', 'worker'], patienceMs);
    await started.children?.stop(['mail catcher'], 5000);
    await started.cluster?.stop();
    started.lock?.release();
    process.exit(code);
  }

  /** @type {Promise<void> | null} */
  let ending = null;
  /** @param {number} code */
  const shutdown = (code) => (ending ??= end(code));

  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
    process.on(signal, () => {
      if (ending && signal === 'SIGINT') started.children?.kill();
      if (!ending) say('Stopping …');
      void shutdown(0);
    });
  }
  return shutdown;
}
