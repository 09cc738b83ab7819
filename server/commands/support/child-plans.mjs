/** Which processes make up a running Slackwater. */
import path from 'node:path';
import { tsxArgs } from './project.mjs';

/**
 * Starts them; the mail catcher first, since the others send through it.
 * @param {object} context
 * @param {ReturnType<typeof import('./children.mjs').createChildren>} context.children
 * @param {NodeJS.ProcessEnv} context.env
 * @param {import('./settings.mjs').Settings} context.settings
 * @param {boolean} context.isDevelopment
 * @param {number} context.port
 * @param {string} context.host
 * @param {number} context.apiPort
 */
export function startChildren({ children, env, settings, isDevelopment, port, host, apiPort }) {
  const follow = ['--import', './server/commands/support/follow-launcher.mjs'];
  const watch = [
    path.join('node_modules', 'tsx', 'dist', 'cli.mjs'),
    'watch',
    '--clear-screen=false',
  ];
  /** @param {string} file */
  const runFile = (file) => (isDevelopment ? [...watch, file] : [...follow, ...tsxArgs(file)]);

  if (settings.smtpUrl) {
    const ports = [`--smtp=${settings.smtpPort}`, `--http=${settings.mailPagePort}`];
    const args = [...follow, ...tsxArgs('server/commands/mail-catcher.ts', ports)];
    children.start({ name: 'mail catcher', args, env, isRestarted: true });
  }
  children.start({ name: 'server', args: runFile('server/index.ts'), env, isRestarted: false });
  children.start({
    name: 'worker',
    args: runFile('server/commands/worker.ts'),
    env,
    isRestarted: true,
  });
  if (isDevelopment) {
    const vite = path.join('node_modules', 'vite', 'bin', 'vite.js');
    children.start({
      name: 'client',
      args: [...follow, vite, '--port', String(port), '--host', host],
      env: { ...env, API_PORT: String(apiPort) },
      isRestarted: false,
    });
  }
}
