import type { Outflow } from '../../contract/households.ts';
import { sumOutflow } from '../../db/repositories/outflow-repository.ts';
import { type Actor, visibilityOf } from './actor.ts';

/** Sheets still to leave by year, and what stays, of the papers that the actor may see. */
export async function showOutflow(actor: Actor, today: string): Promise<Outflow> {
  const rows = await sumOutflow(actor.householdId, visibilityOf(actor), today);
  const sheetsOf = (part: string) => rows.find((row) => row.part === part)?.sheets ?? 0;
  return {
    today,
    left: sheetsOf('left'),
    dueNow: sheetsOf('due'),
    permanent: sheetsOf('permanent'),
    open: sheetsOf('open'),
    toReview: sheetsOf('to-review'),
    years: rows
      .filter((row) => row.year !== null)
      .map(({ year, sheets, papers }) => ({ year: year ?? 0, sheets, papers }))
      .sort((a, b) => a.year - b.year),
  };
}
