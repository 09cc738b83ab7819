/** Areas and boxes, and the label that goes on a box. */
import type { z } from 'zod';
import type { BoxRecord, createBoxSchema } from '../../contract/boxes.ts';
import {
  type CountedBox,
  findArea,
  findAreaByName,
  findBox,
  insertArea,
  insertBox,
  listAreas as listAreaRows,
  listBoxes as listBoxRows,
} from '../../db/repositories/box-repository.ts';
import { appendEvent } from '../../db/repositories/event-repository.ts';
import {
  findHousehold,
  findPracticeName,
  takeNumbers,
} from '../../db/repositories/household-repository.ts';
import { inTransaction } from '../../db/transaction.ts';
import type { Deps } from '../../deps.ts';
import { InvalidInputError, NotFoundError } from '../../errors.ts';
import { printBoxLabel } from '../../print/box-label.ts';
import { choosePaper, type PaperName } from '../../print/paper-sizes.ts';
import { printSeparatorSheet } from '../../print/separator-sheet.ts';
import { type Actor, visibilityOf } from '../papers/actor.ts';

interface By {
  userId: string;
  practiceId: string;
  householdId: string;
}

/** Who looks, and how far that person sees: the papers that are counted. */
export type BoxViewer = Pick<Actor, 'user' | 'seeReach'>;

export async function listAreas(householdId: string) {
  const items = await listAreaRows(householdId);
  return { items, total: items.length };
}

/** @throws NotFoundError */
export async function getBox(id: string, viewer: BoxViewer): Promise<BoxRecord> {
  const box = await findBox(id, visibilityOf(viewer));
  if (!box) throw new NotFoundError();
  return viewBox(box);
}

export async function listBoxes(
  householdId: string,
  viewer: BoxViewer,
  page: { page: number; pageSize: number; sort?: string | undefined },
): Promise<{ items: BoxRecord[]; total: number }> {
  const { rows, total } = await listBoxRows(householdId, visibilityOf(viewer), {
    offset: (page.page - 1) * page.pageSize,
    limit: page.pageSize,
    descending: page.sort?.startsWith('-') ?? false,
  });
  return { items: rows.map(viewBox), total };
}

/** Adds a box; its code is the next number of the household, for example B-03. */
export async function createBox(
  input: z.infer<typeof createBoxSchema>,
  by: By,
  { clock }: Pick<Deps, 'clock'>,
): Promise<BoxRecord> {
  if (input.areaId && !(await findArea(by.householdId, input.areaId))) {
    throw new InvalidInputError([
      { field: 'areaId', message: 'This area is not one of the household.' },
    ]);
  }
  const id = await inTransaction(async (transaction) => {
    const number = await takeNumbers(by.householdId, 'nextBoxNumber', 1, transaction);
    const code = `B-${String(number).padStart(2, '0')}`;
    const boxId = await insertBox(
      { householdId: by.householdId, areaId: input.areaId, code, label: input.label },
      transaction,
    );
    await appendEvent(
      { ...by, at: clock.now(), action: 'box.created', sentence: `Added box ${code}.` },
      transaction,
    );
    return boxId;
  });
  return getBox(id, { user: { id: by.userId, name: '' }, seeReach: 'all' });
}

export async function createArea(name: string, by: By, { clock }: Pick<Deps, 'clock'>) {
  if (await findAreaByName(by.householdId, name)) {
    throw new InvalidInputError([
      { field: 'name', message: 'There is an area of this name already. Choose another name.' },
    ]);
  }
  return inTransaction(async (transaction) => {
    const area = await insertArea(by.householdId, name, transaction);
    await appendEvent(
      { ...by, at: clock.now(), action: 'area.created', sentence: `Added the area "${name}".` },
      transaction,
    );
    return { id: area.id, name: area.name, boxes: 0 };
  });
}

/** The label of a box as a PDF; its QR code opens the box on a phone. */
export async function printLabelOf(
  boxId: string,
  viewer: BoxViewer,
  publicUrl: string,
): Promise<Uint8Array> {
  const box = await getBox(boxId, viewer);
  const household = await findHousehold(box.householdId);
  if (!household) throw new NotFoundError();
  return printBoxLabel({
    householdName: household.name,
    practiceName: await findPracticeName(household.practiceId),
    code: box.code,
    label: box.label,
    areaName: box.areaName,
    url: `${publicUrl}/boxes/${box.id}`,
    paper: choosePaper(household.country),
  });
}

/** A sheet to lay between papers; on the paper that printers of the household's country hold, or as asked. */
export async function printSeparatorOf(
  householdId: string,
  paper: PaperName | undefined,
): Promise<Uint8Array> {
  const household = await findHousehold(householdId);
  if (!household) throw new NotFoundError();
  return printSeparatorSheet({ paper: paper ?? choosePaper(household.country) });
}

function viewBox(box: CountedBox): BoxRecord {
  return {
    id: box.id,
    householdId: box.householdId,
    householdName: box.householdName,
    areaId: box.areaId,
    areaName: box.areaName,
    code: box.code,
    label: box.label,
    version: box.version,
    createdAt: new Date(box.createdAt).toISOString(),
    counts: {
      scans: box.scans,
      reading: box.reading,
      failed: box.failed,
      pages: box.pages,
      papers: box.papers,
      toReview: box.toReview,
    },
  };
}
