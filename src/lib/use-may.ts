import type { ClassGroup } from '../../server/contract/document-classes.ts';
import { reaches, reachOf } from '../../server/contract/permissions.ts';
import type { Membership, Permission } from '../../server/contract/permissions.ts';
import { useSession } from './session.ts';

/**
 * Whether these memberships grant a permission. With a household: by a membership of that household, or
 * of the practice that serves it; without one: by any membership.
 */
export function decideMay(
  memberships: readonly Membership[],
  permission: Permission,
  householdId?: string | null,
  group?: ClassGroup,
): boolean {
  const own = memberships.filter((m) => m.householdId === householdId);
  const practices = new Set(own.map((m) => m.practiceId));
  const asked = householdId
    ? memberships.filter(
        (m) =>
          m.householdId === householdId ||
          (m.householdId === null && (own.length === 0 || practices.has(m.practiceId))),
      )
    : memberships;
  return asked.some((m) => reaches(reachOf(m, permission), group));
}

/** Whether the person who is signed in may do this: what would be refused is not offered. */
export function useMay(
  permission: Permission,
  householdId?: string | null,
  group?: ClassGroup,
): boolean {
  const session = useSession();
  return decideMay(session?.memberships ?? [], permission, householdId, group);
}
