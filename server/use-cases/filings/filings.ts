/** "When was the return sent?": one answer a person and tax year settles all papers of that year. */
import type { z } from 'zod';
import type { ClassGroup } from '../../contract/document-classes.ts';
import type { Filing, filingQuestionSchema, putFilingSchema } from '../../contract/households.ts';
import { reaches } from '../../contract/permissions.ts';
import { appendEvent } from '../../db/repositories/event-repository.ts';
import {
  type FilingRow,
  listFilings as listFilingRows,
  putFiling as saveFiling,
} from '../../db/repositories/filing-repository.ts';
import { listPapersInHouse, type StoredPaper } from '../../db/repositories/paper-repository.ts';
import { inTransaction } from '../../db/transaction.ts';
import { InvalidInputError, NotFoundError } from '../../errors.ts';
import { reassessHousehold } from '../assess-paper.ts';
import { type Actor, canSee } from '../papers/actor.ts';
import { findTaxYearOfPaper } from '../papers/filing-answers.ts';
import type { PaperDay } from '../papers/save-change.ts';

/** Groups whose papers may wait for a return. */
const taxedGroups: readonly ClassGroup[] = [
  'tax',
  'work',
  'banking',
  'saving',
  'business',
  'bills',
  'purchases',
  'health',
  'legal',
  'vehicle',
  'home',
];

/** Answers given, and the questions that would free papers: the one that frees most comes first. */
export async function listFilings(
  actor: Actor,
  day: PaperDay,
): Promise<{
  items: Filing[];
  total: number;
  questions: z.infer<typeof filingQuestionSchema>[];
}> {
  const rows = await listFilingRows(actor.householdId);
  const waiting = await countWaiting(actor);
  const items = rows.map((row) => viewFiling(row, waiting.get(keyOf(row)) ?? 0));
  const answered = new Set(rows.filter((row) => row.answer !== 'unknown').map(keyOf));
  const questions = [...waiting]
    .filter(([key]) => !answered.has(key))
    .map(([key, papers]) => {
      const [country = '', taxYear = ''] = key.split(' ');
      return { country, taxYear, papers };
    })
    // A year that is not over has no return yet.
    .filter((question) => !isRunning(question.taxYear, day.today))
    .sort((a, b) => b.papers - a.papers || a.taxYear.localeCompare(b.taxYear));
  return { items, total: items.length, questions };
}

/** Writes an answer down and assesses the household's papers anew. */
export async function putFiling(
  input: z.infer<typeof putFilingSchema>,
  actor: Actor,
  day: PaperDay,
): Promise<Filing> {
  if (input.filedOn && input.filedOn > day.today) {
    throw new InvalidInputError([
      {
        field: 'filedOn',
        message: 'This day has not come yet. Give the day on which it was sent.',
      },
    ]);
  }
  const filedOn = input.answer === 'on-day' ? input.filedOn : null;
  const id = await inTransaction(async (transaction) => {
    const saved = await saveFiling(
      {
        ...input,
        filedOn,
        householdId: actor.householdId,
        answeredBy: actor.user.id,
        answeredAt: day.now,
      },
      transaction,
    );
    await reassessHousehold(actor.householdId, day, transaction);
    await appendEvent(
      {
        practiceId: actor.practiceId,
        householdId: actor.householdId,
        userId: actor.user.id,
        at: day.now,
        action: 'filing.answered',
        sentence: `Answered when the return for ${input.taxYear} was sent; papers of that year were assessed anew.`,
      },
      transaction,
    );
    return saved;
  });
  const row = (await listFilingRows(actor.householdId)).find((filing) => filing.id === id);
  if (!row) throw new NotFoundError();
  const waiting = await countWaiting(actor);
  return viewFiling(row, waiting.get(keyOf(row)) ?? 0);
}

/** Papers that are open because a return's day is not known, by country and tax year. */
async function countWaiting(actor: Actor): Promise<Map<string, number>> {
  const counts = new Map<string, number>();
  for (const paper of await listPapersInHouse(actor.householdId, { open: true })) {
    if (!canSee(actor, paper) || !isWaitingForReturn(paper)) continue;
    const taxYear = findTaxYearOfPaper(paper.facts, paper.country);
    if (!taxYear) continue;
    const key = keyOf({ country: paper.country, taxYear });
    counts.set(key, (counts.get(key) ?? 0) + 1);
  }
  return counts;
}

/** The sum shows it: with the return sent on time there would be a date. */
function isWaitingForReturn(paper: StoredPaper): boolean {
  return reaches([...taxedGroups], paper.classGroup) && paper.assessment.provisional !== null;
}

function isRunning(taxYear: string, today: string): boolean {
  const last = taxYear.includes('-') ? Number(taxYear.slice(0, 4)) + 1 : Number(taxYear);
  return last >= Number(today.slice(0, 4)) + (taxYear.includes('-') ? 1 : 0);
}

const keyOf = (year: { country: string; taxYear: string }) => `${year.country} ${year.taxYear}`;

function viewFiling(row: FilingRow, papersWaiting: number): Filing {
  return {
    id: row.id,
    person: row.person,
    country: row.country,
    taxYear: row.taxYear,
    answer: row.answer,
    filedOn: row.filedOn,
    papersWaiting,
  };
}
