/** `npm run seed`: loads the demo practice; `-- --if-empty` does nothing when somebody is there already. */
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { createApp } from '../app.ts';
import { loadConfigOrExit } from '../config.ts';
import { hasUsers } from '../db/repositories/user-repository.ts';
import { createPageReader } from '../reading/page-reader.ts';
import { readingLimitsOf } from '../reading/pages/limits.ts';
import { openDepsOrExit } from '../start-parts.ts';
import { seedDemo } from './demo/demo.ts';

const config = loadConfigOrExit();
if (config.isProduction) {
  console.error('The demo is not for production: its sign-ins are known to everybody.');
  process.exit(1);
}
const deps = await openDepsOrExit({ ...config, logLevel: 'warn' }, { supervise: false });
const isTaken = await hasUsers();
if (isTaken) {
  if (!process.argv.includes('--if-empty')) {
    console.error(
      'There are people in this database already. The demo goes into an empty one only.',
    );
    process.exitCode = 1;
  }
} else {
  await seed();
}
await deps.close();
process.exit();

async function seed(): Promise<void> {
  const app = createApp(deps);
  const server = createServer(app.express).listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  const reader = createPageReader({
    workers: config.readerWorkers,
    limits: readingLimitsOf(config.limits),
  });
  try {
    await seedDemo({
      address: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
      reader,
      deps,
      today: deps.clock.todayIn('Europe/London'),
      say: (line) => console.log(line),
    });
    console.log('The demo is loaded.');
  } finally {
    await reader.close();
    server.closeAllConnections();
    server.close();
    await app.close();
  }
}
