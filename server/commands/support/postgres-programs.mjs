/** Finding PostgreSQL's programs on this machine. */
import { existsSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { installDebianPackages } from './debian.mjs';
import { findProgram, PlainError, run } from './process.mjs';

export const oldestPostgresMajor = 15;

/** @typedef {{ bin: string, major: number }} PostgresPrograms */

/**
 * The major version in what `postgres --version` prints.
 * @param {string} text for example `postgres (PostgreSQL) 15.18 (Debian 15.18-0+deb12u1)`
 * @returns {number | null}
 */
export function parsePostgresMajor(text) {
  const match = /PostgreSQL\)?\s+(\d+)/.exec(text);
  return match ? Number(match[1]) : null;
}

/** @returns {Promise<string[]>} folders that may hold the server's programs */
async function listCandidateFolders() {
  const folders = [];
  const packaged = '/usr/lib/postgresql';
  if (existsSync(packaged)) {
    for (const version of readdirSync(packaged)) folders.push(path.join(packaged, version, 'bin'));
  }
  if (findProgram('pg_config')) {
    const { code, output } = await run('pg_config', ['--bindir']);
    if (code === 0) folders.push(output.trim());
  }
  const onPath = findProgram('postgres');
  if (onPath) folders.push(path.dirname(onPath));
  return [...new Set(folders)].filter((folder) =>
    ['postgres', 'initdb', 'pg_ctl'].every((name) => existsSync(path.join(folder, name))),
  );
}

/**
 * The newest PostgreSQL on this machine that is new enough.
 * @returns {Promise<{ found: PostgresPrograms | null, tooOld: number | null }>}
 */
export async function findPostgres() {
  /** @type {PostgresPrograms[]} */
  const all = [];
  for (const bin of await listCandidateFolders()) {
    const { output } = await run(path.join(bin, 'postgres'), ['--version']);
    const major = parsePostgresMajor(output);
    if (major !== null) all.push({ bin, major });
  }
  all.sort((a, b) => b.major - a.major);
  const newest = all[0];
  if (!newest) return { found: null, tooOld: null };
  return newest.major >= oldestPostgresMajor
    ? { found: newest, tooOld: null }
    : { found: null, tooOld: newest.major };
}

/**
 * PostgreSQL, installed from the distribution when it is missing.
 * @param {(line: string) => void} say
 * @returns {Promise<PostgresPrograms>}
 * @throws {PlainError} with the command to run when it can neither be found nor installed
 */
export async function requirePostgres(say) {
  const first = await findPostgres();
  if (first.found) return first.found;
  const reason = await installDebianPackages(['postgresql'], say);
  const second = await findPostgres();
  if (second.found) return second.found;
  const tooOld = second.tooOld ?? first.tooOld;
  const lack = tooOld
    ? `PostgreSQL ${tooOld} is too old: Slackwater needs ${oldestPostgresMajor} or newer`
    : `PostgreSQL ${oldestPostgresMajor} or newer is missing`;
  throw new PlainError(
    `${lack}${reason ? ` and could not be installed (${reason})` : ''}. ` +
      'Run "sudo apt-get install postgresql" and start again, or set DATABASE_URL.',
  );
}
