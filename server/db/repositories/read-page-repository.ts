/** Pages as the reader writes them, one row at a time, so that reading resumes by page. */
import type { Transaction } from 'sequelize';
import { PageModel, type PageRow } from '../models/page-model.ts';

/** Adds a page; does nothing when another worker was faster. */
export async function insertReadPage(
  values: Omit<PageRow, 'id' | 'readAt' | 'paperId' | 'position'>,
): Promise<void> {
  await PageModel.bulkCreate([values], { ignoreDuplicates: true });
}

/** Numbers of the pages of a scan that are there already. */
export async function listReadPageNumbers(scanId: string): Promise<number[]> {
  const rows = await PageModel.findAll({
    where: { scanId },
    attributes: ['number'],
    order: ['number'],
  });
  return rows.map((row) => row.number);
}

/** All pages of a scan with their text, in order. */
export async function listScanPages(scanId: string, transaction: Transaction): Promise<PageRow[]> {
  const rows = await PageModel.findAll({ where: { scanId }, order: ['number'], transaction });
  return rows.map((row) => row.get({ plain: true }));
}
