/** Who calls: the signed-in person with the memberships that are in force today. */
import type { Request } from 'express';
import type { Membership, Permission, Reach } from '../contract/permissions.ts';
import { reaches, reachOf } from '../contract/permissions.ts';
import type { User } from '../contract/sessions.ts';
import { ForbiddenError, NotFoundError, SignInNeededError } from '../errors.ts';

export interface Caller {
  user: User;
  memberships: Membership[];
}

/** A caller's standing towards one household, as far as one permission goes. */
export interface Access {
  user: User;
  membership: Membership;
  practiceId: string;
  householdId: string;
  /** The class groups that the permission of this call reaches. */
  reach: Reach;
  /** The class groups that the caller may see at all. */
  seeReach: Reach;
}

declare module 'express-serve-static-core' {
  interface Request {
    caller?: Caller | undefined;
  }
}

/** @throws SignInNeededError when nobody is signed in */
export function requireCaller(request: Request): Caller {
  if (!request.caller) throw new SignInNeededError();
  return request.caller;
}

/**
 * The caller's access to a household.
 * @throws NotFoundError when the caller does not belong to it (nobody learns that it exists)
 * @throws ForbiddenError when a membership is there but does not grant the permission
 */
export function requireAccess(
  caller: Caller,
  household: { id: string; practiceId: string },
  permission: Permission,
): Access {
  const memberships = caller.memberships.filter(
    (m) =>
      m.practiceId === household.practiceId &&
      (m.householdId === household.id || (m.role === 'owner' && m.householdId === null)),
  );
  if (memberships.length === 0) throw new NotFoundError();
  const granting = memberships.find((m) => reaches(reachOf(m, permission)));
  if (!granting) {
    throw new ForbiddenError(
      'Your part in this household does not include this. Ask the practice if it should.',
    );
  }
  return {
    user: caller.user,
    membership: granting,
    practiceId: household.practiceId,
    householdId: household.id,
    reach: reachOf(granting, permission),
    seeReach: reachOf(granting, 'paper:read'),
  };
}

/**
 * The caller's membership that grants a permission of the practice itself.
 * @throws ForbiddenError when none does
 */
export function requirePracticeAccess(caller: Caller, permission: Permission): Membership {
  const granting = caller.memberships.find(
    (m) => m.householdId === null && reaches(reachOf(m, permission)),
  );
  if (!granting) throw new ForbiddenError('Only the owner of the practice can do this.');
  return granting;
}
