/** A shred list as a caller may see it: rows of papers that are not theirs to see are left out, counts included. */
import type { SecurityLevel } from '../../contract/assessments.ts';
import { reaches, reachOf } from '../../contract/permissions.ts';
import { sheetGrams, type ShredList, type ShredRow } from '../../contract/shred-lists.ts';
import { findHousehold } from '../../db/repositories/household-repository.ts';
import { listFirstPages } from '../../db/repositories/page-repository.ts';
import { listPapersByIds, type StoredPaper } from '../../db/repositories/paper-repository.ts';
import { listBoxCodes } from '../../db/repositories/box-repository.ts';
import {
  findShredList,
  listRows,
  listShredLists as listListRows,
  type ShredListRow,
  type ShredRowRow,
} from '../../db/repositories/shred-list-repository.ts';
import { NotFoundError } from '../../errors.ts';
import { gatherCautions } from '../../print/cautions.ts';
import { type AssessContext, findDecidingRule, loadAssessContext } from '../assess-paper.ts';
import { type Actor, canSee, hasEndedMandate } from '../papers/actor.ts';
import { askGate } from '../papers/gate-paper.ts';
import type { PaperDay } from '../papers/save-change.ts';
import { findChanges } from './approved-rows.ts';

/** @throws NotFoundError */
export async function getShredList(id: string, actor: Actor, day: PaperDay): Promise<ShredList> {
  const list = await findShredList(id);
  if (!list || list.householdId !== actor.householdId) throw new NotFoundError();
  return viewList(list, actor, day);
}

/** Lists of a household, newest first, with the counts of what the actor may see. */
export async function listShredLists(actor: Actor, day: PaperDay) {
  const items = [];
  for (const list of await listListRows(actor.householdId)) {
    const view = await viewList(list, actor, day);
    if (actor.seeReach !== 'all' && view.rows.length === 0) continue;
    items.push({
      id: view.id,
      number: view.number,
      status: view.status,
      version: view.version,
      on: view.on,
      sheets: view.sheets,
      weightGrams: view.weightGrams,
      createdAt: view.createdAt,
      papers: view.rows.length,
    });
  }
  return { items, total: items.length };
}

export async function viewList(
  list: ShredListRow,
  actor: Actor,
  day: PaperDay,
): Promise<ShredList> {
  const household = await findHousehold(list.householdId);
  const { rows, cautions } = await viewRows(list, actor, day);
  const leaving = rows.filter((row) => !row.keptBack && row.outcome !== 'kept-back');
  const sheets = leaving.reduce((sum, row) => sum + row.sheets, 0);
  const hidden = await hiddenPaperIds(list, actor);
  return {
    id: list.id,
    householdId: list.householdId,
    householdName: household?.name ?? '',
    number: list.number,
    status: list.status,
    version: list.version,
    on: list.on,
    rows,
    leftOut: list.leftOut.filter((entry) => !hidden.has(entry.paper)),
    sheets,
    weightGrams: sheets * sheetGrams,
    securityLevel: highestLevel(leaving),
    cautions,
    createdAt: list.createdAt.toISOString(),
    sentAt: list.sentAt?.toISOString() ?? null,
    approval: list.approval,
    destruction: list.destruction,
    can: decideCan(list, rows, actor, hasEndedMandate(actor, household?.people ?? [], day.today)),
  };
}

async function viewRows(list: ShredListRow, actor: Actor, day: PaperDay) {
  const stored = await listRows(list.id);
  const papers = new Map(
    (await listPapersByIds(stored.map((row) => row.paperId))).map((paper) => [paper.id, paper]),
  );
  const firstPages = await listFirstPages([...papers.keys()]);
  const boxCodes = await listBoxCodes(list.householdId);
  const context = await loadAssessContext(list.householdId, day);
  const isOver = list.status === 'done' || list.status === 'void';
  const own = new Set<string>();
  const rows = stored.flatMap((row): ShredRow[] => {
    const paper = papers.get(row.paperId);
    if (!paper || !canSee(actor, paper)) return [];
    paper.assessment.cautions.forEach((caution) => own.add(caution));
    const firstPageId = firstPages.get(paper.id)?.id ?? null;
    // What was decided stays as it was printed.
    if (isOver && row.snapshot) return [{ ...row.snapshot, position: row.position, firstPageId }];
    return [
      {
        ...describeRow(row, paper, boxCodes.get(paper.boxId ?? '') ?? null),
        firstPageId,
        blocked:
          isOver || row.keptBack
            ? []
            : [...blockedNow(paper, list, context, day), ...findChanges(row, paper)],
      },
    ];
  });
  return { rows, cautions: gatherCautions([...own]) };
}

/** Why the gate would refuse the paper on the list's day, or today when that is later. */
function blockedNow(
  paper: StoredPaper,
  list: ShredListRow,
  context: AssessContext,
  day: PaperDay,
): ShredRow['blocked'] {
  const on = list.on > day.today ? list.on : day.today;
  return askGate(paper, context, { how: 'shred', on, today: null }).reasons;
}

/** A row from the paper as it is now. */
export function describeRow(
  row: Pick<ShredRowRow, 'position' | 'keptBack' | 'keptBackReason' | 'outcome'>,
  paper: StoredPaper,
  boxCode: string | null,
): Omit<ShredRow, 'firstPageId' | 'blocked'> {
  const rule = findDecidingRule(paper.assessment);
  return {
    paper: paper.id,
    position: row.position,
    boxCode,
    paperNumber: paper.number,
    class: paper.class,
    title: paper.title,
    issuer: paper.issuer,
    paperOn: paper.paperOn,
    rule: rule?.id ?? null,
    ruleBasis: rule?.basis ?? null,
    sourceNote: sourceNotes[rule?.source.status ?? 'read'] ?? null,
    keepUntil: paper.keepUntil,
    securityLevel: paper.assessment.securityLevel,
    sheets: paper.sheets,
    keptBack: row.keptBack,
    keptBackReason: row.keptBackReason,
    outcome: row.outcome,
  };
}

const sourceNotes: Record<string, string | null> = {
  read: null,
  secondary: 'checked in a copy or summary',
  memory: 'not checked at the source',
};

function highestLevel(rows: Pick<ShredRow, 'securityLevel'>[]): SecurityLevel | null {
  const levels = rows.flatMap((row) => row.securityLevel ?? []).sort();
  return levels.at(-1) ?? null;
}

async function hiddenPaperIds(list: ShredListRow, actor: Actor): Promise<Set<string>> {
  const papers = await listPapersByIds(list.leftOut.map((entry) => entry.paper));
  const visible = new Set(papers.filter((paper) => canSee(actor, paper)).map((paper) => paper.id));
  return new Set(list.leftOut.map((entry) => entry.paper).filter((id) => !visible.has(id)));
}

function decideCan(
  list: ShredListRow,
  rows: ShredRow[],
  actor: Actor,
  hasNoMandate: boolean,
): ShredList['can'] {
  const may = (permission: Parameters<typeof reachOf>[1]) =>
    reaches(reachOf(actor.membership, permission));
  const isFilled = rows.some((row) => !row.keptBack);
  const isOpen = list.status === 'draft' || list.status === 'sent';
  return {
    send: list.status === 'draft' && isFilled && may('shred-list:prepare'),
    approve: isOpen && isFilled && !hasNoMandate && may('shred-list:approve'),
    carryOut: list.status === 'approved' && !hasNoMandate && may('shred-list:carry-out'),
    void: (isOpen || list.status === 'approved') && may('shred-list:prepare'),
  };
}
