/** The local mail catcher as a process of its own; started by the launcher with its two ports. */
import path from 'node:path';
import { parseArgs } from 'node:util';
import { startMailCatcher } from '../mail-catcher/catcher.ts';

const { values } = parseArgs({
  options: {
    smtp: { type: 'string', default: '0' },
    http: { type: 'string', default: '0' },
    folder: { type: 'string', default: path.join('.data', 'mail') },
  },
});

const catcher = await startMailCatcher({
  smtpPort: Number(values.smtp),
  httpPort: Number(values.http),
  folder: values.folder,
});
process.stdout.write(`Mail is caught at ${catcher.smtpUrl} and shown at ${catcher.url}\n`);
process.send?.({ ready: true });

for (const signal of ['SIGTERM', 'SIGINT'] as const) {
  process.once(signal, () => {
    void catcher.close().then(() => process.exit(0));
  });
}
