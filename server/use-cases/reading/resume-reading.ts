import { listStrandedScanIds, listUnreadScanIds } from '../../db/repositories/scan-repository.ts';
import type { Deps } from '../../deps.ts';
import { queueNames } from '../../jobs/queue.ts';

/**
 * Queues every scan that is not read yet and that no job waits for: at the start of a worker. A scan that
 * another worker is at is queued once more, which is harmless: reading goes on by page and makes nothing twice.
 */
export async function resumeReading({ queue }: Pick<Deps, 'queue'>): Promise<void> {
  for (const scanId of await listUnreadScanIds()) {
    await queue.send(queueNames.readScan, { scanId }, { singletonKey: scanId });
  }
}

/** Queues scans whose job was lost or given up while workers went on; from time to time. */
export async function rescueReading({ queue }: Pick<Deps, 'queue'>): Promise<void> {
  for (const scanId of await listStrandedScanIds()) {
    await queue.send(queueNames.readScan, { scanId }, { singletonKey: scanId });
  }
}
