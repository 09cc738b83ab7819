import type { Transaction } from 'sequelize';
import { UserModel } from './models/user-model.ts';

export type { Transaction };

/** Runs `work` in one transaction of the connected database: all of it is kept, or nothing. */
export function inTransaction<T>(work: (transaction: Transaction) => Promise<T>): Promise<T> {
  const { sequelize } = UserModel;
  if (!sequelize) throw new Error('No database is connected.');
  return sequelize.transaction(work);
}
