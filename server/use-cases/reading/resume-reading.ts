import { listUnreadScanIds } from '../../db/repositories/scan-repository.ts';
import type { Deps } from '../../deps.ts';
import { queueNames } from '../../jobs/queue.ts';

/**
 * Queues every scan that is not read yet. Scans whose job is still there are queued once more, which is
 * harmless: reading goes on by page and makes nothing twice.
 */
export async function resumeReading({ queue }: Pick<Deps, 'queue'>): Promise<void> {
  for (const scanId of await listUnreadScanIds()) {
    await queue.send(queueNames.readScan, { scanId }, { singletonKey: scanId });
  }
}
