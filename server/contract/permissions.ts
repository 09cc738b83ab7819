/**
 * Who may do what: one table, enforced by the server and read by the client to hide what would be refused.
 * A membership ties a user to a practice (owner) or to one household (assistant, client, adviser).
 */
import { z } from 'zod';
import { isoDateSchema } from './dates.ts';
import { classGroups, type ClassGroup } from './document-classes.ts';

export const memberRoles = ['owner', 'assistant', 'client', 'adviser'] as const;
export const memberRoleSchema = z.enum(memberRoles);
export type MemberRole = z.infer<typeof memberRoleSchema>;

/** What a client is to the household. */
export const standings = [
  'self',
  'joint-owner',
  'attorney',
  'deputy',
  'executor',
  'helper',
] as const;
export const standingSchema = z.enum(standings);
export type Standing = z.infer<typeof standingSchema>;

export const rightNames = ['see', 'decide', 'approve', 'export'] as const;
export type RightName = (typeof rightNames)[number];
/** A right holds for all class groups, for none, or for those listed. */
export const reachSchema = z.union([
  z.literal('all'),
  z.literal('none'),
  z.array(z.enum(classGroups)),
]);
export type Reach = z.infer<typeof reachSchema>;
export const rightsSchema = z.object({
  see: reachSchema,
  decide: reachSchema,
  approve: reachSchema,
  export: reachSchema,
});
export type Rights = z.infer<typeof rightsSchema>;

export const membershipSchema = z.object({
  id: z.uuid(),
  role: memberRoleSchema,
  practiceId: z.uuid(),
  practiceName: z.string(),
  householdId: z.uuid().nullable(),
  householdName: z.string().nullable(),
  standing: standingSchema.nullable(),
  /** Clients only. */
  rights: rightsSchema.nullable(),
  /** Advisers only: the class groups shared with them. */
  sharedGroups: reachSchema.nullable(),
  startsOn: isoDateSchema,
  endsOn: isoDateSchema.nullable(),
});
export type Membership = z.infer<typeof membershipSchema>;

/** How far a role reaches: everything, or as far as a client's right or an adviser's shared groups go. */
type Grant = 'all' | RightName | 'shared';
type PermissionRow = Partial<Record<MemberRole, Grant>>;

export const permissionTable = {
  'practice:read': { owner: 'all' },
  'members:manage': { owner: 'all' },
  'mail:read': { owner: 'all' },
  'household:create': { owner: 'all' },
  'household:read': { owner: 'all', assistant: 'all', client: 'see', adviser: 'shared' },
  'household:update': { owner: 'all', assistant: 'all' },
  'box:read': { owner: 'all', assistant: 'all', client: 'see' },
  'box:write': { owner: 'all', assistant: 'all' },
  'scan:read': { owner: 'all', assistant: 'all', client: 'see' },
  'scan:upload': { owner: 'all', assistant: 'all', client: 'decide' },
  'paper:read': { owner: 'all', assistant: 'all', client: 'see', adviser: 'shared' },
  'paper:enter': { owner: 'all', assistant: 'all', client: 'decide' },
  'paper:review': { owner: 'all', assistant: 'all', client: 'decide' },
  'paper:depart': { owner: 'all', client: 'approve' },
  'paper:step-down': { owner: 'all', client: 'approve' },
  'paper:export': { owner: 'all', assistant: 'all', client: 'export' },
  'hold:read': { owner: 'all', assistant: 'all', client: 'see', adviser: 'shared' },
  'hold:place': { owner: 'all', assistant: 'all', client: 'see', adviser: 'shared' },
  'hold:lift': { owner: 'all', assistant: 'all', client: 'decide', adviser: 'shared' },
  'subject:read': { owner: 'all', assistant: 'all', client: 'see', adviser: 'shared' },
  'subject:write': { owner: 'all', assistant: 'all', client: 'decide' },
  'shred-list:read': { owner: 'all', assistant: 'all', client: 'see', adviser: 'shared' },
  'shred-list:prepare': { owner: 'all', assistant: 'all' },
  'shred-list:approve': { owner: 'all', client: 'approve' },
  'shred-list:carry-out': { owner: 'all', assistant: 'all', client: 'approve' },
  'reminder:read': { owner: 'all', assistant: 'all', client: 'see' },
  'reminder:manage': { owner: 'all', client: 'decide' },
  'activity:read': { owner: 'all', assistant: 'all', client: 'see' },
  'calendar:read': { owner: 'all', client: 'see' },
} as const satisfies Record<string, PermissionRow>;

export type Permission = keyof typeof permissionTable;
export const permissions = Object.keys(permissionTable) as Permission[];

/** The class groups a membership's permission reaches; `none` when it has not got it. */
export function reachOf(
  membership: Pick<Membership, 'role' | 'rights' | 'sharedGroups'>,
  permission: Permission,
): Reach {
  const row: PermissionRow = permissionTable[permission];
  const grant = row[membership.role];
  if (!grant) return 'none';
  if (grant === 'all') return 'all';
  if (grant === 'shared') return membership.sharedGroups ?? 'none';
  return membership.rights?.[grant] ?? 'none';
}

/** Whether a reach covers a class group; without a group, whether it covers anything at all. */
export function reaches(reach: Reach, group?: ClassGroup): boolean {
  if (reach === 'all') return true;
  if (reach === 'none') return false;
  return group === undefined ? reach.length > 0 : reach.includes(group);
}

/** Classes whose destruction an attorney, a deputy or an executor never approves. */
export const neverApprovedByDelegates = [
  'will',
  'property-deed',
  'power-of-attorney',
  'trust-deed',
] as const;
export const delegateStandings: readonly Standing[] = ['attorney', 'deputy', 'executor'];
