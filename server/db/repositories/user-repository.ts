/** Users and their memberships. */
import { Op, QueryTypes, where, fn, col, type Transaction } from 'sequelize';
import type { Membership } from '../../contract/permissions.ts';
import { MembershipModel, type MembershipRow } from '../models/membership-model.ts';
import { PracticeModel } from '../models/practice-model.ts';
import { UserModel, type UserRow } from '../models/user-model.ts';

export async function findUserByEmail(email: string): Promise<UserRow | null> {
  const found = await UserModel.findOne({
    where: where(fn('lower', col('email')), email.trim().toLowerCase()),
  });
  return found?.get({ plain: true }) ?? null;
}

export async function findUser(id: string): Promise<UserRow | null> {
  const found = await UserModel.findByPk(id);
  return found?.get({ plain: true }) ?? null;
}

export async function hasUsers(): Promise<boolean> {
  return (await UserModel.count()) > 0;
}

const membershipColumns = `
  m.id, m.role, m.practice_id as "practiceId", p.name as "practiceName",
  m.household_id as "householdId", h.name as "householdName", m.standing, m.rights,
  m.shared_groups as "sharedGroups", m.starts_on::text as "startsOn", m.ends_on::text as "endsOn"`;

/** Memberships of a user that are in force on a day. */
export function listMemberships(userId: string, on: string): Promise<Membership[]> {
  return query<Membership>(
    `select ${membershipColumns}
     from memberships m join practices p on p.id = m.practice_id left join households h on h.id = m.household_id
     where m.user_id = $userId and m.starts_on <= $on and (m.ends_on is null or m.ends_on >= $on)
     order by m.created_at, m.id`,
    { userId, on },
  );
}

export interface Member {
  membership: Membership;
  user: { id: string; name: string; email: string };
}

/** Everybody who belongs to a household on a day, the owners of its practice included. */
export async function listMembers(
  household: { id: string; practiceId: string },
  on: string,
): Promise<Member[]> {
  const rows = await query<Membership & { userId: string; userName: string; userEmail: string }>(
    `select ${membershipColumns}, u.id as "userId", u.name as "userName", u.email as "userEmail"
     from memberships m join users u on u.id = m.user_id
       join practices p on p.id = m.practice_id left join households h on h.id = m.household_id
     where m.practice_id = $practiceId and (m.household_id = $householdId or m.role = 'owner')
       and m.starts_on <= $on and (m.ends_on is null or m.ends_on >= $on)
     order by m.created_at, m.id`,
    { practiceId: household.practiceId, householdId: household.id, on },
  );
  return rows.map(({ userId, userName, userEmail, ...membership }) => ({
    membership,
    user: { id: userId, name: userName, email: userEmail },
  }));
}

export async function insertMembership(
  values: Omit<MembershipRow, 'id' | 'createdAt'>,
  transaction: Transaction,
): Promise<string> {
  const made = await MembershipModel.create(values, { transaction });
  return made.id;
}

/** Names of practices by id. */
export async function practiceNames(ids: string[]): Promise<Map<string, string>> {
  const rows = await PracticeModel.findAll({ where: { id: { [Op.in]: ids } } });
  return new Map(rows.map((row) => [row.id, row.name]));
}

function query<T extends object>(sql: string, bind: Record<string, unknown>): Promise<T[]> {
  const { sequelize } = UserModel;
  if (!sequelize) throw new Error('No database is connected.');
  return sequelize.query<T>(sql, { bind, type: QueryTypes.SELECT });
}

export async function insertUser(
  values: { email: string; name: string; passwordHash: string | null },
  transaction: Transaction,
): Promise<UserRow> {
  const made = await UserModel.create({ ...values, email: values.email.trim() }, { transaction });
  await made.reload({ transaction });
  return made.get({ plain: true });
}

export async function updateUser(
  id: string,
  values: Partial<Pick<UserRow, 'email' | 'name' | 'passwordHash'>>,
  transaction: Transaction,
): Promise<void> {
  await UserModel.update(values, { where: { id }, transaction });
}

export async function findMembershipOf(
  householdId: string,
  membershipId: string,
  transaction: Transaction,
): Promise<MembershipRow | null> {
  const found = await MembershipModel.findOne({
    where: { id: membershipId, householdId },
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  return found?.get({ plain: true }) ?? null;
}

export async function updateMembershipRow(
  id: string,
  values: Partial<MembershipRow>,
  transaction: Transaction,
): Promise<void> {
  await MembershipModel.update(values, { where: { id }, transaction });
}

/** One membership of a household with its user, whether in force or not. */
export async function findMember(
  householdId: string,
  membershipId: string,
): Promise<Member | null> {
  const rows = await query<Membership & { userId: string; userName: string; userEmail: string }>(
    `select ${membershipColumns}, u.id as "userId", u.name as "userName", u.email as "userEmail"
     from memberships m join users u on u.id = m.user_id
       join practices p on p.id = m.practice_id left join households h on h.id = m.household_id
     where m.id = $membershipId and m.household_id = $householdId`,
    { membershipId, householdId },
  );
  const row = rows[0];
  if (!row) return null;
  const { userId, userName, userEmail, ...membership } = row;
  return { membership, user: { id: userId, name: userName, email: userEmail } };
}

/** A practice that a user belongs or belonged to, in whose name messages go out; null when none. */
export async function findFirstPracticeOf(userId: string): Promise<string | null> {
  const found = await MembershipModel.findOne({ where: { userId }, order: ['createdAt'] });
  return found?.practiceId ?? null;
}
