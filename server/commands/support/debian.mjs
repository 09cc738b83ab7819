/** Asking Debian (or a relative of it) for a program that is missing. */
import { findProgram, isRoot, run } from './process.mjs';

/**
 * The words to put before a command so that it runs as administrator.
 * @returns {Promise<string[] | null>} null when that is not possible without a password
 */
async function findAdministratorPrefix() {
  if (isRoot()) return [];
  if (findProgram('sudo') && (await run('sudo', ['-n', 'true'])).code === 0) return ['sudo', '-n'];
  return null;
}

/**
 * Installs packages of the distribution.
 * @param {string[]} packages
 * @param {(line: string) => void} say
 * @returns {Promise<string | null>} null when it worked, otherwise why not, in words
 */
export async function installDebianPackages(packages, say) {
  if (!findProgram('apt-get')) return 'this system has no apt-get';
  const prefix = await findAdministratorPrefix();
  if (!prefix) return 'installing needs the administrator';
  const env = ['env', 'DEBIAN_FRONTEND=noninteractive'];
  say(`Installing ${packages.join(' and ')} …`);
  for (const args of [
    ['apt-get', 'update', '-q'],
    ['apt-get', 'install', '-y', '-q', '--no-install-recommends', ...packages],
  ]) {
    const [command = 'env', ...rest] = [...prefix, ...env, ...args];
    const { code, output } = await run(command, rest);
    // An update that misses one source may still know the package.
    if (code !== 0 && args[1] === 'install') {
      const reason = output.split('\n').findLast((line) => line.startsWith('E: '));
      return reason ? reason.slice(3) : `apt-get ended with ${code}`;
    }
  }
  return null;
}
