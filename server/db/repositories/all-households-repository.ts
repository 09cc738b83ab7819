import { HouseholdModel, type HouseholdRow } from '../models/household-model.ts';

/** Every household of every practice: for jobs only, never for a request. */
export async function listAllHouseholds(): Promise<HouseholdRow[]> {
  const rows = await HouseholdModel.findAll({ order: ['createdAt', 'id'] });
  return rows.map((row) => row.get({ plain: true }));
}
