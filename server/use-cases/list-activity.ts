import type { Activity } from '../contract/activity.ts';
import { listEvents } from '../db/repositories/event-repository.ts';

/** Who did what when, newest first. */
export async function listActivity(
  householdId: string,
  page: { page: number; pageSize: number },
): Promise<{ items: Activity[]; total: number }> {
  const { rows, total } = await listEvents(householdId, {
    offset: (page.page - 1) * page.pageSize,
    limit: page.pageSize,
  });
  return {
    total,
    items: rows.map((row) => ({
      id: row.id,
      at: row.at.toISOString(),
      byName: row.byName,
      action: row.action,
      sentence: row.sentence,
      paperId: row.paperId,
      shredListId: row.shredListId,
    })),
  };
}
