import type { ShredList, ShredRow } from '../contract/shred-lists.ts';
import {
  drawFigures,
  drawSentences,
  drawSignatures,
  drawTitle,
  signatureHeight,
} from './blocks.ts';
import { generalGuidance } from './cautions.ts';
import { wrapText } from './fit-text.ts';
import type { Ink } from './inks.ts';
import { describeApproval, describePaper, describeRule, saySum, sumRows } from './list-words.ts';
import type { PaperName } from './paper-sizes.ts';
import { Printout } from './printout.ts';
import type { Column, Row } from './row-table.ts';
import { drawTable } from './row-table.ts';
import { levelStandards, sayLevel } from './security-levels.ts';
import { sayDay, sayWeight } from './words.ts';

export interface DestructionRecordPrint {
  /** A list that was carried out. */
  list: ShredList;
  practiceName: string;
  householdName: string;
  paper: PaperName;
}

const signatureRoles = ['Carried out by', 'Witness', 'Client'];

/**
 * What was shredded: who, when, where, how, at which level, who watched, and what became of each row.
 * @throws Error when the list was not carried out yet
 */
export async function printDestructionRecord(input: DestructionRecordPrint): Promise<Uint8Array> {
  const { list, practiceName, householdName } = input;
  const { destruction } = list;
  if (!destruction) {
    throw new Error(
      `Shred list ${list.number} was not carried out yet: record the destruction first, then print it.`,
    );
  }
  const name = `Destruction record of shred list ${list.number}`;
  const printout = await Printout.begin({
    paper: input.paper,
    title: name,
    footer: { left: `${name}  |  ${householdName}` },
  });
  const destroyed = sumRows(list.rows.filter((row) => row.outcome === 'destroyed'));
  const countOf = (outcome: ShredRow['outcome']) =>
    list.rows.filter((row) => row.outcome === outcome).length;

  let y = drawTitle(printout, {
    practiceName,
    title: 'What was shredded',
    householdName,
    aside: `Shred list ${list.number}`,
  });
  y = drawFigures(printout, y, [
    { name: 'Papers destroyed', value: String(destroyed.papers) },
    { name: 'Sheets destroyed', value: String(destroyed.sheets) },
    { name: 'Weight, about', value: sayWeight(destroyed.grams) },
    { name: 'Kept back', value: String(countOf('kept-back')) },
    { name: 'Not found', value: String(countOf('not-found')) },
  ]);
  y = drawFacts(printout, y, [
    { name: 'When', words: sayDay(destruction.on) },
    { name: 'Where', words: destruction.place },
    { name: 'How', words: destruction.method },
    {
      name: 'Security level',
      words: destruction.level
        ? sayLevel(destruction.level)
        : `Not stated (levels are those of ${levelStandards}).`,
    },
    ...(list.securityLevel
      ? [{ name: 'Level asked for', words: `${list.securityLevel}, the highest of the rows` }]
      : []),
    {
      name: 'Who watched',
      words: `${destruction.witness}; the client was ${destruction.clientPresent ? '' : 'not '}present`,
    },
    { name: 'Recorded by', words: destruction.recordedByName },
    { name: 'Approval', words: describeApproval(list).join(' ') || 'None on record' },
  ]);
  y = drawTable(
    printout,
    y + 4,
    planColumns(printout.innerWidth),
    list.rows.map((row, index) => describeRow(row, index)),
  );
  drawEnd(printout, y, destroyed);
  return printout.finish();
}

function drawFacts(
  printout: Printout,
  y: number,
  facts: readonly { name: string; words: string }[],
): number {
  const nameWidth = 104;
  const size = 9.5;
  const lineHeight = 13;
  let at = y + 10;
  for (const { name, words } of facts) {
    printout.write(name, printout.left, at, { size: 8.5, ink: 'quiet' }, nameWidth - 10);
    const lines = wrapText(printout.face(), words, size, printout.innerWidth - nameWidth);
    at = printout.writeLines(lines, printout.left + nameWidth, at, { size }, lineHeight) + 3;
  }
  return at;
}

function planColumns(innerWidth: number): Column[] {
  const fixed = { number: 26, date: 66, rule: 150, sheets: 46, outcome: 68 };
  const taken = Object.values(fixed).reduce((sum, width) => sum + width, 0);
  return [
    { heading: 'Row', width: fixed.number },
    { heading: 'Box and paper, kind, issuer', width: innerWidth - taken },
    { heading: 'Date on it', width: fixed.date },
    { heading: 'Rule and date that allowed it', width: fixed.rule },
    { heading: 'Sheets', width: fixed.sheets, align: 'right' },
    { heading: 'Outcome', width: fixed.outcome },
  ];
}

const outcomeWords: Record<NonNullable<ShredRow['outcome']>, { text: string; ink: Ink }> = {
  destroyed: { text: 'Destroyed', ink: 'slate' },
  'kept-back': { text: 'Kept back', ink: 'teal' },
  'not-found': { text: 'Not found', ink: 'amber' },
};

function describeRow(row: ShredRow, index: number): Row {
  const outcome = row.outcome
    ? outcomeWords[row.outcome]
    : { text: 'Not recorded', ink: 'amber' as const };
  return {
    cells: [
      { kind: 'text', pieces: [{ text: String(index + 1), weight: 'strong' }] },
      describePaper(row),
      { kind: 'text', pieces: [{ text: row.paperOn ? sayDay(row.paperOn) : 'no date' }] },
      describeRule(row),
      { kind: 'text', pieces: [{ text: String(row.sheets) }] },
      {
        kind: 'text',
        pieces: [
          { ...outcome, weight: 'strong' },
          ...(row.keptBackReason
            ? [{ text: row.keptBackReason, size: 7.5, ink: 'quiet' as const, mostLines: 3 }]
            : []),
        ],
      },
    ],
  };
}

function drawEnd(
  printout: Printout,
  tableBottom: number,
  destroyed: { papers: number; sheets: number; grams: number },
): void {
  const height = 76 + signatureRoles.length * signatureHeight;
  let y = tableBottom + 14;
  if (y + height > printout.bottom) {
    printout.addPage();
    y = printout.top;
  }
  y = drawSentences(
    printout,
    y,
    [`Destroyed: ${saySum(destroyed)}, about ${sayWeight(destroyed.grams)}.`],
    { size: 11, weight: 'strong' },
  );
  y = drawSentences(printout, y + 2, [
    'Weight reckoned at 5 g a sheet (A4, 80 g/m²).',
    generalGuidance,
  ]);
  drawSignatures(printout, y + 6, signatureRoles);
}
