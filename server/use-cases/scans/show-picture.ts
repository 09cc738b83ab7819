import type { Reach } from '../../contract/permissions.ts';
import { reaches } from '../../contract/permissions.ts';
import { findPagePlace } from '../../db/repositories/picture-repository.ts';
import type { Deps } from '../../deps.ts';
import { NotFoundError } from '../../errors.ts';
import type { PictureKind } from '../../storage/scan-storage.ts';

/**
 * The picture of a page, for somebody who may see the paper that it belongs to.
 * @throws NotFoundError when there is none, or none for this person
 */
export async function showPicture(
  pageId: string,
  kind: PictureKind,
  viewer: { userId: string; seeReach: Reach },
  { storage }: Pick<Deps, 'storage'>,
): Promise<Buffer> {
  const place = await findPagePlace(pageId);
  if (!place) throw new NotFoundError();
  const isHidden = place.eyesOnlyUserId !== null && place.eyesOnlyUserId !== viewer.userId;
  // A page of no paper has no group yet: only those who see everything may see it.
  const isReached = place.classGroup
    ? reaches(viewer.seeReach, place.classGroup)
    : viewer.seeReach === 'all';
  if (isHidden || !isReached) throw new NotFoundError();
  const picture = await storage.readPicture(place.householdId, place.scanId, place.number, kind);
  if (!picture)
    throw new NotFoundError('The picture of this page is missing. Read the scan again.');
  return picture;
}
