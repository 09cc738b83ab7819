/** Building what the browser loads, when its sources have changed since the last time. */
import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { PlainError, run } from './process.mjs';

const sources = [
  'src',
  'server/contract',
  'index.html',
  'vite.config.ts',
  'tailwind.config.ts',
  'tsconfig.json',
  'package-lock.json',
];

/**
 * One fingerprint of everything the client is made from: names and contents, in order.
 * @param {string} projectDir
 * @param {string[]} [paths] relative to it
 */
export function hashSources(projectDir, paths = sources) {
  const hash = createHash('sha256');
  for (const file of paths.flatMap((entry) => listFiles(path.join(projectDir, entry)))) {
    hash
      .update(`${path.relative(projectDir, file)}\0`)
      .update(readFileSync(file))
      .update('\0');
  }
  return hash.digest('hex');
}

/**
 * @param {string} entry
 * @returns {string[]} sorted
 */
function listFiles(entry) {
  if (!existsSync(entry)) return [];
  if (!statSync(entry).isDirectory()) return [entry];
  return readdirSync(entry)
    .sort()
    .flatMap((name) => listFiles(path.join(entry, name)));
}

/**
 * @param {string} projectDir
 * @param {(line: string) => void} say
 * @throws {PlainError} with the builder's words
 */
export async function ensureClientBuilt(projectDir, say) {
  const stamp = path.join(projectDir, 'dist', '.built-from');
  const wanted = hashSources(projectDir);
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;
  say('Building the client …');
  const vite = path.join('node_modules', 'vite', 'bin', 'vite.js');
  const { code, output } = await run(process.execPath, [vite, 'build', '--logLevel', 'warn'], {
    cwd: projectDir,
    env: { ...process.env, NODE_ENV: 'production' },
  });
  if (code !== 0) throw new PlainError(`The client could not be built:\n${output.trim()}`);
  writeFileSync(stamp, wanted);
}
