/** Messages about a shred list: the request to approve it, and the notice of an approval made for somebody. */
import { reaches, reachOf } from '../../contract/permissions.ts';
import type { ShredList } from '../../contract/shred-lists.ts';
import { findHousehold, findPracticeName } from '../../db/repositories/household-repository.ts';
import type { StoredPaper } from '../../db/repositories/paper-repository.ts';
import type { ShredListRow } from '../../db/repositories/shred-list-repository.ts';
import { listMembers, type Member } from '../../db/repositories/user-repository.ts';
import type { Transaction } from '../../db/transaction.ts';
import type { Deps } from '../../deps.ts';
import { composeApprovalRequest } from '../../mail/approval-request.ts';
import { composeApprovedForYou } from '../../mail/approved-for-you.ts';
import { queueMail } from '../mail/queue-mail.ts';
import type { Actor } from '../papers/actor.ts';
import type { PaperDay } from '../papers/save-change.ts';

export type ListMailDeps = Pick<Deps, 'config' | 'queue'>;

/** Asks every client who may approve. */
export async function askForApproval(
  list: ShredListRow,
  papers: StoredPaper[],
  actor: Actor,
  day: PaperDay,
  deps: ListMailDeps,
  transaction: Transaction,
): Promise<void> {
  const words = await findWords(list, actor);
  for (const member of await listApprovers(actor, day)) {
    await queueMail(
      { practiceId: actor.practiceId, userId: member.user.id, address: member.user.email },
      composeApprovalRequest({
        ...words,
        ...countOf(papers),
        personName: member.user.name,
        url: urlOf(list, deps),
      }),
      deps,
      transaction,
    );
  }
}

/** Tells every client who may approve that it was done on a recorded instruction. */
export async function tellOfApproval(
  list: ShredListRow,
  approval: NonNullable<ShredList['approval']>,
  papers: StoredPaper[],
  actor: Actor,
  day: PaperDay,
  deps: ListMailDeps,
  transaction: Transaction,
): Promise<void> {
  const { instruction } = approval;
  if (!instruction) return;
  const words = await findWords(list, actor);
  for (const member of await listApprovers(actor, day)) {
    await queueMail(
      { practiceId: actor.practiceId, userId: member.user.id, address: member.user.email },
      composeApprovedForYou({
        ...words,
        ...countOf(papers),
        instruction,
        personName: member.user.name,
        approvedByName: actor.user.name,
        version: approval.version,
        notBefore: approval.notBefore,
        lapsesOn: approval.lapsesOn,
        url: urlOf(list, deps),
      }),
      deps,
      transaction,
    );
  }
}

async function listApprovers(actor: Actor, day: PaperDay): Promise<Member[]> {
  const members = await listMembers(
    { id: actor.householdId, practiceId: actor.practiceId },
    day.today,
  );
  return members.filter(
    ({ membership }) =>
      membership.role === 'client' && reaches(reachOf(membership, 'shred-list:approve')),
  );
}

async function findWords(list: ShredListRow, actor: Actor) {
  const household = await findHousehold(list.householdId);
  return {
    householdName: household?.name ?? '',
    practiceName: await findPracticeName(actor.practiceId),
    listNumber: list.number,
  };
}

function countOf(papers: StoredPaper[]) {
  return { papers: papers.length, sheets: papers.reduce((sum, paper) => sum + paper.sheets, 0) };
}

function urlOf(list: Pick<ShredListRow, 'id'>, { config }: ListMailDeps): string {
  return `${config.publicUrl}/shred-lists/${list.id}`;
}
