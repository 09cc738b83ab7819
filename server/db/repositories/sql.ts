/** Plain SQL on the connected database, for questions that models answer badly. */
import { QueryTypes, type Transaction } from 'sequelize';
import { PaperModel } from '../models/paper-model.ts';

/** Rows of a `select` or of a statement with `returning`; `$name` in the text is bound from `bind`. */
export async function selectRows<T extends object>(
  sql: string,
  bind: Record<string, unknown>,
  transaction?: Transaction,
): Promise<T[]> {
  const { sequelize } = PaperModel;
  if (!sequelize) throw new Error('No database is connected.');
  return sequelize.query<T>(sql, {
    bind,
    type: QueryTypes.SELECT,
    transaction: transaction ?? null,
  });
}
