/** Who acts on a household's papers, and how far their part reaches. */
import type { IsoDate } from '../../contract/dates.ts';
import type { ClassGroup } from '../../contract/document-classes.ts';
import { type Membership, type Reach, reaches } from '../../contract/permissions.ts';
import type { StoredPaper } from '../../db/repositories/paper-repository.ts';
import { ForbiddenError, NotFoundError } from '../../errors.ts';

export interface Actor {
  user: { id: string; name: string };
  membership: Membership;
  practiceId: string;
  householdId: string;
  /** The class groups that the permission of this call reaches. */
  reach: Reach;
  /** The class groups that may be seen at all. */
  seeReach: Reach;
}

/** The papers that an actor may see, as the database is asked for them. */
export function visibilityOf(
  actor: Pick<Actor, 'user' | 'seeReach'>,
  reach: Reach = actor.seeReach,
): { groups: string[] | null; userId: string } {
  return { groups: groupsOf(narrowest(actor.seeReach, reach)), userId: actor.user.id };
}

/** A reach as the database is asked for it: null stands for all groups. */
export function groupsOf(reach: Reach): string[] | null {
  if (reach === 'all') return null;
  return reach === 'none' ? [] : reach;
}

function narrowest(a: Reach, b: Reach): Reach {
  if (a === 'all') return b;
  if (b === 'all') return a;
  if (a === 'none' || b === 'none') return 'none';
  return a.filter((group) => b.includes(group));
}

/** Whether an actor may know of a paper. */
export function canSee(
  actor: Pick<Actor, 'user' | 'seeReach'>,
  paper: Pick<StoredPaper, 'classGroup' | 'eyesOnlyUserId'>,
): boolean {
  return (
    reaches(actor.seeReach, paper.classGroup) &&
    (paper.eyesOnlyUserId === null || paper.eyesOnlyUserId === actor.user.id)
  );
}

/** @throws NotFoundError when the actor may not know of the paper, or there is none */
export function requireVisible<T extends StoredPaper>(actor: Actor, paper: T | null): T {
  if (!paper || paper.householdId !== actor.householdId || !canSee(actor, paper)) {
    throw new NotFoundError('There is no such paper here.');
  }
  return paper;
}

/** @throws ForbiddenError when the right of this call does not reach papers of the group */
export function requireReach(actor: Actor, group: ClassGroup, what: string): void {
  if (reaches(actor.reach, group)) return;
  throw new ForbiddenError(
    `You may see this paper, but ${what} is not among your rights for papers of this kind. Ask the practice if it should be.`,
  );
}

/** Whether the actor works for the practice. */
export function isOfPractice(actor: Pick<Actor, 'membership'>): boolean {
  return actor.membership.role === 'owner' || actor.membership.role === 'assistant';
}

/**
 * An attorney's authority ends with the death of the person they act for; a deputy's likewise (GB: Mental Capacity
 * Act 2005, from memory).
 * @throws ForbiddenError when somebody of the household has died
 */
export function requireLivingMandate(
  actor: Pick<Actor, 'membership'>,
  people: { name: string; diedOn: IsoDate | null }[],
  today: IsoDate,
): void {
  if (!hasEndedMandate(actor, people, today)) return;
  throw new ForbiddenError(
    "An attorney's or deputy's authority ended with the death in this household. The executor or the administrator of the estate decides now.",
  );
}

/** Whether an attorney's or deputy's authority has ended with a death in the household. */
export function hasEndedMandate(
  actor: Pick<Actor, 'membership'>,
  people: { diedOn: IsoDate | null }[],
  today: IsoDate,
): boolean {
  const { standing } = actor.membership;
  if (standing !== 'attorney' && standing !== 'deputy') return false;
  return people.some((person) => person.diedOn !== null && person.diedOn <= today);
}
