import { wrapText } from './fit-text.ts';
import type { PaperName } from './paper-sizes.ts';
import { Printout } from './printout.ts';
import { drawQrCode } from './qr-code.ts';

export interface BoxLabel {
  householdName: string;
  practiceName: string;
  /** Short code of the box, for example B-03. */
  code: string;
  /** What is in it; may be empty, then lines to write on are printed. */
  label: string;
  areaName: string | null;
  /** Address that opens the box after signing in. */
  url: string;
  paper: PaperName;
}

interface Frame {
  x: number;
  y: number;
  width: number;
  height: number;
}

/** A large label for the front of a box; below the cut line the same twice, smaller, for lid and side. */
export async function printBoxLabel(label: BoxLabel): Promise<Uint8Array> {
  const printout = await Printout.begin({
    paper: label.paper,
    title: `Label of box ${label.code}`,
  });
  const half = printout.height / 2;
  const middle = printout.width / 2;
  const gap = 34;

  drawLabel(printout, label, {
    x: gap + 8,
    y: gap,
    width: printout.width - 2 * (gap + 8),
    height: half - 2 * gap,
  });
  drawCut(printout, { x: 18, y: half }, { x: printout.width - 18, y: half });
  printout.write('Front of the box', 24, half - 6, { size: 7, ink: 'quiet' });
  printout.write('Lid', 24, half + 13, { size: 7, ink: 'quiet' });
  printout.write('Side', middle + 8, half + 13, { size: 7, ink: 'quiet' });
  drawCut(printout, { x: middle, y: half }, { x: middle, y: printout.height - 18 });

  const small = { y: half + gap - 8, width: middle - 2 * 24, height: half - 2 * gap };
  drawLabel(printout, label, { x: 24, ...small });
  drawLabel(printout, label, { x: middle + 24, ...small });
  return printout.finish();
}

function drawCut(
  printout: Printout,
  from: { x: number; y: number },
  to: { x: number; y: number },
): void {
  printout.line(from, to, { ink: 'quiet', thickness: 0.6, dashes: [4, 4] });
}

function drawLabel(printout: Printout, label: BoxLabel, frame: Frame): void {
  const isWide = frame.width > frame.height;
  printout.box(frame.x, frame.y, frame.width, frame.height, { border: 'slate', thickness: 1.25 });
  printout.box(frame.x, frame.y, frame.width, isWide ? 34 : 26, { fill: 'slate' });
  printout.write(
    label.householdName,
    frame.x + 16,
    frame.y + (isWide ? 22 : 17.5),
    { size: isWide ? 13 : 10, weight: 'strong', ink: 'white' },
    frame.width - 32,
  );
  if (isWide) drawWide(printout, label, frame);
  else drawUpright(printout, label, frame);
}

/** Words on the left, code to scan on the right. */
function drawWide(printout: Printout, label: BoxLabel, frame: Frame): void {
  const x = frame.x + 16;
  const codeSize = 178;
  const codeX = frame.x + frame.width - codeSize - 10;
  const width = codeX - x - 12;
  drawCode(printout, label.code, x, frame.y + 132, 104, width);
  drawContents(
    printout,
    label,
    { x, y: frame.y + 172, width, height: frame.height - 172 - 34 },
    17,
  );
  drawQrCode(printout, label.url, codeX, frame.y + 46, codeSize);
  const under = { size: 8.5, ink: 'quiet', align: 'middle' } as const;
  printout.write('Opens this box after signing in', codeX + codeSize / 2, frame.y + 236, under);
  drawPracticeLine(printout, label, frame, 9);
}

/** Words above, code to scan below. */
function drawUpright(printout: Printout, label: BoxLabel, frame: Frame): void {
  const x = frame.x + 14;
  const width = frame.width - 28;
  drawCode(printout, label.code, x, frame.y + 84, 54, width);
  drawContents(printout, label, { x, y: frame.y + 110, width, height: 66 }, 12);
  const codeSize = Math.min(150, frame.height - 200);
  const codeY = frame.y + frame.height - codeSize - 26;
  drawQrCode(printout, label.url, frame.x + (frame.width - codeSize) / 2, codeY, codeSize);
  drawPracticeLine(printout, label, frame, 7.5);
}

/** The code as large as it fits. */
function drawCode(
  printout: Printout,
  code: string,
  x: number,
  y: number,
  largest: number,
  width: number,
): void {
  const face = printout.face('strong');
  const natural = face.measure(face.clean(code), largest);
  const size = natural > width ? Math.max(20, (largest * width) / natural) : largest;
  printout.write(code, x, y, { size, weight: 'strong' }, width);
}

function drawContents(printout: Printout, label: BoxLabel, area: Frame, size: number): void {
  let y = area.y;
  if (label.areaName?.trim()) {
    printout.write(label.areaName, area.x, y, { size: size * 0.75, ink: 'quiet' }, area.width);
    y += size * 1.45;
  }
  if (label.label.trim()) {
    const lineHeight = size * 1.3;
    const most = Math.max(1, Math.floor((area.y + area.height - y) / lineHeight) + 1);
    const lines = wrapText(printout.face(), label.label, size, area.width, most);
    printout.writeLines(lines, area.x, y, { size }, lineHeight);
    return;
  }
  // Nothing known yet: room for a pen.
  for (let line = 0; line < 2; line += 1) {
    const lineY = y + 10 + line * 26;
    if (lineY <= area.y + area.height) printout.rule(area.x, lineY, area.x + area.width);
  }
}

function drawPracticeLine(printout: Printout, label: BoxLabel, frame: Frame, size: number): void {
  printout.write(
    label.practiceName,
    frame.x + 16,
    frame.y + frame.height - 12,
    { size, ink: 'quiet' },
    frame.width - 32,
  );
}
