/** One paper as its screen shows it to a caller. */
import type { Hold } from '../../contract/holds.ts';
import type { Paper } from '../../contract/papers.ts';
import { namesOf } from '../../db/repositories/event-repository.ts';
import { findLastChange } from '../../db/repositories/paper-change-repository.ts';
import {
  findPaper,
  listPapersByIds,
  type StoredPaper,
} from '../../db/repositories/paper-repository.ts';
import { listPageFrames, listPaperIdsOfScan } from '../../db/repositories/page-repository.ts';
import { findRegisterRow } from '../../db/repositories/register-repository.ts';
import type { HoldRow } from '../../db/repositories/hold-repository.ts';
import { NotFoundError } from '../../errors.ts';
import { type AssessDay, holdsOfPaper, loadAssessContext } from '../assess-paper.ts';
import { isLiftable } from '../holds/liftable.ts';
import { type Actor, canSee, isOfPractice, requireVisible, visibilityOf } from './actor.ts';
import { askGate, departureOfPile } from './gate-paper.ts';
import { canTakeBack } from './snapshot.ts';

/** @throws NotFoundError when there is no such paper for the caller */
export async function getPaper(id: string, actor: Actor, day: AssessDay): Promise<Paper> {
  return viewPaper(requireVisible(actor, await findPaper(id)), actor, day);
}

/** The full view of a stored paper. */
export async function viewPaper(paper: StoredPaper, actor: Actor, day: AssessDay): Promise<Paper> {
  const row = await findRegisterRow(paper.id, visibilityOf(actor));
  if (!row) throw new NotFoundError('There is no such paper here.');
  const { snippet: _snippet, ...line } = row;
  const context = await loadAssessContext(paper.householdId, day);
  const holds = holdsOfPaper(paper.id, context).filter((hold) => hold.liftedOn === null);
  const names = await namesOf([paper.reviewedBy, ...holds.map((hold) => hold.placedBy)]);
  const gate = askGate(paper, context, {
    how: departureOfPile(paper.pile),
    on: day.today,
    today: day.today,
  });
  return {
    ...line,
    pages: await viewPages(paper.id),
    text: paper.text,
    facts: paper.facts,
    read: paper.read,
    candidates: paper.candidates,
    answers: paper.answers,
    assessment: paper.assessment,
    ruleSetVersion: paper.ruleSetVersion,
    assessedOn: paper.assessedOn,
    holds: holds.map((hold) => viewPaperHold(hold, names, actor)),
    note: paper.note,
    practiceNote: isOfPractice(actor) ? paper.practiceNote : null,
    bundleFrom: paper.bundleFrom,
    bundleTo: paper.bundleTo,
    reviewedByName: paper.reviewedBy ? (names.get(paper.reviewedBy) ?? null) : null,
    steppedDown: paper.steppedDown && {
      on: paper.steppedDown.on,
      byName: paper.steppedDown.byName,
      reason: paper.steppedDown.reason,
    },
    gate: gate.reasons,
    ...(await findNeighbours(paper, actor)),
    likelyCopyOf: await findCopy(paper, actor),
    canUndo: paper.status !== 'left' && canTakeBack(await findLastChange(paper.id)),
  };
}

async function viewPages(paperId: string): Promise<Paper['pages']> {
  const pages = await listPageFrames(paperId);
  return pages.map((page, index) => ({
    id: page.id,
    number: index + 1,
    scanId: page.scanId,
    scanName: page.scanName,
    scanPage: page.number,
    width: page.width,
    height: page.height,
    blank: page.blank,
  }));
}

function viewPaperHold(
  hold: HoldRow,
  names: Map<string, string>,
  actor: Actor,
): Paper['holds'][number] {
  const kind: Hold['kind'] = hold.kind;
  return {
    id: hold.id,
    scope: hold.paperId === null ? 'household' : 'paper',
    reason: hold.reason,
    kind,
    placedOn: hold.placedOn,
    placedByName: names.get(hold.placedBy) ?? 'Somebody',
    liftable: isLiftable(hold, actor),
  };
}

/** The papers before and after it in its scan, those the caller may see. */
async function findNeighbours(
  paper: StoredPaper,
  actor: Actor,
): Promise<Pick<Paper, 'previousInScan' | 'nextInScan'>> {
  if (!paper.scanId) return { previousInScan: null, nextInScan: null };
  const ids = await listPaperIdsOfScan(paper.scanId);
  const index = ids.indexOf(paper.id);
  const near = index < 0 ? [] : [ids[index - 1], ids[index + 1]];
  const visible = await listVisible(
    near.filter((id) => id !== undefined),
    actor,
  );
  const pick = (id: string | undefined) => (id && visible.has(id) ? id : null);
  return { previousInScan: pick(near[0]), nextInScan: pick(near[1]) };
}

async function findCopy(paper: StoredPaper, actor: Actor): Promise<Paper['likelyCopyOf']> {
  if (!paper.likelyCopyOf) return null;
  const copy = (await listVisible([paper.likelyCopyOf], actor)).get(paper.likelyCopyOf);
  return copy ? { id: copy.id, number: copy.number, class: copy.class } : null;
}

async function listVisible(ids: string[], actor: Actor): Promise<Map<string, StoredPaper>> {
  const papers = await listPapersByIds(ids);
  return new Map(papers.filter((p) => canSee(actor, p)).map((p) => [p.id, p]));
}
