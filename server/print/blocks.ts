/** Pieces that printed lists are put together from. Each draws from a top edge and gives the edge below it. */
import { wrapText } from './fit-text.ts';
import type { Ink } from './inks.ts';
import type { Printout, TextStyle } from './printout.ts';

/** Practice above, title large, household below; a few words on the right, such as the version. */
export function drawTitle(
  printout: Printout,
  words: { practiceName: string; title: string; householdName: string; aside: string },
): number {
  const { left, right, innerWidth } = printout;
  let y = printout.top + 8;
  printout.write(words.practiceName, left, y, { size: 9, ink: 'quiet' }, innerWidth * 0.65);
  printout.write(
    words.aside,
    right,
    y,
    { size: 9, ink: 'quiet', align: 'right' },
    innerWidth * 0.3,
  );
  y += 30;
  printout.write(words.title, left, y, { size: 25, weight: 'strong' }, innerWidth);
  y += 20;
  printout.write(words.householdName, left, y, { size: 13 }, innerWidth);
  return y + 16;
}

/** A panel with a bar of colour at its left: what must not be missed. */
export function drawPanel(
  printout: Printout,
  y: number,
  panel: { ink: Ink; lead: string; sentences: readonly string[] },
): number {
  const { left, innerWidth } = printout;
  const inset = 14;
  const size = 9.5;
  const lineHeight = 13;
  const leadLines = wrapText(printout.face('strong'), panel.lead, 11, innerWidth - 2 * inset);
  const lines = panel.sentences.flatMap((sentence) =>
    wrapText(printout.face(), sentence, size, innerWidth - 2 * inset),
  );
  const height = leadLines.length * 15 + lines.length * lineHeight + 14;
  printout.box(left, y, innerWidth, height, { fill: 'mist' });
  printout.box(left, y, 4, height, { fill: panel.ink });
  const afterLead = printout.writeLines(
    leadLines,
    left + inset,
    y + 18,
    { size: 11, weight: 'strong', ink: panel.ink },
    15,
  );
  printout.writeLines(lines, left + inset, afterLead, { size }, lineHeight);
  return y + height + 12;
}

/** Figures side by side, each below its name. */
export function drawFigures(
  printout: Printout,
  y: number,
  figures: readonly { name: string; value: string }[],
): number {
  const { left, right, innerWidth } = printout;
  const width = innerWidth / figures.length;
  printout.rule(left, y, right);
  figures.forEach(({ name, value }, index) => {
    const x = left + index * width;
    printout.write(name, x, y + 13, { size: 7.5, ink: 'quiet' }, width - 8);
    printout.write(value, x, y + 29, { size: 13, weight: 'strong' }, width - 8);
  });
  printout.rule(left, y + 38, right);
  return y + 52;
}

/** A heading with sentences in two columns below it, filled one after the other. */
export function drawColumns(
  printout: Printout,
  y: number,
  heading: string,
  sentences: readonly string[],
): number {
  const gap = 22;
  const size = 8.25;
  const lineHeight = 11.25;
  const width = (printout.innerWidth - gap) / 2 - 9;
  printout.write(heading, printout.left, y + 8, { size: 10, weight: 'strong' });
  const blocks = sentences.map((sentence) => wrapText(printout.face(), sentence, size, width));
  const total = blocks.reduce((sum, lines) => sum + lines.length, 0);
  const cursors = [y + 24, y + 24];
  let used = 0;
  for (const lines of blocks) {
    const column = used >= total / 2 ? 1 : 0;
    used += lines.length;
    const x = printout.left + column * (width + 9 + gap);
    const top = cursors[column] ?? y;
    printout.box(x, top - 5, 3, 3, { fill: 'teal' });
    cursors[column] = printout.writeLines(lines, x + 9, top, { size }, lineHeight) + 2.5;
  }
  return Math.max(...cursors) + 4;
}

/** Plain sentences over the whole width. */
export function drawSentences(
  printout: Printout,
  y: number,
  sentences: readonly string[],
  style: TextStyle = { size: 8.25, ink: 'quiet' },
): number {
  const lineHeight = style.size * 1.38;
  let at = y + style.size;
  for (const sentence of sentences) {
    const lines = wrapText(printout.face(style.weight), sentence, style.size, printout.innerWidth);
    at = printout.writeLines(lines, printout.left, at, style, lineHeight) + 2;
  }
  return at;
}

export const signatureHeight = 46;

/** Lines to sign on, one below the other: who, with room for signature, printed name and date. */
export function drawSignatures(printout: Printout, y: number, roles: readonly string[]): number {
  const { left, right, innerWidth } = printout;
  const nameX = left + innerWidth * 0.46;
  const dateX = left + innerWidth * 0.8;
  roles.forEach((role, index) => {
    const lineY = y + index * signatureHeight + 30;
    const caption: TextStyle = { size: 7.5, ink: 'quiet' };
    const parts = [
      { from: left, to: nameX - 12, words: `${role}: signature` },
      { from: nameX, to: dateX - 12, words: 'Name in capitals' },
      { from: dateX, to: right, words: 'Date' },
    ];
    for (const part of parts) {
      printout.rule(part.from, lineY, part.to, { ink: 'slate' });
      printout.write(part.words, part.from, lineY + 10, caption, part.to - part.from);
    }
  });
  return y + roles.length * signatureHeight;
}
