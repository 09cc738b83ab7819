/** Adding, listing and changing households. */
import type { z } from 'zod';
import type { Clock } from '../../clock.ts';
import type {
  createHouseholdSchema,
  Household,
  updateHouseholdSchema,
} from '../../contract/households.ts';
import { type Membership, type Reach, reaches, reachOf } from '../../contract/permissions.ts';
import { appendEvent } from '../../db/repositories/event-repository.ts';
import {
  findHousehold,
  insertHousehold,
  listHouseholds as listHouseholdRows,
  updateHousehold as updateHouseholdRow,
} from '../../db/repositories/household-repository.ts';
import { inTransaction } from '../../db/transaction.ts';
import type { Deps } from '../../deps.ts';
import { InvalidInputError, NotFoundError, StaleVersionError } from '../../errors.ts';
import { findCaseProblems } from '../../retention/case-problems.ts';
import type { RuleSet } from '../../retention/rule-set.ts';
import { reassessHousehold } from '../assess-paper.ts';
import { groupsOf } from '../papers/actor.ts';
import { type Viewer, viewHouseholds } from './view-household.ts';

/** The households that somebody's memberships reach. */
export async function listHouseholds(
  { userId, memberships }: { userId: string; memberships: Membership[] },
  page: { page: number; pageSize: number; sort?: string | undefined },
  clock: Clock,
): Promise<{ items: Household[]; total: number }> {
  const readable = memberships.filter((m) => reaches(reachOf(m, 'household:read')));
  const { rows, total } = await listHouseholdRows({
    practiceIds: readable.filter((m) => m.householdId === null).map((m) => m.practiceId),
    householdIds: readable.flatMap((m) => (m.householdId ? [m.householdId] : [])),
    offset: (page.page - 1) * page.pageSize,
    limit: page.pageSize,
    descending: page.sort === '-name',
  });
  const viewer: Viewer = {
    userId,
    groupsIn: ({ id, practiceId }) => {
      const membership = readable.find(
        (m) => m.practiceId === practiceId && (m.householdId === null || m.householdId === id),
      );
      return membership ? groupsOf(reachOf(membership, 'paper:read')) : [];
    },
  };
  return { items: await viewHouseholds(rows, viewer, clock), total };
}

/** @throws NotFoundError */
export async function getHousehold(
  id: string,
  by: { userId: string; seeReach: Reach },
  clock: Clock,
): Promise<Household> {
  const row = await findHousehold(id);
  const viewer = { userId: by.userId, groupsIn: () => groupsOf(by.seeReach) };
  const [view] = row ? await viewHouseholds([row], viewer, clock) : [];
  if (!view) throw new NotFoundError();
  return view;
}

export async function createHousehold(
  input: z.infer<typeof createHouseholdSchema>,
  by: { userId: string; practiceId: string },
  { clock, ruleSet }: Pick<Deps, 'clock' | 'ruleSet'>,
): Promise<Household> {
  requireKnownPlace(input, ruleSet);
  const row = await inTransaction(async (transaction) => {
    const made = await insertHousehold({ ...input, practiceId: by.practiceId }, transaction);
    await appendEvent(
      {
        practiceId: by.practiceId,
        householdId: made.id,
        userId: by.userId,
        at: clock.now(),
        action: 'household.created',
        sentence: 'Added the household.',
      },
      transaction,
    );
    return made;
  });
  return getHousehold(row.id, { userId: by.userId, seeReach: 'all' }, clock);
}

/**
 * Changes a household and assesses its papers anew.
 * @throws StaleVersionError when somebody else was faster
 */
export async function updateHousehold(
  id: string,
  version: number,
  changes: z.infer<typeof updateHouseholdSchema>,
  by: { userId: string; practiceId: string; seeReach: Reach },
  deps: Pick<Deps, 'clock' | 'ruleSet'>,
): Promise<Household> {
  const before = await findHousehold(id);
  if (!before) throw new NotFoundError();
  requireKnownPlace(
    {
      country: changes.country ?? before.country,
      region: changes.region === undefined ? before.region : changes.region,
    },
    deps.ruleSet,
  );
  const isWritten = await inTransaction(async (transaction) => {
    if (!(await updateHouseholdRow(id, version, changes, transaction))) return false;
    await appendEvent(
      {
        practiceId: by.practiceId,
        householdId: id,
        userId: by.userId,
        at: deps.clock.now(),
        action: 'household.changed',
        sentence: `Changed what is known about the household: ${Object.keys(changes).map(sayField).join(', ')}.`,
      },
      transaction,
    );
    const today = deps.clock.todayIn(changes.timeZone ?? before.timeZone);
    await reassessHousehold(id, { today, ruleSet: deps.ruleSet }, transaction);
    return true;
  });
  const current = await getHousehold(id, by, deps.clock);
  if (!isWritten) throw new StaleVersionError(current);
  return current;
}

const fieldWords: Record<string, string> = {
  timeZone: 'time zone',
  businessNames: 'names of businesses',
  leadDays: 'days before an expiry',
  hopes: 'hopes',
};

function sayField(field: string): string {
  return fieldWords[field] ?? field;
}

/** The place is checked by the same code as the country and region of a case. */
function requireKnownPlace(
  place: { country: string; region: string | null },
  ruleSet: RuleSet,
): void {
  const problems = findCaseProblems(
    {
      country: place.country,
      class: 'unrecognised',
      on: '2000-01-01',
      inputs: { region: place.region },
    },
    ruleSet,
  );
  if (problems.length > 0) {
    throw new InvalidInputError(
      problems.map((p) => ({ field: p.field.replace('inputs.', ''), message: p.message })),
    );
  }
}
