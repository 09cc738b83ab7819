/** A household with one of each thing that a call can be about. */
import sharp from 'sharp';
import type { BoxRecord } from '../../../server/contract/boxes.ts';
import type { Invitation } from '../../../server/contract/accounts.ts';
import type { Hold } from '../../../server/contract/holds.ts';
import type { Household } from '../../../server/contract/households.ts';
import type { Paper } from '../../../server/contract/papers.ts';
import type { ShredList } from '../../../server/contract/shred-lists.ts';
import type { Subject } from '../../../server/contract/subjects.ts';
import type { TestApp, Visitor } from '../app.ts';
import { addScannedPapers, change, enterOldBill, gather } from '../papers.ts';
import { addMember } from '../people.ts';
import { MembershipModel } from '../../../server/db/models/membership-model.ts';

export interface World {
  household: Household;
  box: BoxRecord;
  /** A scanned bill of two pages, read and looked at. */
  paper: Paper;
  /** The bill after it in the same scan. */
  next: Paper;
  hold: Hold;
  subject: Subject;
  list: ShredList;
  invitation: Invitation;
  membershipId: string;
}

/** Made by the owner through HTTP, so that every part is as people make it. */
export async function makeWorld(
  app: TestApp,
  owner: Visitor,
  place: { practiceId: string; householdId: string },
): Promise<World> {
  const house = `/api/households/${place.householdId}`;
  const post = async <T>(url: string, body: object): Promise<T> => {
    const answer = await owner.post(url, body);
    if (answer.status !== 201) throw new Error(`${url}: ${answer.text}`);
    return answer.body as T;
  };
  const read = async <T>(url: string) => (await owner.get(url)).body as T;
  const [paperId = '', nextId = ''] = await addScannedPapers(app, place.householdId, [
    ['Gas bill of 2010', 'Its second page'],
    ['Water bill of 2010'],
  ]);
  const subject = await post<Subject>(`${house}/subjects`, { kind: 'account', name: 'Gas' });
  const looked = await change(owner, await read<Paper>(`/api/papers/${paperId}`), {
    pile: 'file-here',
    subjectId: subject.id,
  });
  const bytes = await sharp({
    create: { width: 300, height: 400, channels: 3, background: 'white' },
  })
    .jpeg()
    .toBuffer();
  for (const { scanId, scanPage } of looked.pages) {
    for (const kind of ['image', 'thumbnail'] as const) {
      await app.deps.storage.writePicture(place.householdId, scanId, scanPage, kind, bytes);
    }
  }
  const bill = await enterOldBill(owner, place.householdId);
  const list = await gather(owner, place.householdId, { on: '2026-11-07', papers: [bill.id] });
  const hold = await post<Hold>(`${house}/holds`, {
    paperId,
    kind: 'wish',
    reason: 'Somebody asked for it',
  });
  const invitation = await post<Invitation>(`${house}/invitations`, {
    email: 'newcomer@matrix.example',
    name: 'Newcomer',
    role: 'assistant',
  });
  const userId = await addMember({
    role: 'assistant',
    email: `member-of-${place.householdId}@matrix.example`,
    ...place,
  });
  const membership = await MembershipModel.findOne({ where: { userId } });
  return {
    household: await read<Household>(house),
    box: await read<BoxRecord>(`/api/boxes/${looked.boxId}`),
    paper: await read<Paper>(`/api/papers/${paperId}`),
    next: await read<Paper>(`/api/papers/${nextId}`),
    hold,
    subject: (await read<{ items: Subject[] }>(`${house}/subjects`)).items[0] ?? subject,
    list,
    invitation,
    membershipId: membership?.id ?? '',
  };
}
