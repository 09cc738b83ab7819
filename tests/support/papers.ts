/** Papers for tests, through the same door that people use, and scanned ones straight in the database. */
import type { Facts } from '../../server/contract/readings.ts';
import { emptyFacts } from '../../server/contract/readings.ts';
import type { Paper } from '../../server/contract/papers.ts';
import type { ShredList } from '../../server/contract/shred-lists.ts';
import { BoxModel } from '../../server/db/models/box-model.ts';
import { PageModel } from '../../server/db/models/page-model.ts';
import { PaperModel } from '../../server/db/models/paper-model.ts';
import { ScanModel } from '../../server/db/models/scan-model.ts';
import { findHousehold } from '../../server/db/repositories/household-repository.ts';
import { listPagesOfPaper, type StoredPage } from '../../server/db/repositories/page-repository.ts';
import { inTransaction } from '../../server/db/transaction.ts';
import { createPapersFromReading } from '../../server/use-cases/papers/create-papers.ts';
import type { TestApp, Visitor } from './app.ts';

/** Says that nobody of the household has a business, so that papers follow the rules for private people. */
export async function sayNoBusiness(visitor: Visitor, householdId: string): Promise<void> {
  const no = { answer: 'no' };
  const circumstances = { selfEmployed: no, landlord: no, company: no, employer: no };
  const { version } = (await visitor.get(`/api/households/${householdId}`)).body as Paper;
  const answer = await visitor.patch(`/api/households/${householdId}`, { circumstances }, version);
  if (answer.status !== 200) throw new Error(answer.text);
}

/** Enters a paper by hand and answers its view. */
export async function enter(
  visitor: Visitor,
  householdId: string,
  classId: string,
  more: Record<string, unknown> = {},
): Promise<Paper> {
  const answer = await visitor.post(`/api/households/${householdId}/papers`, {
    class: classId,
    title: `A ${classId}`,
    ...more,
  });
  if (answer.status !== 201) throw new Error(answer.text);
  return answer.body as Paper;
}

/** A utility bill of 2010, long past its time in every country, decided for shredding. */
export async function enterOldBill(
  visitor: Visitor,
  householdId: string,
  more: Record<string, unknown> = {},
): Promise<Paper> {
  const paper = await enter(visitor, householdId, 'utility-bill', {
    facts: { dates: { issued: '2010-03-15' }, issuer: 'Northmere Power' },
    ...more,
  });
  return change(visitor, paper, { pile: 'shred', answers: { usedForTax: false } });
}

/** Changes a paper at the version that was seen. */
export async function change(
  visitor: Visitor,
  paper: Pick<Paper, 'id' | 'version'>,
  patch: object,
): Promise<Paper> {
  const answer = await visitor.patch(`/api/papers/${paper.id}`, patch, paper.version);
  if (answer.status !== 200) throw new Error(answer.text);
  return answer.body as Paper;
}

export async function gather(
  visitor: Visitor,
  householdId: string,
  body: { on: string; papers?: string[] },
): Promise<ShredList> {
  const answer = await visitor.post(`/api/households/${householdId}/shred-lists`, body);
  if (answer.status !== 201) throw new Error(answer.text);
  return answer.body as ShredList;
}

/** A scan whose pages carry the given texts, and one paper for each group of them. */
export async function addScannedPapers(
  { deps, clock }: TestApp,
  householdId: string,
  groups: string[][],
): Promise<string[]> {
  const household = await findHousehold(householdId);
  if (!household) throw new Error('no household');
  const box = await BoxModel.create({ householdId, code: `B-${Math.floor(Math.random() * 1e9)}` });
  const scan = await ScanModel.create({
    householdId,
    boxId: box.id,
    name: 'pile.pdf',
    mediaType: 'application/pdf',
    bytes: '1',
    sha256: box.id,
    status: 'read',
  });
  const pages: StoredPage[] = [];
  for (const [index, text] of groups.flat().entries()) {
    const page = await PageModel.create({
      householdId,
      scanId: scan.id,
      number: index + 1,
      width: 800,
      height: 1131,
      source: 'ocr',
      lines: text.split('\n').map((line, row) => ({
        words: line.split(' ').map((word, column) => ({
          text: word,
          confidence: 0.95,
          box: { x: 0.1 + column * 0.08, y: 0.05 + row * 0.03, w: 0.07, h: 0.02 },
        })),
      })),
      text,
    });
    await page.reload();
    pages.push(page.get({ plain: true }));
  }
  let from = 1;
  const readings = groups.map((group) => {
    const span = { from, to: from + group.length - 1 };
    from += group.length;
    return {
      ...span,
      class: 'utility-bill' as const,
      confidence: 0.9,
      country: 'GB',
      candidates: [],
      facts: factsOn('2010-03-15'),
    };
  });
  const today = clock.todayIn(household.timeZone);
  return inTransaction((transaction) =>
    createPapersFromReading(
      { scan: { id: scan.id, householdId, boxId: box.id }, household, pages, readings },
      { today, now: clock.now(), ruleSet: deps.ruleSet },
      transaction,
    ),
  );
}

function factsOn(day: string): Facts {
  const facts = emptyFacts();
  const issued = { value: day, confidence: 0.9, seenAt: null, printed: null };
  return { ...facts, dates: { ...facts.dates, issued }, keyDate: day };
}

export async function pageCount(paperId: string): Promise<number> {
  return (await listPagesOfPaper(paperId)).length;
}

/** Keeps a paper for one person's eyes. */
export async function keepForEyesOf(paperId: string, userId: string): Promise<void> {
  await PaperModel.update({ eyesOnlyUserId: userId }, { where: { id: paperId } });
}
