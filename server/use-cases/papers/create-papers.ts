/** What the reader found becomes papers of a household, waiting for a person. Nothing is decided. */
import type { ReadingContext, PaperReading, PageText } from '../../reading/types.ts';
import { takeNumbers } from '../../db/repositories/household-repository.ts';
import { assignPages, type StoredPage } from '../../db/repositories/page-repository.ts';
import {
  type AssessedColumns,
  insertPapers,
  type NewPaper,
} from '../../db/repositories/paper-repository.ts';
import type { Transaction } from '../../db/transaction.ts';
import {
  type AssessContext,
  type AssessDay,
  assessPaper,
  loadAssessContext,
} from '../assess-paper.ts';
import { markLikelyCopies } from './mark-copies.ts';

export interface ReadScan {
  scan: { id: string; householdId: string; boxId: string };
  household: { country: string };
  /** The stored pages of the scan. */
  pages: StoredPage[];
  readings: PaperReading[];
}

/**
 * Adds the papers of a scan that was read: running numbers, pages, assessment, likely copies. Answers their ids
 * in the order of the readings.
 */
export async function createPapersFromReading(
  { scan, household, pages, readings }: ReadScan,
  day: AssessDay & { now: Date },
  transaction: Transaction,
): Promise<string[]> {
  if (readings.length === 0) return [];
  const context = await loadAssessContext(scan.householdId, day, transaction);
  const isDuplex = pages.some((page) => page.blank && page.number % 2 === 0);
  const first = await takeNumbers(
    scan.householdId,
    'nextPaperNumber',
    readings.length,
    transaction,
  );
  const pagesOf = (reading: PaperReading) =>
    pages
      .filter(
        (page) =>
          page.number >= reading.from && page.number <= reading.to && !isSeparatorCode(page.code),
      )
      .sort((a, b) => a.number - b.number);
  const papers = await insertPapers(
    readings.map((reading, index) =>
      paperOfReading(
        {
          ...columnsOfReading(reading, pagesOf(reading), household.country),
          householdId: scan.householdId,
          boxId: scan.boxId,
          scanId: scan.id,
          number: first + index,
          sheets: countSheets(pagesOf(reading).length, isDuplex),
          createdAt: day.now,
        },
        context,
      ),
    ),
    transaction,
  );
  for (const [index, paper] of papers.entries()) {
    const reading = readings[index];
    if (!reading) continue;
    await assignPages(
      paper.id,
      pagesOf(reading).map((page) => page.id),
      transaction,
    );
  }
  const ids = papers.map((paper) => paper.id);
  await markLikelyCopies(scan.householdId, ids, papers, transaction);
  return ids;
}

function paperOfReading(
  columns: Omit<NewPaper, keyof AssessedColumns>,
  context: AssessContext,
): NewPaper {
  const assessed = assessPaper(
    {
      id: null,
      class: columns.class,
      country: columns.country,
      facts: columns.facts,
      answers: {},
      subjectId: null,
      bundle: false,
      bundleFrom: null,
      bundleTo: null,
      steppedDown: null,
    },
    context,
  );
  return { ...columns, ...assessed, status: 'to-review' };
}

/** The columns that come from the reader; they are the same when a paper is split or joined by hand. */
export function columnsOfReading(
  reading: Omit<PaperReading, 'from' | 'to'>,
  pages: Pick<StoredPage, 'text'>[],
  homeCountry: string,
) {
  return {
    class: reading.class,
    confidence: reading.confidence,
    country: reading.country ?? homeCountry,
    facts: reading.facts,
    read: { class: reading.class, confidence: reading.confidence, facts: reading.facts },
    candidates: reading.candidates,
    text: pages
      .map((page) => page.text)
      .filter((text) => text !== '')
      .join('\n\n'),
  };
}

/**
 * Sheets of a paper. A scanner that took both sides shows it by blank backs; only then two pages count as one
 * sheet. Otherwise every page counts: weight and volume are then rather too high than too low.
 */
export function countSheets(pages: number, isDuplex: boolean): number {
  return Math.max(1, isDuplex ? Math.ceil(pages / 2) : pages);
}

function isSeparatorCode(code: string | null): boolean {
  return code?.startsWith('SLACKWATER:SEPARATOR') ?? false;
}

/** A stored page as the reader takes it. */
export function toPageText(page: StoredPage, number: number): PageText {
  const { lines, text, source, confidence, blank, code } = page;
  return { number, lines, text, source, confidence, blank, code };
}

/** What the reader is told about a household. */
export function readingContextOf(household: {
  country: string;
  businessNames: string[];
}): ReadingContext {
  return { country: household.country, businessNames: household.businessNames };
}
