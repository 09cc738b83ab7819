/** The demo's practice and its people: all invented. */
import type { ClassGroup } from '../../contract/document-classes.ts';
import { MembershipModel } from '../models/membership-model.ts';
import { PracticeModel } from '../models/practice-model.ts';
import { UserModel } from '../models/user-model.ts';

export const demoEmails = {
  owner: 'owner@demo.example',
  assistant: 'assistant@demo.example',
  client: 'client@demo.example',
  adviser: 'adviser@demo.example',
} as const;

const names: Record<keyof typeof demoEmails, string> = {
  owner: 'Rosalind Teague',
  assistant: 'Jory Penhale',
  client: 'Winifred Pennelow',
  adviser: 'Dorcas Whitlam',
};

const sharedWithAdviser: ClassGroup[] = ['tax', 'banking', 'saving', 'business', 'work'];

export interface DemoPeople {
  practiceId: string;
  userIds: Record<keyof typeof demoEmails, string>;
}

/** Adds the practice, its owner's membership and four users. */
export async function addDemoPeople(today: string, passwordHash: string): Promise<DemoPeople> {
  const practice = await PracticeModel.create({ name: 'Marram House Organising', country: 'GB' });
  const add = async (role: keyof typeof demoEmails) => {
    const user = await UserModel.create({
      email: demoEmails[role],
      name: names[role],
      passwordHash,
    });
    return user.id;
  };
  const userIds = {
    owner: await add('owner'),
    assistant: await add('assistant'),
    client: await add('client'),
    adviser: await add('adviser'),
  };
  await MembershipModel.create({
    userId: userIds.owner,
    practiceId: practice.id,
    role: 'owner',
    startsOn: today,
  });
  return { practiceId: practice.id, userIds };
}

/** Ties the assistant, and where wanted client and adviser, to a household. */
export async function addDemoMembers(
  people: DemoPeople,
  householdId: string,
  roles: ('assistant' | 'client' | 'adviser')[],
  today: string,
): Promise<void> {
  for (const role of roles) {
    await MembershipModel.create({
      userId: people.userIds[role],
      practiceId: people.practiceId,
      householdId,
      role,
      standing: role === 'client' ? 'self' : null,
      rights:
        role === 'client' ? { see: 'all', decide: 'all', approve: 'all', export: 'all' } : null,
      sharedGroups: role === 'adviser' ? sharedWithAdviser : null,
      startsOn: today,
    });
  }
}
