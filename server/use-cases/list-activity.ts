import type { Activity } from '../contract/activity.ts';
import { listEvents, type ListedEvent } from '../db/repositories/event-repository.ts';
import { type Actor, visibilityOf } from './papers/actor.ts';

/** Who did what when, newest first, as far as the reader may know. */
export async function listActivity(
  actor: Pick<Actor, 'householdId' | 'user' | 'seeReach'>,
  page: { page: number; pageSize: number },
): Promise<{ items: Activity[]; total: number }> {
  const { rows, total } = await listEvents(actor.householdId, visibilityOf(actor), {
    offset: (page.page - 1) * page.pageSize,
    limit: page.pageSize,
  });
  const seesAll = actor.seeReach === 'all';
  return {
    total,
    items: rows.map((row) => ({
      id: row.id,
      at: new Date(row.at).toISOString(),
      byName: row.byName,
      action: row.action,
      sentence: seesAll ? row.sentence : tellLess(row),
      paperId: row.paperId,
      shredListId: row.shredListId,
    })),
  };
}

const lessWords: Record<string, string> = {
  'scan.read': 'Read a scan.',
  'shred-list.created': 'Gathered a shred list.',
  'shred-list.approved': 'Approved a shred list.',
  'shred-list.done': 'Recorded what was shredded.',
  'paper.changed': 'Changed a paper.',
  'paper.undone': 'Took a change of a paper back.',
};

/** For readers of some kinds of paper: no counts of all papers, and no kind that a paper was taken for before. */
function tellLess({ action, sentence }: Pick<ListedEvent, 'action' | 'sentence'>): string {
  return lessWords[action] ?? sentence;
}
