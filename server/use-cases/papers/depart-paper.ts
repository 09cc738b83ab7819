/** Leaving other than by shredding, and stepping down from advice. */
import type { z } from 'zod';
import type { departSchema, Paper } from '../../contract/papers.ts';
import { insertDepartures } from '../../db/repositories/departure-repository.ts';
import { findHousehold } from '../../db/repositories/household-repository.ts';
import { ConflictError, GateClosedError } from '../../errors.ts';
import { delegateStandings, neverApprovedByDelegates } from '../../contract/permissions.ts';
import { ForbiddenError } from '../../errors.ts';
import { loadAssessContext } from '../assess-paper.ts';
import { type Actor, requireLivingMandate, requireReach } from './actor.ts';
import { askGate, nameReasons } from './gate-paper.ts';
import { changeLocked, type PaperDay } from './save-change.ts';
import { getPaper } from './view-paper.ts';

const wayWords = {
  recycle: 'recycled',
  'give-back': 'given back',
  'pass-on': 'passed on',
} as const;

/**
 * Records that a paper left by recycling, giving back or passing on.
 * @throws GateClosedError with one sentence for each reason why it may not
 */
export async function departPaper(
  target: { id: string; version: number },
  input: z.infer<typeof departSchema>,
  actor: Actor,
  day: PaperDay,
): Promise<Paper> {
  await requireMandate(actor, day);
  await changeLocked(target, actor, day, async (paper, transaction) => {
    requireReach(actor, paper.classGroup, 'letting it leave');
    requireDelegateMay(actor, paper.class);
    const context = await loadAssessContext(paper.householdId, day, transaction);
    const { reasons, assessment } = askGate(paper, context, {
      how: input.how,
      on: input.on,
      today: day.today,
    });
    if (reasons.length > 0) throw new GateClosedError(nameReasons(paper, reasons));
    await insertDepartures(
      [
        {
          householdId: paper.householdId,
          paperId: paper.id,
          how: input.how,
          on: input.on,
          recipient: input.to,
          shredListId: null,
          recordedBy: actor.user.id,
          recordedAt: day.now,
          assessment,
        },
      ],
      transaction,
    );
    return {
      values: { status: 'left', leftOn: input.on },
      sentence: `left: ${wayWords[input.how]}.`,
      action: 'paper.left',
    };
  });
  return getPaper(target.id, actor, day);
}

/** Steps down from "advised until" to the rule's own date. Nobody goes below that. */
export async function stepDown(
  target: { id: string; version: number },
  reason: string,
  actor: Actor,
  day: PaperDay,
): Promise<Paper> {
  await requireMandate(actor, day);
  await changeLocked(target, actor, day, (paper) => {
    requireReach(actor, paper.classGroup, 'choosing the shorter date');
    const { advisedUntil, keepUntil, shredFrom, open, permanent } = paper.assessment;
    if (advisedUntil === null || open || permanent || shredFrom === null) {
      throw new ConflictError('There is no advice beyond the rule to step down from.');
    }
    return {
      values: {
        steppedDown: { on: day.today, byName: actor.user.name, reason, advisedUntil },
      },
      sentence: `stepped down from ${advisedUntil} to ${keepUntil ?? shredFrom}.`,
      action: 'paper.stepped-down',
    };
  });
  return getPaper(target.id, actor, day);
}

/** @throws ForbiddenError when the authority of an attorney or deputy has ended */
export async function requireMandate(actor: Actor, day: PaperDay): Promise<void> {
  const household = await findHousehold(actor.householdId);
  requireLivingMandate(actor, household?.people ?? [], day.today);
}

/** @throws ForbiddenError for wills, deeds, powers of attorney and gift records */
export function requireDelegateMay(actor: Actor, classId: string): void {
  const { standing } = actor.membership;
  if (!standing || !delegateStandings.includes(standing)) return;
  if ((neverApprovedByDelegates as readonly string[]).includes(classId)) {
    throw new ForbiddenError(
      'An attorney, deputy or executor never approves the destruction of wills, deeds, powers of attorney or gift records. Keep it, and ask the solicitor.',
    );
  }
}
