/** Are the packages that package-lock.json names the ones in node_modules? */
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { findProgram, PlainError, run } from './process.mjs';

/**
 * @typedef {{ version?: string, resolved?: string, integrity?: string, link?: boolean, optional?: boolean, devOptional?: boolean, peer?: boolean }} LockedPackage
 */

/**
 * Compares the project's lock file with npm's own record of what it installed. Optional packages
 * may be absent: they are for other systems.
 * @param {Record<string, LockedPackage>} locked `packages` of package-lock.json
 * @param {Record<string, LockedPackage> | null} installed `packages` of node_modules/.package-lock.json
 */
export function areDependenciesFresh(locked, installed) {
  if (!installed) return false;
  return Object.entries(locked).every(([place, wanted]) => {
    if (place === '' || wanted.link) return true;
    const present = installed[place];
    if (!present) return wanted.optional === true;
    return present.version === wanted.version && present.integrity === wanted.integrity;
  });
}

/**
 * @param {string} file
 * @returns {Record<string, LockedPackage> | null}
 */
function readPackages(file) {
  if (!existsSync(file)) return null;
  try {
    return JSON.parse(readFileSync(file, 'utf8')).packages ?? null;
  } catch {
    return null;
  }
}

/**
 * Installs the packages when they are missing or no longer the right ones.
 * @param {string} projectDir
 * @param {(line: string) => void} say
 * @throws {PlainError} when npm fails
 */
export async function ensureDependencies(projectDir, say) {
  const locked = readPackages(path.join(projectDir, 'package-lock.json'));
  if (!locked) throw new PlainError('package-lock.json is missing or damaged. Check it out again.');
  const record = path.join(projectDir, 'node_modules', '.package-lock.json');
  if (areDependenciesFresh(locked, readPackages(record))) return;
  if (!findProgram('npm')) {
    throw new PlainError('npm is missing. Install Node.js with npm and start again.');
  }
  say('Installing packages, which takes a minute or two …');
  // The client is built here, so what is needed for that is installed in production as well.
  const args = ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'];
  const { code } = await run('npm', args, { cwd: projectDir, inherit: true });
  if (code !== 0) {
    throw new PlainError(
      'The packages could not be installed. Check the network connection and the free disk ' +
        'space, then start again.',
    );
  }
}
