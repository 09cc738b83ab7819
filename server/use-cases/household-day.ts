import { findHousehold } from '../db/repositories/household-repository.ts';
import type { Deps } from '../deps.ts';
import { NotFoundError } from '../errors.ts';
import type { AssessDay } from './assess-paper.ts';

export interface HouseholdDay extends AssessDay {
  now: Date;
}

/** Today where a household lives, with the rules in force. @throws NotFoundError */
export async function findHouseholdDay(
  householdId: string,
  { clock, ruleSet }: Pick<Deps, 'clock' | 'ruleSet'>,
): Promise<HouseholdDay> {
  const household = await findHousehold(householdId);
  if (!household) throw new NotFoundError();
  return { today: clock.todayIn(household.timeZone), now: clock.now(), ruleSet };
}
