/** How and when sheets left their household. */
import type { Transaction } from 'sequelize';
import { DepartureModel, type DepartureRow } from '../models/departure-model.ts';

export async function insertDepartures(
  departures: Omit<DepartureRow, 'id'>[],
  transaction: Transaction,
): Promise<void> {
  await DepartureModel.bulkCreate(departures, { transaction });
}
