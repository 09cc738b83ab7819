/** What shred lists and destruction records say alike. */
import { classLabel } from '../contract/document-classes.ts';
import type { ShredList, ShredRow } from '../contract/shred-lists.ts';
import { sheetGrams } from '../contract/shred-lists.ts';
import type { Cell, CellText } from './row-table.ts';
import { sayBasis, sayCount, sayDay } from './words.ts';

/** "B-03, paper 12": what finds the sheet again. */
export function sayPaper(row: Pick<ShredRow, 'boxCode' | 'paperNumber'>): string {
  return row.boxCode ? `${row.boxCode}, paper ${row.paperNumber}` : `Paper ${row.paperNumber}`;
}

/** Number, kind, description and issuer of a paper. */
export function describePaper(row: ShredRow): Cell {
  const pieces: CellText[] = [
    { text: sayPaper(row), size: 9, weight: 'strong' },
    { text: classLabel(row.class) },
  ];
  if (row.title) pieces.push({ text: row.title, size: 8 });
  if (row.issuer) pieces.push({ text: row.issuer, size: 8, ink: 'quiet' });
  return { kind: 'text', pieces };
}

/** The date that the rule gave, the rule, and a warning where its source was not checked. */
export function describeRule(row: ShredRow): Cell {
  const pieces: CellText[] = [
    {
      text: row.keepUntil ? `Keep until ${sayDay(row.keepUntil)}` : 'No keep-until date',
      weight: 'strong',
      size: 8.25,
    },
  ];
  if (row.ruleBasis) pieces.push({ text: sayBasis(row.ruleBasis), size: 7.5, ink: 'quiet' });
  if (row.rule) pieces.push({ text: row.rule, size: 7, ink: 'quiet' });
  if (row.sourceNote) pieces.push({ text: row.sourceNote, size: 7.5, ink: 'amber', mostLines: 3 });
  return { kind: 'text', pieces };
}

/** Who approved what and until when it holds; one sentence each. Empty while nobody has. */
export function describeApproval(list: ShredList): string[] {
  const { approval } = list;
  if (!approval) return [];
  const sentences = [
    `Approved by ${approval.byName} on ${sayDay(approval.on)}, version ${approval.version} of the list.`,
  ];
  if (approval.instruction) {
    const { how, on, words } = approval.instruction;
    sentences.push(
      `On the client's recorded instruction (${how.replace('-', ' ')}, ${sayDay(on)}): “${words}”`,
    );
  }
  return sentences;
}

/** Papers, sheets and grams of some rows. */
export function sumRows(rows: readonly ShredRow[]): {
  papers: number;
  sheets: number;
  grams: number;
} {
  const sheets = rows.reduce((sum, row) => sum + row.sheets, 0);
  return { papers: rows.length, sheets, grams: sheets * sheetGrams };
}

/** "12 papers, 40 sheets". */
export function saySum(sum: { papers: number; sheets: number }): string {
  return `${sayCount(sum.papers, 'paper')}, ${sayCount(sum.sheets, 'sheet')}`;
}
