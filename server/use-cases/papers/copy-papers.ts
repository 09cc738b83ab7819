/** Papers to take away as a PDF that can be searched: one, or those that a filter of the register shows. */
import type { z } from 'zod';
import { classLabel } from '../../contract/document-classes.ts';
import type { listPapersQuery, PaperRow } from '../../contract/papers.ts';
import { findHousehold } from '../../db/repositories/household-repository.ts';
import { listPagesOfPaper } from '../../db/repositories/page-repository.ts';
import { findPaper } from '../../db/repositories/paper-repository.ts';
import { findRegisterRow, listRegister } from '../../db/repositories/register-repository.ts';
import type { Deps } from '../../deps.ts';
import { ConflictError, InvalidInputError } from '../../errors.ts';
import { choosePaper } from '../../print/paper-sizes.ts';
import { type CopiedPaper, printSearchableCopy } from '../../print/searchable-copy.ts';
import { type Actor, requireReach, requireVisible, visibilityOf } from './actor.ts';
import { parseFilter, parseSort } from './list-papers.ts';

/** A file with more pages would need more memory than one request should have. */
const pageLimit = 500;

/**
 * One paper with its pages.
 * @throws NotFoundError when the caller may not know of it; ConflictError when it has no picture
 */
export async function copyPaper(
  id: string,
  actor: Actor,
  deps: Pick<Deps, 'storage'>,
): Promise<Uint8Array> {
  const paper = requireVisible(actor, await findPaper(id));
  requireReach(actor, paper.classGroup, 'taking a copy away');
  const row = await findRegisterRow(id, visibilityOf(actor));
  return printCopies(row ? [row] : [], actor, deps);
}

/**
 * The papers that a filter shows, with an index in front.
 * @throws InvalidInputError when they have more pages than one file can hold
 */
export async function copyPapers(
  query: z.infer<typeof listPapersQuery>,
  actor: Actor,
  deps: Pick<Deps, 'storage'>,
): Promise<Uint8Array> {
  const { rows } = await listRegister(
    actor.householdId,
    visibilityOf(actor, actor.reach),
    parseFilter(query),
    { offset: 0, limit: pageLimit + 1, ...parseSort(query.sort) },
  );
  return printCopies(rows, actor, deps);
}

async function printCopies(
  rows: PaperRow[],
  actor: Actor,
  { storage }: Pick<Deps, 'storage'>,
): Promise<Uint8Array> {
  const papers: CopiedPaper[] = [];
  let count = 0;
  for (const row of rows) {
    const pages: CopiedPaper['pages'][number][] = [];
    for (const page of await listPagesOfPaper(row.id)) {
      const picture = await storage.readPicture(row.householdId, page.scanId, page.number, 'image');
      if (picture) pages.push({ picture, lines: page.lines });
    }
    count += pages.length;
    if (count > pageLimit) {
      throw new InvalidInputError([
        {
          field: 'page',
          message: `One file holds at most ${String(pageLimit)} pages. Choose one box or one kind of paper, and save the rest as further files.`,
        },
      ]);
    }
    if (pages.length > 0) papers.push({ name: nameOf(row), pages });
  }
  if (count === 0) {
    throw new ConflictError('None of these papers has a picture, so there is nothing to save.');
  }
  const household = await findHousehold(actor.householdId);
  return printSearchableCopy({
    title: papers.length === 1 ? (papers[0]?.name ?? '') : `${household?.name ?? ''}: papers`,
    paper: choosePaper(household?.country ?? 'GB'),
    papers,
  });
}

function nameOf(row: PaperRow): string {
  const parts = [row.title ?? classLabel(row.class), row.issuer, row.paperOn, row.boxCode];
  return `No. ${String(row.number)} · ${parts.filter(Boolean).join(' · ')}`;
}
