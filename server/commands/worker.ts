/** `npm run worker`: a reader by itself; it also sends mail and reminders. */
import { loadConfigOrExit } from '../config.ts';
import { startWorker } from '../jobs/worker.ts';
import { openDepsOrExit, stopOnSignal } from '../start-parts.ts';

const deps = await openDepsOrExit(loadConfigOrExit(), { supervise: true });
const worker = await startWorker(deps);
stopOnSignal(async () => {
  await worker.stop();
  await deps.close();
});
deps.log.info('worker ready');
