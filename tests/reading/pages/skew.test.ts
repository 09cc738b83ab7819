import sharp from 'sharp';
import { describe, expect, test } from 'vitest';
import { liesOnSide } from '../../../server/reading/pages/orientation.ts';
import type { Grey } from '../../../server/reading/pages/raster.ts';
import { findSkew } from '../../../server/reading/pages/skew.ts';

/** A page of even print, turned clockwise by some degrees. */
async function printPage(degrees: number): Promise<Grey> {
  const rows = Array.from(
    { length: 34 },
    (_, row) =>
      `<text x="90" y="${120 + row * 38}" font-family="sans-serif" font-size="22">The tenant pays rent on the first day of each month, row ${row}</text>`,
  ).join('');
  const upright = await sharp(
    Buffer.from(
      `<svg xmlns="http://www.w3.org/2000/svg" width="1100" height="1556"><rect width="1100" height="1556" fill="white"/>${rows}</svg>`,
    ),
  )
    .flatten({ background: '#ffffff' })
    .png()
    .toBuffer();
  const { data, info } = await sharp(upright)
    .rotate(degrees, { background: '#ffffff' })
    .greyscale()
    .raw()
    .toBuffer({ resolveWithObject: true });
  return { width: info.width, height: info.height, data: new Uint8Array(data) };
}

describe('the slope of print', () => {
  test.each([-4, -1.5, 0, 0.7, 3])('of %d degrees is found to a tenth', async (degrees) => {
    expect(Math.abs(findSkew(await printPage(degrees)) - degrees)).toBeLessThan(0.1);
  });

  test('is none on an empty page', () => {
    expect(findSkew({ width: 300, height: 400, data: new Uint8Array(120_000).fill(250) })).toBe(0);
  });
});

describe('a page on its side', () => {
  test.each([
    [0, false],
    [180, false],
    [90, true],
    [270, true],
  ])('turned by %i degrees', async (degrees, lies) => {
    expect(liesOnSide(await printPage(degrees))).toBe(lies);
  });
});
