/** A table that goes on over as many sheets as it needs, its heading repeated on each. */
import { wrapText } from './fit-text.ts';
import type { Ink } from './inks.ts';
import type { Printout } from './printout.ts';
import type { Weight } from './typeface.ts';

export interface Column {
  heading: string;
  width: number;
  align?: 'left' | 'middle' | 'right';
}

/** A piece of text in a cell; pieces stand below each other. */
export interface CellText {
  text: string;
  size?: number;
  weight?: Weight;
  ink?: Ink;
  /** What does not fit in so many lines is cut; 2 is usual. */
  mostLines?: number;
}

export type Cell =
  | { kind: 'text'; pieces: CellText[] }
  /** Something drawn into the cell from its upper left corner. */
  | { kind: 'drawing'; height: number; draw: (x: number, y: number, width: number) => void }
  | { kind: 'empty' };

export interface Row {
  cells: Cell[];
  /** Sentences below the cells, over the width of the table. */
  notes?: { text: string; ink: Ink }[];
}

interface SetLine {
  words: string;
  size: number;
  weight: Weight;
  ink: Ink;
}

const gap = 7;
const padding = 6;
const gapAboveNotes = 5;
const usualSize = 8.5;

/** Draws the rows from `y`; gives the edge below the last. */
export function drawTable(
  printout: Printout,
  y: number,
  columns: readonly Column[],
  rows: Iterable<Row>,
): number {
  let at = drawHeading(printout, y, columns);
  for (const row of rows) {
    const set = setRow(printout, columns, row);
    if (at + set.height > printout.bottom) {
      printout.addPage();
      at = drawHeading(printout, printout.top, columns);
    }
    drawRow(printout, at, columns, row, set);
    at += set.height;
  }
  return at;
}

function drawHeading(printout: Printout, y: number, columns: readonly Column[]): number {
  const size = 7.5;
  const lineHeight = 9.5;
  const headings = columns.map((column) =>
    wrapText(printout.face('strong'), column.heading, size, column.width - gap, 2),
  );
  const most = Math.max(...headings.map((lines) => lines.length));
  const bottom = y + most * lineHeight + 8;
  let x = printout.left;
  columns.forEach((column, index) => {
    const lines = headings[index] ?? [];
    const first = bottom - 6 - (lines.length - 1) * lineHeight;
    printout.writeLines(
      lines,
      alignedX(x, column),
      first,
      { size, weight: 'strong', ink: 'quiet', align: column.align ?? 'left' },
      lineHeight,
    );
    x += column.width;
  });
  printout.rule(printout.left, bottom, printout.right, { ink: 'slate', thickness: 1 });
  return bottom;
}

function alignedX(x: number, column: Column): number {
  if (column.align === 'right') return x + column.width - gap;
  if (column.align === 'middle') return x + (column.width - gap) / 2;
  return x;
}

interface SetRow {
  cells: (SetLine[] | null)[];
  notes: SetLine[];
  height: number;
  cellHeight: number;
}

/** Breaks the texts of a row into lines, which tells how high it is. */
function setRow(printout: Printout, columns: readonly Column[], row: Row): SetRow {
  const cells = row.cells.map((cell, index) => {
    if (cell.kind !== 'text') return null;
    const width = (columns[index]?.width ?? 0) - gap;
    return cell.pieces.flatMap((piece) => setPiece(printout, piece, width));
  });
  const heights = row.cells.map((cell, index) => {
    if (cell.kind === 'drawing') return cell.height;
    return (cells[index] ?? []).reduce((sum, line) => sum + lineHeightOf(line), 0);
  });
  const cellHeight = Math.max(0, ...heights);
  const notes = (row.notes ?? []).flatMap((note) =>
    setPiece(
      printout,
      { text: note.text, size: 8, ink: note.ink, mostLines: 4 },
      printout.innerWidth,
    ),
  );
  const notesHeight = notes.reduce((sum, line) => sum + lineHeightOf(line), 0);
  const height = cellHeight + notesHeight + 2 * padding + (notes.length > 0 ? gapAboveNotes : 0);
  return { cells, notes, height, cellHeight };
}

function setPiece(printout: Printout, piece: CellText, width: number): SetLine[] {
  const size = piece.size ?? usualSize;
  const weight = piece.weight ?? 'regular';
  return wrapText(printout.face(weight), piece.text, size, width, piece.mostLines ?? 2).map(
    (words) => ({ words, size, weight, ink: piece.ink ?? 'slate' }),
  );
}

function lineHeightOf(line: SetLine): number {
  return line.size * 1.32;
}

function drawRow(
  printout: Printout,
  y: number,
  columns: readonly Column[],
  row: Row,
  set: SetRow,
): void {
  const top = y + padding;
  let x = printout.left;
  columns.forEach((column, index) => {
    const cell = row.cells[index];
    if (cell?.kind === 'drawing') cell.draw(x, top, column.width - gap);
    const lines = set.cells[index];
    if (lines) writeSetLines(printout, lines, alignedX(x, column), top, column.align);
    x += column.width;
  });
  if (set.notes.length > 0) {
    writeSetLines(printout, set.notes, printout.left, top + set.cellHeight + gapAboveNotes, 'left');
  }
  printout.rule(printout.left, y + set.height, printout.right);
}

function writeSetLines(
  printout: Printout,
  lines: readonly SetLine[],
  x: number,
  top: number,
  align: Column['align'] = 'left',
): void {
  let y = top;
  for (const line of lines) {
    const { size, weight, ink } = line;
    printout.write(line.words, x, y + size, { size, weight, ink, align });
    y += lineHeightOf(line);
  }
}
