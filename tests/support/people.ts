/** A practice with a household and one person of each role, for tests of who may do what. */
import { hashPassword } from '../../server/auth/passwords.ts';
import type { Membership } from '../../server/contract/permissions.ts';
import { HouseholdModel } from '../../server/db/models/household-model.ts';
import { MembershipModel } from '../../server/db/models/membership-model.ts';
import { PracticeModel } from '../../server/db/models/practice-model.ts';
import { UserModel } from '../../server/db/models/user-model.ts';

export const testPassword = 'a long enough password';

let hashed: Promise<string> | null = null;

export interface TestPractice {
  practiceId: string;
  householdId: string;
  emails: Record<'owner' | 'assistant' | 'client' | 'adviser', string>;
  userIds: Record<'owner' | 'assistant' | 'client' | 'adviser', string>;
}

/** Adds a practice whose people have e-mail addresses beginning with their role. */
export async function addPractice(name = 'first'): Promise<TestPractice> {
  const practice = await PracticeModel.create({ name: `Practice ${name}`, country: 'GB' });
  const household = await HouseholdModel.create({
    practiceId: practice.id,
    name: `Household ${name}`,
    country: 'GB',
    region: 'england-wales',
    timeZone: 'Europe/London',
    circumstances: {},
    people: [{ name: 'Ada Client', birthDate: '1951-05-17', diedOn: null }],
    businessNames: [],
    leadDays: {},
  });
  const all = { see: 'all', decide: 'all', approve: 'all', export: 'all' } as const;
  const owner = await addMember({
    role: 'owner',
    email: `owner@${name}.example`,
    practiceId: practice.id,
  });
  const assistant = await addMember({
    role: 'assistant',
    email: `assistant@${name}.example`,
    practiceId: practice.id,
    householdId: household.id,
  });
  const client = await addMember({
    role: 'client',
    email: `client@${name}.example`,
    practiceId: practice.id,
    householdId: household.id,
    standing: 'self',
    rights: all,
    userName: 'Ada Client',
  });
  const adviser = await addMember({
    role: 'adviser',
    email: `adviser@${name}.example`,
    practiceId: practice.id,
    householdId: household.id,
    sharedGroups: ['tax', 'banking', 'business'],
  });
  return {
    practiceId: practice.id,
    householdId: household.id,
    emails: {
      owner: `owner@${name}.example`,
      assistant: `assistant@${name}.example`,
      client: `client@${name}.example`,
      adviser: `adviser@${name}.example`,
    },
    userIds: { owner, assistant, client, adviser },
  };
}

/** Adds a user with one membership; answers the user's id. */
export async function addMember(
  values: Pick<Membership, 'role' | 'practiceId'> &
    Partial<Omit<Membership, 'role' | 'practiceId'>> & { email: string; userName?: string },
): Promise<string> {
  hashed ??= hashPassword(testPassword);
  const user = await UserModel.create({
    email: values.email,
    name: values.userName ?? values.email.split('@')[0] ?? 'Somebody',
    passwordHash: await hashed,
  });
  await MembershipModel.create({
    userId: user.id,
    practiceId: values.practiceId,
    householdId: values.householdId ?? null,
    role: values.role,
    standing: values.standing ?? null,
    rights: values.rights ?? null,
    sharedGroups: values.sharedGroups ?? null,
    startsOn: values.startsOn ?? '2020-01-01',
    endsOn: values.endsOn ?? null,
  });
  return user.id;
}
