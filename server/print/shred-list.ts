import type { PDFImage } from 'pdf-lib';
import type { ShredList, ShredRow } from '../contract/shred-lists.ts';
import {
  drawColumns,
  drawFigures,
  drawPanel,
  drawSentences,
  drawSignatures,
  drawTitle,
  signatureHeight,
} from './blocks.ts';
import { gatherCautions, generalGuidance } from './cautions.ts';
import { describeApproval, describePaper, describeRule, saySum } from './list-words.ts';
import type { PaperName } from './paper-sizes.ts';
import { Printout } from './printout.ts';
import type { Cell, Column, Row } from './row-table.ts';
import { drawTable } from './row-table.ts';
import { sayLevel } from './security-levels.ts';
import { sayCount, sayDay, sayWeight } from './words.ts';

export interface ShredListPrint {
  list: ShredList;
  /** Small JPEG pictures by page id, for the first page of each paper; any may be missing. */
  pictures: ReadonlyMap<string, Uint8Array>;
  practiceName: string;
  householdName: string;
  paper: PaperName;
}

const pictureFrame = { width: 40, height: 50 };
const tickSize = 13;
const signatureRoles = ['Client', 'Carried out by', 'Witness'];

/** The list to approve, and to work from at the shredder. */
export async function printShredList(input: ShredListPrint): Promise<Uint8Array> {
  const { list, practiceName, householdName } = input;
  const name = `Shred list ${list.number}`;
  const printout = await Printout.begin({
    paper: input.paper,
    title: name,
    footer: {
      left: `${name}, version ${list.version}  |  ${householdName}`,
      middle: list.approval ? '' : 'Not approved: nothing on it may be destroyed.',
    },
  });
  let y = drawTitle(printout, {
    practiceName,
    title: name,
    householdName,
    aside: `Version ${list.version}, for ${sayDay(list.on)}`,
  });
  y = drawPanel(printout, y, describeState(list));
  y = drawFigures(printout, y, [
    { name: 'Papers', value: String(list.rows.length) },
    { name: 'Sheets', value: String(list.sheets) },
    { name: 'Weight, about', value: sayWeight(list.weightGrams) },
    { name: 'Security level', value: list.securityLevel ?? 'none asked' },
  ]);
  y = drawColumns(printout, y, 'Before you start', gatherCautions(list.cautions));
  y = drawSentences(printout, y, [generalGuidance], { size: 8.25, weight: 'strong' });
  if (list.securityLevel) y = drawSentences(printout, y - 8, [sayLevel(list.securityLevel)]);

  const images = await embedPictures(printout, input);
  const columns = planColumns(printout.innerWidth);
  y = drawTable(
    printout,
    y + 4,
    columns,
    list.rows.map((row, index) => describeRow(printout, row, index, images)),
  );
  drawEnd(printout, y, list);
  return printout.finish();
}

function describeState(list: ShredList): Parameters<typeof drawPanel>[2] {
  switch (list.status) {
    case 'draft':
    case 'sent':
      return {
        ink: 'rust',
        lead: 'Not approved: nothing on this list may be destroyed yet',
        sentences: [
          list.status === 'draft'
            ? 'This is a draft. It is sent to the client for approval first.'
            : 'The list was sent to the client and waits for an answer.',
        ],
      };
    case 'void':
      return {
        ink: 'rust',
        lead: 'Given up: nothing on this list may be destroyed',
        sentences: [],
      };
    case 'approved':
      return {
        ink: 'teal',
        lead: 'Approved',
        sentences: [
          ...describeApproval(list),
          ...(list.approval
            ? [
                `Nothing is destroyed before ${sayDay(list.approval.notBefore)} unless the client is present. The approval lapses after ${sayDay(list.approval.lapsesOn)}.`,
              ]
            : []),
        ],
      };
    case 'done':
      return {
        ink: 'teal',
        lead: list.destruction ? `Carried out on ${sayDay(list.destruction.on)}` : 'Carried out',
        sentences: [...describeApproval(list), 'What was destroyed is in the destruction record.'],
      };
  }
}

function planColumns(innerWidth: number): Column[] {
  const fixed = [24, pictureFrame.width + 9, 58, 116, 44, 34, 34, 34];
  const [number = 0, picture = 0, date = 0, rule = 0, level = 0, ...ticks] = fixed;
  const paper = innerWidth - fixed.reduce((sum, width) => sum + width, 0);
  return [
    { heading: 'Row', width: number },
    { heading: '', width: picture },
    { heading: 'Box and paper, kind, issuer', width: paper },
    { heading: 'Date on it', width: date },
    { heading: 'Rule', width: rule },
    { heading: 'Level', width: level },
    ...['Pulled', 'Kept back', 'Not found'].map((heading, index) => ({
      heading,
      width: ticks[index] ?? 0,
      align: 'middle' as const,
    })),
  ];
}

