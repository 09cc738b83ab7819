import type { MemberRole } from '../../contract/permissions.ts';
import type { HoldRow } from '../../db/repositories/hold-repository.ts';
import type { Actor } from '../papers/actor.ts';

/** The side on which somebody stands: a hold is lifted by the side that placed it. */
function sideOf(role: MemberRole): 'practice' | 'client' | 'adviser' {
  return role === 'owner' || role === 'assistant' ? 'practice' : role;
}

/**
 * Whether an actor may lift a hold that is in force: their own side placed it, or they run the practice and
 * record the other side's agreement as the reason. An adviser lifts only what they placed themselves.
 */
export function isLiftable(
  hold: Pick<HoldRow, 'liftedOn' | 'placedBy' | 'placedByRole'>,
  actor: Pick<Actor, 'user' | 'membership'>,
): boolean {
  if (hold.liftedOn !== null) return false;
  const { role, rights } = actor.membership;
  if (role === 'owner') return true;
  if (sideOf(role) !== sideOf(hold.placedByRole)) return false;
  if (role === 'adviser') return hold.placedBy === actor.user.id;
  return role !== 'client' || rights?.decide !== 'none';
}
