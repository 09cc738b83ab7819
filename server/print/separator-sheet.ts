import type { PaperName } from './paper-sizes.ts';
import { Printout } from './printout.ts';
import { drawQrCode } from './qr-code.ts';

/** What the code on a separator sheet says; the reader splits a pile where it meets it. */
export const separatorText = 'SLACKWATER:SEPARATOR';

/** A sheet to lay between two papers before they go through the scanner. */
export async function printSeparatorSheet(input: { paper: PaperName }): Promise<Uint8Array> {
  const printout = await Printout.begin({ paper: input.paper, title: 'Separator sheet' });
  const middle = printout.width / 2;
  const codeSize = 280;
  const codeTop = (printout.height - codeSize) / 2;

  // Wide bars at both ends: the sheet is seen in a stack from either side.
  const barHeight = 26;
  printout.box(printout.left, 44, printout.innerWidth, barHeight, { fill: 'slate' });
  printout.box(printout.left, printout.height - 44 - barHeight, printout.innerWidth, barHeight, {
    fill: 'slate',
  });

  printout.write('A new paper starts here', middle, 150, {
    size: 30,
    weight: 'strong',
    align: 'middle',
  });
  printout.write('Separator sheet', middle, 176, { size: 13, ink: 'quiet', align: 'middle' });
  drawQrCode(printout, separatorText, middle - codeSize / 2, codeTop, codeSize);
  const below = codeTop + codeSize + 46;
  const lines = [
    'Lay one sheet between two papers, either way up, the code facing the scanner.',
    'It is not kept as a page. Take the sheets out again afterwards and use them next time.',
    'Print one side only: the back of a separator must stay empty.',
  ];
  lines.forEach((line, index) =>
    printout.write(line, middle, below + index * 18, { size: 11, align: 'middle' }),
  );
  return printout.finish();
}
