/** The printed list and the printed record. */
import { findHousehold, findPracticeName } from '../../db/repositories/household-repository.ts';
import { listFirstPages } from '../../db/repositories/page-repository.ts';
import type { Deps } from '../../deps.ts';
import { ConflictError } from '../../errors.ts';
import { printDestructionRecord } from '../../print/destruction-record.ts';
import { choosePaper } from '../../print/paper-sizes.ts';
import { printShredList } from '../../print/shred-list.ts';
import type { Actor } from '../papers/actor.ts';
import type { PaperDay } from '../papers/save-change.ts';
import { getShredList } from './view-list.ts';

/** The list to approve and to work from, with a small picture of each paper. */
export async function printListOf(
  id: string,
  actor: Actor,
  day: PaperDay,
  { storage }: Pick<Deps, 'storage'>,
): Promise<Uint8Array> {
  const list = await getShredList(id, actor, day);
  const places = await listFirstPages(list.rows.map((row) => row.paper));
  const pictures = new Map<string, Uint8Array>();
  for (const { id: pageId, scanId, number } of places.values()) {
    const picture = await storage.readPicture(list.householdId, scanId, number, 'thumbnail');
    if (picture) pictures.set(pageId, picture);
  }
  return printShredList({ list, pictures, ...(await findHeading(actor)) });
}

/** @throws ConflictError when the list was not carried out yet */
export async function printRecordOf(id: string, actor: Actor, day: PaperDay): Promise<Uint8Array> {
  const list = await getShredList(id, actor, day);
  if (!list.destruction) {
    throw new ConflictError(
      'Nothing was shredded from this list yet. Record the destruction first.',
    );
  }
  return printDestructionRecord({ list, ...(await findHeading(actor)) });
}

async function findHeading(actor: Actor) {
  const household = await findHousehold(actor.householdId);
  return {
    householdName: household?.name ?? '',
    practiceName: await findPracticeName(actor.practiceId),
    paper: choosePaper(household?.country ?? 'GB'),
  };
}
