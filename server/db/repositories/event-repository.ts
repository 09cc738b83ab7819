/** The activity record. Rows are only ever added. */
import { Op, type Transaction } from 'sequelize';
import { EventModel, type EventRow } from '../models/event-model.ts';
import { UserModel } from '../models/user-model.ts';

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

/** Newest first, with the names of those who acted. */
export async function listEvents(
  householdId: string,
  page: { offset: number; limit: number },
): Promise<{ rows: (EventRow & { byName: string })[]; total: number }> {
  const { rows, count } = await EventModel.findAndCountAll({
    where: { householdId },
    order: [['id', 'DESC']],
    ...page,
  });
  const names = await namesOf(rows.map((row) => row.userId));
  return {
    rows: rows.map((row) => ({
      ...row.get({ plain: true }),
      byName: row.userId ? (names.get(row.userId) ?? 'Somebody') : 'Slackwater',
    })),
    total: count,
  };
}

/** Names of users by id. */
export async function namesOf(ids: (string | null)[]): Promise<Map<string, string>> {
  const wanted = [...new Set(ids.filter((id): id is string => id !== null))];
  if (wanted.length === 0) return new Map();
  const users = await UserModel.findAll({ where: { id: { [Op.in]: wanted } } });
  return new Map(users.map((user) => [user.id, user.name]));
}
