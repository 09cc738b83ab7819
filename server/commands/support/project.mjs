/** Where things are in this project. */
import path from 'node:path';
import { fileURLToPath } from 'node:url';

export const projectDir = path.resolve(fileURLToPath(import.meta.url), '../../../..');
export const dataDir = path.join(projectDir, '.data');
export const logDir = path.join(dataDir, 'logs');

/**
 * How to run one of the project's TypeScript files with this Node.js.
 * @param {string} file relative to the project
 * @param {string[]} [args]
 * @returns {string[]} arguments for `node`
 */
export function tsxArgs(file, args = []) {
  return ['--import', 'tsx', file, ...args];
}
