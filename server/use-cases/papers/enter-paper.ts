/** Papers and bundles that a person describes by hand. */
import type { z } from 'zod';
import { requireClass } from '../../contract/document-classes.ts';
import type { enterPaperSchema, Paper } from '../../contract/papers.ts';
import { emptyFacts } from '../../contract/readings.ts';
import { appendEvent } from '../../db/repositories/event-repository.ts';
import { findBox } from '../../db/repositories/box-repository.ts';
import { findHousehold, takeNumbers } from '../../db/repositories/household-repository.ts';
import { insertPaper } from '../../db/repositories/paper-repository.ts';
import { inTransaction } from '../../db/transaction.ts';
import { InvalidInputError, NotFoundError } from '../../errors.ts';
import { assessPaper, loadAssessContext } from '../assess-paper.ts';
import { type Actor, requireReach, visibilityOf } from './actor.ts';
import { patchFacts } from './patch-facts.ts';
import type { PaperDay } from './save-change.ts';
import { getPaper } from './view-paper.ts';

/** Enters a paper or a bundle without a scan; it waits for review like any other. */
export async function enterPaper(
  input: z.infer<typeof enterPaperSchema>,
  actor: Actor,
  day: PaperDay,
): Promise<Paper> {
  const { group } = requireClass(input.class);
  requireReach(actor, group, 'entering papers');
  // What one may not see cannot be shown after it was entered.
  requireReach({ ...actor, reach: actor.seeReach }, group, 'entering papers');
  if (
    input.boxId &&
    (await findBox(input.boxId, visibilityOf(actor)))?.householdId !== actor.householdId
  ) {
    throw new InvalidInputError([
      { field: 'boxId', message: 'This box is not one of the household.' },
    ]);
  }
  const household = await findHousehold(actor.householdId);
  if (!household) throw new NotFoundError();
  const { facts: patch, country = household.country, ...values } = input;
  const id = await inTransaction(async (transaction) => {
    const number = await takeNumbers(actor.householdId, 'nextPaperNumber', 1, transaction);
    const facts = patchFacts(emptyFacts(), patch, input.class, country);
    const context = await loadAssessContext(actor.householdId, day, transaction);
    const assessed = assessPaper(
      { ...values, id: null, country, facts, answers: {}, subjectId: null, steppedDown: null },
      context,
    );
    const paper = await insertPaper(
      { ...values, ...assessed, householdId: actor.householdId, number, country, facts },
      transaction,
    );
    await appendEvent(
      {
        practiceId: actor.practiceId,
        householdId: actor.householdId,
        userId: actor.user.id,
        at: day.now,
        action: 'paper.entered',
        sentence: `Entered paper ${number} by hand.`,
        paperId: paper.id,
      },
      transaction,
    );
    return paper.id;
  });
  return getPaper(id, actor, day);
}
