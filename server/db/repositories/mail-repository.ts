/** Messages and reminders on record. */
import { Op, QueryTypes, type Transaction } from 'sequelize';
import type { ClassId } from '../../contract/document-classes.ts';
import type { PaperStatus } from '../../contract/papers.ts';
import { MailModel, type MailRow } from '../models/mail-model.ts';
import { ReminderModel, type ReminderRow } from '../models/reminder-model.ts';
import type { Visibility } from './register-repository.ts';

export async function insertMail(
  values: Pick<MailRow, 'practiceId' | 'userId' | 'address' | 'subject' | 'text' | 'html'>,
  transaction: Transaction,
): Promise<string> {
  const made = await MailModel.create(values, { transaction });
  return made.id;
}

/**
 * Takes a message that waits, for sending, and locks it until the transaction ends; null when it was
 * sent or another process has it.
 */
export async function lockWaitingMail(
  id: string,
  transaction: Transaction,
): Promise<MailRow | null> {
  const found = await MailModel.findOne({
    where: { id, state: { [Op.ne]: 'sent' } },
    transaction,
    lock: transaction.LOCK.UPDATE,
    skipLocked: true,
  });
  return found?.get({ plain: true }) ?? null;
}

export async function updateMail(
  id: string,
  values: Partial<MailRow>,
  transaction: Transaction,
): Promise<void> {
  await MailModel.update(values, { where: { id }, transaction });
}

/** Messages whose next attempt is due and that no job may be waiting for. */
export async function listOverdueMailIds(now: Date): Promise<string[]> {
  const rows = await MailModel.findAll({
    attributes: ['id'],
    where: {
      state: { [Op.ne]: 'sent' },
      [Op.or]: [{ nextAttemptAt: null }, { nextAttemptAt: { [Op.lte]: now } }],
    },
    order: ['createdAt'],
    limit: 500,
  });
  return rows.map((row) => row.id);
}

export async function listMails(
  practiceId: string,
  page: { offset: number; limit: number },
): Promise<{ rows: (MailRow & { toName: string })[]; total: number }> {
  const { sequelize } = MailModel;
  if (!sequelize) throw new Error('No database is connected.');
  const rows = await sequelize.query<MailRow & { toName: string }>(
    `select m.id, m.subject, m.state, m.attempts, m.created_at as "createdAt", m.sent_at as "sentAt",
       m.next_attempt_at as "nextAttemptAt", m.last_error as "lastError", coalesce(u.name, m.address) as "toName"
     from mails m left join users u on u.id = m.user_id
     where m.practice_id = $practiceId order by m.created_at desc, m.id offset $offset limit $limit`,
    { bind: { practiceId, ...page }, type: QueryTypes.SELECT },
  );
  return { rows, total: await MailModel.count({ where: { practiceId } }) };
}

/** Who was told of what in a household, as "user key": saves trying to take up again what is on record. */
export async function listTakenKeys(householdId: string): Promise<Set<string>> {
  const rows = await ReminderModel.findAll({
    attributes: ['userId', 'key'],
    where: { householdId },
    raw: true,
  });
  return new Set(rows.map(({ userId, key }) => `${userId} ${key}`));
}

/** Takes reminders up for a person; answers only those that nobody had taken up before. */
export async function claimReminders(
  candidates: Pick<
    ReminderRow,
    'householdId' | 'userId' | 'paperId' | 'key' | 'kind' | 'on' | 'about'
  >[],
  transaction: Transaction,
): Promise<Set<string>> {
  const { sequelize } = ReminderModel;
  if (!sequelize) throw new Error('No database is connected.');
  const claimed = new Set<string>();
  for (const candidate of candidates) {
    const rows = await sequelize.query<{ key: string }>(
      `insert into reminders (household_id, user_id, paper_id, key, kind, "on", about)
       values ($householdId, $userId, $paperId, $key, $kind, $on, $about)
       on conflict (user_id, key) do nothing returning key`,
      { bind: { ...candidate }, transaction, type: QueryTypes.SELECT },
    );
    if (rows[0]) claimed.add(rows[0].key);
  }
  return claimed;
}

export async function linkReminders(
  userId: string,
  keys: string[],
  mailId: string,
  transaction: Transaction,
): Promise<void> {
  await ReminderModel.update({ mailId }, { where: { userId, key: keys }, transaction });
}

export interface SentReminder {
  key: string;
  kind: ReminderRow['kind'];
  on: string;
  about: string;
  paperId: string;
  paperNumber: number;
  paperStatus: PaperStatus;
  class: ClassId;
  personName: string;
  state: MailRow['state'] | null;
  sentAt: Date | null;
  lastError: string | null;
}

/**
 * Reminders of a household that were taken up, newest first, with the state of their message; of papers
 * that the viewer may see.
 */
export async function listTakenReminders(
  householdId: string,
  visible: Visibility,
): Promise<SentReminder[]> {
  const { sequelize } = ReminderModel;
  if (!sequelize) throw new Error('No database is connected.');
  return sequelize.query<SentReminder>(
    `select r.key, r.kind, r."on"::text as "on", r.about::text as about, r.paper_id as "paperId",
       p.number as "paperNumber", p.status as "paperStatus", p.class,
       u.name as "personName", m.state, m.sent_at as "sentAt", m.last_error as "lastError"
     from reminders r join users u on u.id = r.user_id join papers p on p.id = r.paper_id
       left join mails m on m.id = r.mail_id
     where r.household_id = $householdId
       and ($groups::text[] is null or p.class_group = any($groups::text[]))
       and (p.eyes_only_user_id is null or p.eyes_only_user_id = $viewer)
     order by r.created_at desc, r.key limit 500`,
    {
      bind: { householdId, groups: visible.groups, viewer: visible.userId },
      type: QueryTypes.SELECT,
    },
  );
}
