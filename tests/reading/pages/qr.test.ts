import QRCode from 'qrcode';
import sharp from 'sharp';
import { describe, expect, test } from 'vitest';
import { findCode } from '../../../server/reading/pages/qr.ts';
import type { Grey } from '../../../server/reading/pages/raster.ts';

const code = 'SLACKWATER:SEPARATOR:1';

/** A sheet of 1240 by 1754 pixels with the code at a place, turned by some degrees. */
async function makeSheet(size: number, degrees: number, text: string | null): Promise<Grey> {
  const mark = text
    ? await sharp(await QRCode.toBuffer(text, { width: size, margin: 4 }))
        .rotate(degrees, { background: '#ffffff' })
        .png()
        .toBuffer()
    : null;
  const print = Buffer.from(
    `<svg width="1240" height="1754">${Array.from({ length: 30 }, (_, row) => `<text x="90" y="${900 + row * 26}" font-size="20">Date 12/03/2024 ||| 1,204.11 illlIiil || [ ] 8B 0O MW ${row}</text>`).join('')}</svg>`,
  );
  const { data, info } = await sharp({
    create: { width: 1240, height: 1754, channels: 3, background: '#f4f2ec' },
  })
    .composite([
      ...(mark ? [{ input: mark, left: 300, top: 150 }] : []),
      { input: print, left: 0, top: 0 },
    ])
    .greyscale()
    .raw()
    .toBuffer({ resolveWithObject: true });
  return { width: info.width, height: info.height, data: new Uint8Array(data) };
}

describe('a code on a page', () => {
  test.each([
    [360, 0],
    [360, 2.3],
    [360, -4],
    [260, 1],
    [500, 90],
    [420, 180],
  ])('of %i pixels, turned by %i degrees, is read', async (size, degrees) => {
    expect(findCode(await makeSheet(size, degrees, code))).toBe(code);
  });

  test('is not seen where there is only print', async () => {
    expect(findCode(await makeSheet(300, 0, null))).toBeNull();
  });
});