function describeRow(
  printout: Printout,
  row: ShredRow,
  index: number,
  images: ReadonlyMap<string, PDFImage>,
): Row {
  const image = row.firstPageId ? images.get(row.firstPageId) : undefined;
  const mayBePulled = !row.keptBack && row.blocked.length === 0;
  return {
    cells: [
      { kind: 'text', pieces: [{ text: String(index + 1), weight: 'strong' }] },
      drawPicture(printout, image ?? null),
      describePaper(row),
      { kind: 'text', pieces: [{ text: row.paperOn ? sayDay(row.paperOn) : 'no date' }] },
      describeRule(row),
      {
        kind: 'text',
        pieces: [
          { text: row.securityLevel ?? 'none', weight: 'strong' },
          { text: sayCount(row.sheets, 'sheet'), size: 7.5, ink: 'quiet' },
        ],
      },
      mayBePulled ? drawTick(printout, row.outcome === 'destroyed') : drawNoTick(printout),
      drawTick(printout, row.keptBack || row.outcome === 'kept-back'),
      drawTick(printout, row.outcome === 'not-found'),
    ],
    notes: describeNotes(row),
  };
}

function describeNotes(row: ShredRow): NonNullable<Row['notes']> {
  const notes: NonNullable<Row['notes']> = row.blocked.map(({ sentence }) => ({
    text: `Do not pull. ${sentence}`,
    ink: 'rust' as const,
  }));
  if (row.keptBack) {
    const reason = row.keptBackReason ? `: ${row.keptBackReason}` : ', as the client asked';
    notes.push({ text: `Kept back${reason}`, ink: 'rust' });
  }
  return notes;
}

function drawPicture(printout: Printout, image: PDFImage | null): Cell {
  const { width, height } = pictureFrame;
  return {
    kind: 'drawing',
    height,
    draw: (x, y) => {
      if (image) {
        printout.picture(image, x, y, width, height);
        return;
      }
      printout.box(x, y, width, height, { border: 'hairline', thickness: 0.5 });
      const style = { size: 6.5, ink: 'quiet', align: 'middle' } as const;
      printout.write('not', x + width / 2, y + height / 2 - 1, style);
      printout.write('scanned', x + width / 2, y + height / 2 + 8, style);
    },
  };
}

function drawTick(printout: Printout, isTicked: boolean): Cell {
  return {
    kind: 'drawing',
    height: tickSize + 2,
    draw: (x, y, width) => {
      const left = x + (width - tickSize) / 2;
      printout.box(left, y + 1, tickSize, tickSize, { border: 'slate', thickness: 0.9 });
      if (!isTicked) return;
      const pen = { ink: 'slate', thickness: 1.6 } as const;
      printout.line({ x: left + 2.5, y: y + 8 }, { x: left + 5.5, y: y + 11.5 }, pen);
      printout.line({ x: left + 5.5, y: y + 11.5 }, { x: left + 11, y: y + 3.5 }, pen);
    },
  };
}

/** A stroke where there is nothing to tick. */
function drawNoTick(printout: Printout): Cell {
  return {
    kind: 'drawing',
    height: tickSize + 2,
    draw: (x, y, width) =>
      printout.rule(x + width / 2 - 5, y + 8, x + width / 2 + 5, { ink: 'rust', thickness: 1.4 }),
  };
}

async function embedPictures(
  printout: Printout,
  { list, pictures }: ShredListPrint,
): Promise<Map<string, PDFImage>> {
  const images = new Map<string, PDFImage>();
  for (const { firstPageId } of list.rows) {
    const bytes = firstPageId ? pictures.get(firstPageId) : undefined;
    if (!firstPageId || !bytes || images.has(firstPageId)) continue;
    const image = await printout.findImage(bytes);
    if (image) images.set(firstPageId, image);
  }
  return images;
}

function drawEnd(printout: Printout, tableBottom: number, list: ShredList): void {
  const height = 84 + signatureRoles.length * signatureHeight;
  let y = tableBottom + 14;
  if (y + height > printout.bottom) {
    printout.addPage();
    y = printout.top;
  }
  const sum = { papers: list.rows.length, sheets: list.sheets };
  y = drawSentences(printout, y, [`In all ${saySum(sum)}, about ${sayWeight(list.weightGrams)}.`], {
    size: 11,
    weight: 'strong',
  });
  y = drawSentences(printout, y + 2, [
    'Pulled: taken out to be destroyed. Kept back: stays, whatever the list says. Not found: looked for where the row says, and not there. Afterwards enter the ticks in Slackwater, which writes the destruction record.',
    'The client signs for the rows that are not kept back. Whoever carries it out and the witness sign when it is done.',
  ]);
  drawSignatures(printout, y + 6, signatureRoles);
}
