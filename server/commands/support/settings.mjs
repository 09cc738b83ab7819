/** What the launcher chose for this machine and keeps: ports, and secrets of its own making. */
import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { PlainError } from './process.mjs';

/**
 * @typedef {object} Settings
 * @property {string} postgresPassword
 * @property {string} sessionSecret
 * @property {number} [postgresPort]
 * @property {number} [smtpPort]
 * @property {number} [mailPagePort]
 * @property {string} [databaseUrl] as long as the launcher's own cluster is the database
 * @property {string} [smtpUrl] as long as the mail catcher takes the mail
 * @property {boolean} [hasAskedForReadingModel] installing it was tried once
 */

/**
 * The settings of this folder; new ones, with fresh secrets, when there are none.
 * @param {string} folder
 * @returns {Settings}
 * @throws {PlainError} when the file cannot be understood: its passwords must not be lost silently
 */
export function loadSettings(folder) {
  const file = path.join(folder, 'settings.json');
  if (!existsSync(file)) {
    const hasCluster = existsSync(path.join(folder, 'postgres', 'PG_VERSION'));
    if (hasCluster) {
      throw new PlainError(
        '.data/settings.json is missing, and with it the password of the database in ' +
          '.data/postgres. Put the file back, or move .data/postgres away to begin anew.',
      );
    }
    return { postgresPassword: makeSecret(24), sessionSecret: makeSecret(32) };
  }
  try {
    const value = JSON.parse(readFileSync(file, 'utf8'));
    if (typeof value.postgresPassword === 'string' && typeof value.sessionSecret === 'string') {
      return value;
    }
  } catch (error) {
    if (!(error instanceof SyntaxError)) throw error;
  }
  throw new PlainError(
    '.data/settings.json is damaged. Put a copy back, or move the .data folder away to begin anew.',
  );
}

/**
 * Saves the settings in one step, so that a stop in between leaves the old ones; readable for the
 * owner alone.
 * @param {string} folder
 * @param {Settings} settings
 */
export function saveSettings(folder, settings) {
  mkdirSync(folder, { recursive: true });
  const file = path.join(folder, 'settings.json');
  const draft = `${file}.new`;
  writeFileSync(draft, `${JSON.stringify(settings, null, 2)}\n`, { mode: 0o600 });
  renameSync(draft, file);
}

/** @param {number} bytes */
function makeSecret(bytes) {
  return randomBytes(bytes).toString('hex');
}
