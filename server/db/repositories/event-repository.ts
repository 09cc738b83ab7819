/** The activity record. Rows are only ever added. */
import { Op, type Transaction } from 'sequelize';
import { EventModel, type EventRow } from '../models/event-model.ts';
import { UserModel } from '../models/user-model.ts';
import type { Visibility } from './register-repository.ts';
import { selectRows } from './sql.ts';

export interface NewEvent {
  practiceId: string;
  householdId: string | null;
  userId: string | null;
  at: Date;
  action: string;
  /** Plain sentence for the screen. */
  sentence: string;
  paperId?: string | null;
  shredListId?: string | null;
  detail?: Record<string, unknown>;
}

export async function appendEvent(event: NewEvent, transaction: Transaction): Promise<void> {
  await EventModel.create(event, { transaction });
}

export async function appendEvents(events: NewEvent[], transaction: Transaction): Promise<void> {
  await EventModel.bulkCreate(events, { transaction });
}

/**
 * Newest first, with the names of those who acted. What concerns a paper that the viewer may not see is
 * left out; somebody who sees some kinds of paper only is told nothing of subjects either.
 */
export async function listEvents(
  householdId: string,
  visible: Visibility,
  page: { offset: number; limit: number },
): Promise<{ rows: ListedEvent[]; total: number }> {
  const bind = { householdId, groups: visible.groups, viewer: visible.userId };
  const [rows, counted] = await Promise.all([
    selectRows<ListedEvent>(
      `select e.id::text as id, e.at, e.action, e.sentence, e.paper_id as "paperId",
         e.shred_list_id as "shredListId",
         case when e.user_id is null then 'Slackwater' else coalesce(u.name, 'Somebody') end as "byName"
       from events e left join users u on u.id = e.user_id
       where ${visibleEvents} order by e.id desc offset $offset limit $limit`,
      { ...bind, ...page },
    ),
    selectRows<{ total: number }>(
      `select count(*)::int as total from events e where ${visibleEvents}`,
      bind,
    ),
  ]);
  return { rows, total: counted[0]?.total ?? 0 };
}

export type ListedEvent = Pick<
  EventRow,
  'id' | 'at' | 'action' | 'sentence' | 'paperId' | 'shredListId'
> & { byName: string };

const visibleEvents = `e.household_id = $householdId
  and ($groups::text[] is null or e.action not like 'subject.%')
  and (e.paper_id is null or case when $groups::text[] is null
    then not exists (select 1 from papers p where p.id = e.paper_id
      and p.eyes_only_user_id <> $viewer)
    else exists (select 1 from papers p where p.id = e.paper_id
      and p.class_group = any($groups::text[])
      and (p.eyes_only_user_id is null or p.eyes_only_user_id = $viewer)) end)`;

/** Names of users by id. */
export async function namesOf(ids: (string | null)[]): Promise<Map<string, string>> {
  const wanted = [...new Set(ids.filter((id): id is string => id !== null))];
  if (wanted.length === 0) return new Map();
  const users = await UserModel.findAll({ where: { id: { [Op.in]: wanted } } });
  return new Map(users.map((user) => [user.id, user.name]));
}
