/** Everybody who may knock: each role, and clients of each standing and with each set of rights. */
import type { Membership, Reach, Rights, Standing } from '../../../server/contract/permissions.ts';
import { addMember } from '../people.ts';

export interface CallerKind {
  name: string;
  role: Membership['role'];
  standing: Standing | null;
  rights: Rights | null;
  sharedGroups: Reach | null;
}

const all: Rights = { see: 'all', decide: 'all', approve: 'all', export: 'all' };
const none: Rights = { see: 'none', decide: 'none', approve: 'none', export: 'none' };
const seeing: Rights = { ...none, see: 'all' };

const client = (name: string, standing: Standing, rights: Rights): CallerKind => ({
  name,
  role: 'client',
  standing,
  rights,
  sharedGroups: null,
});
const adviser = (name: string, sharedGroups: Reach): CallerKind => ({
  name,
  role: 'adviser',
  standing: null,
  rights: null,
  sharedGroups,
});
const worker = (role: 'owner' | 'assistant'): CallerKind => ({
  name: role,
  role,
  standing: null,
  rights: null,
  sharedGroups: null,
});

/** The kind of paper that the worlds are made of, and another one. */
export const paperGroup = 'bills';
const otherGroup = 'health';
const otherKinds: Reach = [otherGroup];

export const callerKinds: CallerKind[] = [
  worker('owner'),
  worker('assistant'),
  client('client, all rights', 'self', all),
  client('joint owner, all rights', 'joint-owner', all),
  client('attorney, all rights', 'attorney', all),
  client('deputy, all rights', 'deputy', all),
  client('executor, all rights', 'executor', all),
  client('helper, all rights', 'helper', all),
  client('client who sees', 'self', seeing),
  client('client who sees and decides', 'self', { ...seeing, decide: 'all' }),
  client('client who sees and approves', 'self', { ...seeing, approve: 'all' }),
  client('client who sees and takes copies', 'self', { ...seeing, export: 'all' }),
  client('client without rights', 'helper', none),
  client('client who sees other kinds', 'helper', {
    see: otherKinds,
    decide: otherKinds,
    approve: otherKinds,
    export: otherKinds,
  }),
  client('client who acts on other kinds', 'helper', {
    see: 'all',
    decide: otherKinds,
    approve: otherKinds,
    export: otherKinds,
  }),
  adviser('adviser, this kind shared', [paperGroup]),
  adviser('adviser, another kind shared', otherKinds),
];

/** Adds one user of each kind; answers their addresses in the order of the kinds. */
export async function addCallers(place: {
  practiceId: string;
  householdId: string;
}): Promise<string[]> {
  const emails: string[] = [];
  for (const [index, kind] of callerKinds.entries()) {
    const email = `caller${index}@matrix.example`;
    await addMember({
      ...kind,
      email,
      practiceId: place.practiceId,
      householdId: kind.role === 'owner' ? null : place.householdId,
    });
    emails.push(email);
  }
  return emails;
}
