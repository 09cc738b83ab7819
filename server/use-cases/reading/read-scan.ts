/**
 * Reads one scan: pages one by one, each saved as soon as it is read, then papers from all of them.
 * Run again after any interruption it goes on where it was; run twice it makes nothing twice.
 */
import type { ReadingContext } from '../../reading/types.ts';
import type { PageRow } from '../../db/models/page-model.ts';
import type { ScanRow } from '../../db/models/scan-model.ts';
import { isConnectionLoss } from '../../db/connection-loss.ts';
import { appendEvent } from '../../db/repositories/event-repository.ts';
import { findHousehold, lockHousehold } from '../../db/repositories/household-repository.ts';
import {
  insertReadPage,
  listReadPageNumbers,
  listScanPages,
} from '../../db/repositories/read-page-repository.ts';
import { claimScan, updateScan } from '../../db/repositories/scan-repository.ts';
import { inTransaction } from '../../db/transaction.ts';
import type { Deps } from '../../deps.ts';
import type { OpenFile, PageReader } from '../../reading/page-reader.ts';
import { UnreadableFileError } from '../../reading/pages/unreadable-file-error.ts';
import { readPapers } from '../../reading/papers.ts';
import type { PageText } from '../../reading/types.ts';
import { createPapersFromReading } from '../papers/create-papers.ts';

export interface ReadScanDeps extends Pick<Deps, 'clock' | 'config' | 'ruleSet' | 'storage'> {
  reader: PageReader;
  /** Set off when the worker is asked to stop: the pages under way are finished, the rest is handed back. */
  stopping?: AbortSignal;
}

/** The worker stops in the middle of a scan; another goes on with the pages that are missing. */
export class HandedBackError extends Error {
  constructor() {
    super('Reading was handed back because the worker stops.');
    this.name = 'HandedBackError';
  }
}

const giveUpAfter = 4;

/** @throws whatever is not the file's fault, so that the queue tries again later */
export async function readScan(scanId: string, deps: ReadScanDeps): Promise<void> {
  const scan = await claimScan(scanId);
  if (!scan) return;
  try {
    await readPages(scan, deps);
    await makePapers(scan, deps);
  } catch (error) {
    if (error instanceof UnreadableFileError) {
      await updateScan(scan.id, { status: 'failed', reason: error.message });
      return;
    }
    // Neither the end of the worker nor of the database is an attempt that failed.
    if (deps.stopping?.aborted || isConnectionLoss(error)) throw error;
    const attempts = scan.attempts + 1;
    await updateScan(scan.id, {
      attempts,
      ...(attempts >= giveUpAfter
        ? {
            status: 'failed' as const,
            reason: 'Reading stopped several times for a reason on our side. Try it again later.',
          }
        : {}),
    });
    if (attempts < giveUpAfter) throw error;
  }
}

async function readPages(scan: ScanRow, deps: ReadScanDeps): Promise<void> {
  const bytes = await deps.storage.readScan(scan.householdId, scan.id);
  const file = await deps.reader.open(bytes);
  try {
    await updateScan(scan.id, { pageCount: file.pageCount });
    const done = new Set(await listReadPageNumbers(scan.id));
    const missing = Array.from({ length: file.pageCount }, (_, index) => index + 1).filter(
      (number) => !done.has(number),
    );
    // As many pages are under way as the reader has threads; each is saved when it is ready.
    const lanes = Array.from({ length: deps.config.readerWorkers }, async () => {
      while (!deps.stopping?.aborted) {
        const number = missing.shift();
        if (number === undefined) return;
        await readOnePage(scan, file, number, deps);
      }
    });
    const results = await Promise.allSettled(lanes);
    const failed = results.find((result) => result.status === 'rejected');
    if (failed) throw failed.reason;
    if (missing.length > 0) throw new HandedBackError();
  } finally {
    file.close();
  }
}

async function readOnePage(
  scan: ScanRow,
  file: OpenFile,
  number: number,
  { storage }: ReadScanDeps,
): Promise<void> {
  const page = await file.readPage(number);
  await storage.writePicture(scan.householdId, scan.id, number, 'image', page.image);
  await storage.writePicture(scan.householdId, scan.id, number, 'thumbnail', page.thumbnail);
  await insertReadPage({
    householdId: scan.householdId,
    scanId: scan.id,
    number,
    blank: page.blank,
    code: page.code,
    turned: page.turned,
    width: page.width,
    height: page.height,
    source: page.source,
    confidence: page.confidence,
    lines: page.lines,
    text: page.text,
  });
}

async function makePapers(scan: ScanRow, deps: ReadScanDeps): Promise<void> {
  const household = await findHousehold(scan.householdId);
  if (!household) return;
  const context: ReadingContext = {
    country: household.country,
    businessNames: household.businessNames,
  };
  await inTransaction(async (transaction) => {
    // The household's row is the lock: two workers on one scan make its papers once.
    await lockHousehold(household.id, transaction);
    const pages = await listScanPages(scan.id, transaction);
    if (pages.some((page) => page.paperId !== null)) return;
    const readings = readPapers(pages.map(toPageText), context);
    const ids = await createPapersFromReading(
      { scan, household, pages, readings },
      {
        today: deps.clock.todayIn(household.timeZone),
        now: deps.clock.now(),
        ruleSet: deps.ruleSet,
      },
      transaction,
    );
    await updateScan(
      scan.id,
      { status: 'read', reason: null, readAt: deps.clock.now() },
      transaction,
    );
    await appendEvent(
      {
        practiceId: household.practiceId,
        householdId: household.id,
        userId: null,
        at: deps.clock.now(),
        action: 'scan.read',
        sentence: `Read a scan: ${ids.length} ${ids.length === 1 ? 'paper' : 'papers'} on ${pages.length} ${pages.length === 1 ? 'page' : 'pages'}.`,
        detail: { scanId: scan.id },
      },
      transaction,
    );
  });
}

function toPageText(page: PageRow): PageText {
  return {
    number: page.number,
    lines: page.lines,
    text: page.text,
    source: page.source,
    confidence: page.confidence,
    blank: page.blank,
    code: page.code,
  };
}
