/** Taking uploaded files in: looked at by content, stored once, queued for reading. */
import { randomUUID } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import type { Scan, UploadResult } from '../../contract/scans.ts';
import { appendEvent } from '../../db/repositories/event-repository.ts';
import {
  type CountedScan,
  findCountedScan,
  findScanByHash,
  insertScan,
  listScansOfBox,
  requeueScan,
} from '../../db/repositories/scan-repository.ts';
import { inTransaction } from '../../db/transaction.ts';
import type { Deps } from '../../deps.ts';
import { ConflictError, InvalidInputError, NotFoundError } from '../../errors.ts';
import { queueNames } from '../../jobs/queue.ts';
import { sniffFile } from '../../reading/pages/sniff.ts';
import { readingLimitsOf } from '../../reading/pages/limits.ts';
import { type Actor, visibilityOf } from '../papers/actor.ts';
import { discardReceived, type ReceivedFile } from '../../storage/upload-receiver.ts';

export interface UploadBy {
  userId: string;
  practiceId: string;
  householdId: string;
  boxId: string;
}

/** Who looks, and how far that person sees. */
export type ScanViewer = Pick<Actor, 'user' | 'seeReach'>;

type UploadDeps = Pick<Deps, 'clock' | 'config' | 'queue' | 'storage'>;

const mediaTypes: Record<string, string> = {
  pdf: 'application/pdf',
  jpeg: 'image/jpeg',
  png: 'image/png',
  tiff: 'image/tiff',
  webp: 'image/webp',
  heic: 'image/heic',
  avif: 'image/avif',
};

/** One entry per file, in the order they came: accepted, here already, or refused with a reason. */
export async function uploadScans(
  files: ReceivedFile[],
  by: UploadBy,
  deps: UploadDeps,
): Promise<UploadResult[]> {
  if (files.length === 0) {
    throw new InvalidInputError([
      { field: 'files', message: 'No file arrived. Choose one or more files and send them again.' },
    ]);
  }
  try {
    const results: UploadResult[] = [];
    for (const file of files) results.push(await takeIn(file, by, deps));
    return results;
  } finally {
    await discardReceived(files);
  }
}

async function takeIn(file: ReceivedFile, by: UploadBy, deps: UploadDeps): Promise<UploadResult> {
  const refuse = (reason: string): UploadResult => ({
    name: file.label,
    accepted: false,
    alreadyHere: false,
    reason,
    scan: null,
  });
  if (!file.partPath) {
    const megabytes = Math.floor(deps.config.limits.maxFileBytes / 1024 / 1024);
    return refuse(
      `This file is larger than ${megabytes} MB. Scan in smaller piles, or at 300 dpi.`,
    );
  }
  const bytes = await readFile(file.partPath);
  const sniffed = await sniffFile(bytes, readingLimitsOf(deps.config.limits));
  if ('refused' in sniffed) return refuse(sniffed.refused);

  const known = await findScanByHash(by.householdId, file.sha256);
  const id = known?.id ?? (await storeNew(file, bytes, mediaTypes[sniffed.kind] ?? '', by, deps));
  // Whoever sends a file in may know how far it is, also when somebody else sent it before.
  const scan = await findCountedScan(id, { groups: null, userId: by.userId });
  return {
    name: file.label,
    accepted: true,
    alreadyHere: known !== null,
    reason: null,
    scan: scan && viewScan(scan),
  };
}

/** Bytes first, then the row and its job together: a crash between them leaves an orphan file at most. */
async function storeNew(
  file: ReceivedFile,
  bytes: Buffer,
  mediaType: string,
  by: UploadBy,
  { clock, queue, storage }: UploadDeps,
): Promise<string> {
  const id = randomUUID();
  await storage.writeScan(by.householdId, id, bytes);
  const isNew = await inTransaction(async (transaction) => {
    const inserted = await insertScan(
      {
        id,
        householdId: by.householdId,
        boxId: by.boxId,
        name: file.label,
        mediaType,
        bytes: String(bytes.length),
        sha256: file.sha256,
        createdBy: by.userId,
      },
      transaction,
    );
    if (!inserted) return false;
    await queue.send(queueNames.readScan, { scanId: id }, { transaction });
    await appendEvent(
      {
        practiceId: by.practiceId,
        householdId: by.householdId,
        userId: by.userId,
        at: clock.now(),
        action: 'scan.uploaded',
        sentence: 'Sent in a scan.',
        detail: { scanId: id },
      },
      transaction,
    );
    return true;
  });
  if (isNew) return id;
  // Two people sent the same file at the same moment: the first one counts.
  await storage.removeScan(by.householdId, id);
  const winner = await findScanByHash(by.householdId, file.sha256);
  if (!winner) throw new NotFoundError();
  return winner.id;
}

export async function listScans(boxId: string, viewer: ScanViewer): Promise<{ items: Scan[] }> {
  return { items: (await listScansOfBox(boxId, visibilityOf(viewer))).map(viewScan) };
}

/** @throws ConflictError when the scan has not failed */
export async function retryScan(
  scanId: string,
  viewer: ScanViewer,
  { queue }: Pick<Deps, 'queue'>,
): Promise<Scan> {
  if (!(await findCountedScan(scanId, visibilityOf(viewer)))) throw new NotFoundError();
  const isQueued = await inTransaction(async (transaction) => {
    if (!(await requeueScan(scanId, transaction))) return false;
    await queue.send(queueNames.readScan, { scanId }, { transaction });
    return true;
  });
  if (!isQueued) {
    throw new ConflictError(
      'Only a scan that failed can be read again. Reload to see where it is.',
    );
  }
  const scan = await findCountedScan(scanId, visibilityOf(viewer));
  if (!scan) throw new NotFoundError();
  return viewScan(scan);
}

function viewScan(scan: CountedScan): Scan {
  return {
    id: scan.id,
    boxId: scan.boxId,
    name: scan.name,
    mediaType: scan.mediaType,
    bytes: Number(scan.bytes),
    status: scan.status,
    reason: scan.reason,
    pages: scan.pageCount,
    pagesRead: scan.pagesRead,
    blankPages: scan.blankPages,
    papers: scan.papers,
    createdAt: new Date(scan.createdAt).toISOString(),
  };
}
