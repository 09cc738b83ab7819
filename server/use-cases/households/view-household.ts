import type { Clock } from '../../clock.ts';
import type { Household } from '../../contract/households.ts';
import { countForHouseholds } from '../../db/repositories/household-repository.ts';
import { practiceNames } from '../../db/repositories/user-repository.ts';
import type { HouseholdRow } from '../../db/models/household-model.ts';

/** Households as the API shows them, with counts and today's date where they live. */
export async function viewHouseholds(rows: HouseholdRow[], clock: Clock): Promise<Household[]> {
  const [counts, practices] = await Promise.all([
    countForHouseholds(rows.map((row) => row.id)),
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
