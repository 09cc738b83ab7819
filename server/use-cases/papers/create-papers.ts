/** What the reader found becomes papers of a household, waiting for a person. Nothing is decided. */
import type { ReadingContext, PaperReading, PageText } from '../../reading/types.ts';
import { takeNumbers } from '../../db/repositories/household-repository.ts';
import { assignPages, type StoredPage } from '../../db/repositories/page-repository.ts';
import { insertPapers, type NewPaper } from '../../db/repositories/paper-repository.ts';
import type { Transaction } from '../../db/transaction.ts';
import type { AssessContext } from '../assess-paper.ts';
import { assessPaper } from '../assess-paper.ts';

export interface ReadScan {
  id: string;
  householdId: string;
  boxId: string;
}

/**
 * Adds the papers of a scan that was read: running numbers, pages, assessment, likely copies.
 * @param pages the stored pages of the scan
 * @param context from `loadAssessContext` in the same transaction
 * @returns the ids in the order of the readings
 */
export async function createPapersFromReading(
  scan: ReadScan,
  pages: StoredPage[],
  readings: PaperReading[],
  context: AssessContext & { household: { country: string } },
  transaction: Transaction,
): Promise<string[]> {
  if (readings.length === 0) return [];
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
      paperOfReading(scan, reading, pagesOf(reading), {
        number: first + index,
        isDuplex,
        context,
      }),
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
  return papers.map((paper) => paper.id);
}

function paperOfReading(
  scan: ReadScan,
  reading: PaperReading,
  pages: StoredPage[],
  { number, isDuplex, context }: { number: number; isDuplex: boolean; context: AssessContext },
): NewPaper {
  const paper = {
    ...columnsOfReading(reading, pages, context.household.country),
    householdId: scan.householdId,
    boxId: scan.boxId,
    scanId: scan.id,
    number,
    status: 'to-review' as const,
    sheets: countSheets(pages.length, isDuplex),
  };
  const assessed = assessPaper(
    {
      ...paper,
      id: null,
      answers: {},
      subjectId: null,
      bundle: false,
      bundleFrom: null,
      bundleTo: null,
      steppedDown: null,
    },
    context,
  );
  return { ...paper, ...assessed };
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
