import type { Clock } from '../../clock.ts';
import type { Household } from '../../contract/households.ts';
import { countForHouseholds } from '../../db/repositories/household-repository.ts';
import { practiceNames } from '../../db/repositories/user-repository.ts';
import type { HouseholdRow } from '../../db/models/household-model.ts';

/** Who looks at a household: counts tell of nothing that this person may not see. */
export interface Viewer {
  userId: string;
  /** The class groups that the viewer sees of a household; null stands for all. */
  groupsIn(household: { id: string; practiceId: string }): string[] | null;
}

/** Households as the API shows them, with counts and today's date where they live. */
export async function viewHouseholds(
  rows: HouseholdRow[],
  viewer: Viewer,
  clock: Clock,
): Promise<Household[]> {
  const [counts, practices] = await Promise.all([
    countForHouseholds({
      userId: viewer.userId,
      households: rows.map((row) => ({ id: row.id, groups: viewer.groupsIn(row) })),
    }),
    practiceNames([...new Set(rows.map((row) => row.practiceId))]),
  ]);
  return rows.map((row) => {
    const count = counts.get(row.id);
    return {
      id: row.id,
      practiceId: row.practiceId,
      practiceName: practices.get(row.practiceId) ?? '',
      name: row.name,
      country: row.country,
      region: row.region,
      timeZone: row.timeZone,
      circumstances: row.circumstances,
      people: row.people,
      businessNames: row.businessNames,
      hopes: row.hopes,
      leadDays: row.leadDays,
      version: row.version,
      createdAt: row.createdAt.toISOString(),
      today: clock.todayIn(row.timeZone),
      counts: {
        toReview: count?.toReview ?? 0,
        undecided: count?.undecided ?? 0,
        kept: count?.kept ?? 0,
        leaving: count?.leaving ?? 0,
        left: count?.left ?? 0,
        reading: count?.reading ?? 0,
        holds: count?.holds ?? 0,
        boxes: count?.boxes ?? 0,
      },
    };
  });
}
