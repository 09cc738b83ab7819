import type { Deps } from '../deps.ts';
import { findHouseholdDay, type HouseholdDay } from '../use-cases/household-day.ts';
import type { Access } from './caller.ts';

/** The day and instant of a call, in the household's time zone, with the rules in force. */
export function dayOf(
  access: Pick<Access, 'householdId'>,
  deps: Pick<Deps, 'clock' | 'ruleSet'>,
): Promise<HouseholdDay> {
  return findHouseholdDay(access.householdId, deps);
}
