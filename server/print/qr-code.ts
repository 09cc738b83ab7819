import { create } from 'qrcode';
import type { Printout } from './printout.ts';

/** Modules of white that a reader needs around a code (ISO/IEC 18004). */
export const quietModules = 4;

/**
 * Draws a QR code of `size` points, its white border included, from the upper left corner. It is drawn as
 * shapes, so it stays sharp at any size; error correction Q stands a quarter of it being dirty or torn.
 */
export function drawQrCode(
  printout: Printout,
  text: string,
  x: number,
  y: number,
  size: number,
): void {
  const { modules } = create(text, { errorCorrectionLevel: 'Q' });
  const unit = size / (modules.size + 2 * quietModules);
  printout.box(x, y, size, size, { fill: 'white' });
  const bars: string[] = [];
  for (let row = 0; row < modules.size; row += 1) {
    let column = 0;
    while (column < modules.size) {
      const start = column;
      while (column < modules.size && modules.get(row, column)) column += 1;
      // One bar a run of dark modules: no hairlines between neighbours when it is printed.
      if (column > start) bars.push(writeBar(start, row, column - start, unit));
      else column += 1;
    }
  }
  printout.shape(bars.join(''), x + quietModules * unit, y + quietModules * unit);
}

function writeBar(column: number, row: number, length: number, unit: number): string {
  const round = (value: number) => Number(value.toFixed(3));
  const right = round((column + length) * unit);
  const lower = round((row + 1) * unit);
  return `M${round(column * unit)} ${round(row * unit)}H${right}V${lower}H${round(column * unit)}Z`;
}
