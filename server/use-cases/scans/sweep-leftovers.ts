import { listKnownScanIds } from '../../db/repositories/scan-repository.ts';
import type { Deps } from '../../deps.ts';

/** An upload or a page takes minutes at most; what is older and not on record was left by a killed process. */
const oldEnoughMs = 60 * 60 * 1000;

/** Removes stored files that no record knows of; answers how many scans and half-written files went. */
export async function sweepLeftovers({
  storage,
  clock,
}: Pick<Deps, 'storage' | 'clock'>): Promise<number> {
  const { scans, parts } = await storage.findLeftovers(
    new Date(clock.now().getTime() - oldEnoughMs),
  );
  const known = await listKnownScanIds(scans.map(({ scanId }) => scanId));
  const forgotten = scans.filter(({ scanId }) => !known.has(scanId));
  for (const { householdId, scanId } of forgotten) await storage.removeScan(householdId, scanId);
  for (const part of parts) await storage.removePart(part);
  return forgotten.length + parts.length;
}
