/** Pages of scans and papers. */
import { Op, type Transaction } from 'sequelize';
import { PageModel, type PageRow } from '../models/page-model.ts';
import { ScanModel } from '../models/scan-model.ts';

export type { PageRow as StoredPage } from '../models/page-model.ts';

/** The pages of a paper in their order, with the words that were read. */
export async function listPagesOfPaper(
  paperId: string,
  transaction?: Transaction,
): Promise<PageRow[]> {
  const pages = await PageModel.findAll({
    where: { paperId },
    order: [
      ['position', 'ASC'],
      ['number', 'ASC'],
    ],
    transaction: transaction ?? null,
  });
  return pages.map((page) => page.get({ plain: true }));
}

/** What a screen needs of a paper's pages: no words. */
export async function listPageFrames(
  paperId: string,
): Promise<(Omit<PageRow, 'lines' | 'text'> & { scanName: string })[]> {
  const pages = await PageModel.findAll({
    where: { paperId },
    attributes: { exclude: ['lines', 'text'] },
    order: [
      ['position', 'ASC'],
      ['number', 'ASC'],
    ],
  });
  const scans = await ScanModel.findAll({
    where: { id: { [Op.in]: [...new Set(pages.map((page) => page.scanId))] } },
    attributes: ['id', 'name'],
  });
  const names = new Map(scans.map((scan) => [scan.id, scan.name]));
  return pages.map((page) => ({
    ...page.get({ plain: true }),
    scanName: names.get(page.scanId) ?? '',
  }));
}

/** The papers of a scan in the order of their first pages. */
export async function listPaperIdsOfScan(
  scanId: string,
  transaction?: Transaction,
): Promise<string[]> {
  const pages = await PageModel.findAll({
    where: { scanId, paperId: { [Op.ne]: null } },
    attributes: ['paperId'],
    order: [['number', 'ASC']],
    transaction: transaction ?? null,
  });
  return [...new Set(pages.map((page) => page.paperId).filter((id) => id !== null))];
}

/** Whether the scan shows blank backs: a blank page with an even number. */
export async function hasBlankBacks(scanId: string, transaction?: Transaction): Promise<boolean> {
  const blanks = await PageModel.findAll({
    where: { scanId, blank: true },
    attributes: ['number'],
    transaction: transaction ?? null,
  });
  return blanks.some((page) => page.number % 2 === 0);
}

/** Gives pages to a paper; their positions count from 1 in the order given. */
export async function assignPages(
  paperId: string,
  pageIds: string[],
  transaction: Transaction,
): Promise<void> {
  for (const [index, id] of pageIds.entries()) {
    await PageModel.update({ paperId, position: index + 1 }, { where: { id }, transaction });
  }
}

/** Where the first pages of papers are stored, by paper id. */
export async function listFirstPages(
  paperIds: string[],
  transaction?: Transaction,
): Promise<Map<string, { id: string; scanId: string; number: number }>> {
  if (paperIds.length === 0) return new Map();
  const pages = await PageModel.findAll({
    where: { paperId: { [Op.in]: paperIds } },
    attributes: ['id', 'paperId', 'scanId', 'number', 'position'],
    order: [
      ['position', 'DESC'],
      ['number', 'DESC'],
    ],
    transaction: transaction ?? null,
  });
  return new Map(
    pages.map((page) => [
      page.paperId ?? '',
      { id: page.id, scanId: page.scanId, number: page.number },
    ]),
  );
}

/** How sure the reader was of the letters of papers, by paper id: the mean of their printed pages. */
export async function listLegibility(
  paperIds: string[],
  transaction?: Transaction,
): Promise<Map<string, number>> {
  if (paperIds.length === 0) return new Map();
  const pages = await PageModel.findAll({
    where: { paperId: { [Op.in]: paperIds }, blank: false },
    attributes: ['paperId', 'source', 'confidence'],
    transaction: transaction ?? null,
  });
  const sums = new Map<string, { sum: number; count: number }>();
  for (const { paperId, source, confidence } of pages) {
    if (paperId === null) continue;
    const { sum, count } = sums.get(paperId) ?? { sum: 0, count: 0 };
    const own = source === 'text-layer' ? 1 : confidence;
    sums.set(paperId, { sum: sum + own, count: count + 1 });
  }
  return new Map([...sums].map(([id, { sum, count }]) => [id, sum / count]));
}
