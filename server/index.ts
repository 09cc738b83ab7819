/** Starts the web server. */
import { createServer } from 'node:http';
import { createApp } from './app.ts';
import { loadConfigOrExit } from './config.ts';
import { openDepsOrExit, stopOnSignal } from './start-parts.ts';
import { sweepIncoming } from './storage/upload-receiver.ts';
import { sweepLeftovers } from './use-cases/scans/sweep-leftovers.ts';

const config = loadConfigOrExit();
const deps = await openDepsOrExit(config, { supervise: false });
const anHourMs = 60 * 60 * 1000;
await sweepIncoming(config.uploadsDir, anHourMs, deps.clock.now());
const swept = await sweepLeftovers(deps);
if (swept > 0) deps.log.info({ swept }, 'files of a killed process removed');

const app = createApp(deps);
const server = createServer(app.express);

server.on('error', (error: NodeJS.ErrnoException) => {
  const sentence =
    error.code === 'EADDRINUSE'
      ? `Port ${config.port} on ${config.host} is taken. Stop what uses it, or set PORT to another number.`
      : error.code === 'EACCES'
        ? `Port ${config.port} may not be used by this account. Set PORT to a number above 1023.`
        : `The server could not listen on ${config.host}:${config.port} (${error.code ?? error.message}).`;
  process.stderr.write(`${sentence}\n`);
  process.exit(1);
});
// Before anybody is told that it listens: who was told may ask it to stop.
stopOnSignal(async () => {
  await new Promise<void>((resolve) => {
    server.close(() => resolve());
    server.closeIdleConnections();
    setTimeout(() => server.closeAllConnections(), 5000).unref();
  });
  await app.close();
  await deps.close();
});
server.listen(config.port, config.host, () => {
  deps.log.info({ host: config.host, port: config.port }, 'listening');
});
