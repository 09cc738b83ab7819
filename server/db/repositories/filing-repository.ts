/** Answers about tax returns sent. */
import type { Transaction } from 'sequelize';
import { FilingModel, type FilingRow } from '../models/filing-model.ts';
import { selectRows } from './sql.ts';

export type { FilingRow } from '../models/filing-model.ts';

/** Newest tax year first. */
export async function listFilings(
  householdId: string,
  transaction?: Transaction,
): Promise<FilingRow[]> {
  const rows = await FilingModel.findAll({
    where: { householdId },
    order: [
      ['taxYear', 'DESC'],
      ['country', 'ASC'],
      ['person', 'ASC'],
    ],
    transaction: transaction ?? null,
  });
  return rows.map((row) => row.get({ plain: true }));
}

/** One answer per person, country and tax year: a new one takes the place of the old. */
export async function putFiling(
  filing: Pick<
    FilingRow,
    'householdId' | 'person' | 'country' | 'taxYear' | 'answer' | 'filedOn' | 'answeredBy'
  > & { answeredAt: Date },
  transaction: Transaction,
): Promise<string> {
  const rows = await selectRows<{ id: string }>(
    `insert into filings (household_id, person, country, tax_year, answer, filed_on, answered_by, answered_at)
     values ($householdId, $person, $country, $taxYear, $answer, $filedOn, $answeredBy, $answeredAt)
     on conflict (household_id, country, tax_year, coalesce(person, '')) do update
       set answer = excluded.answer, filed_on = excluded.filed_on,
           answered_by = excluded.answered_by, answered_at = excluded.answered_at
     returning id`,
    filing,
    transaction,
  );
  const id = rows[0]?.id;
  if (!id) throw new Error('The answer was not stored.');
  return id;
}
