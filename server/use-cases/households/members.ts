import type { Clock } from '../../clock.ts';
import { listMembers, type Member } from '../../db/repositories/user-repository.ts';

/** Who belongs to a household today, the owners of its practice included. */
export async function listHouseholdMembers(
  household: { householdId: string; practiceId: string },
  clock: Clock,
): Promise<{ items: Member[]; total: number }> {
  const items = await listMembers(
    { id: household.householdId, practiceId: household.practiceId },
    clock.todayIn('UTC'),
  );
  return { items, total: items.length };
}
