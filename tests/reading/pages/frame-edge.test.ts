import { describe, expect, test } from 'vitest';
import { isWhiteToTheEdge } from '../../../server/reading/pages/frame-edge.ts';
import type { Grey } from '../../../server/reading/pages/raster.ts';

/** A picture of one ground with a darker rectangle on it. */
function makePicture(ground: number, dark: [x: number, y: number, w: number, h: number]): Grey {
  const [left, top, w, h] = dark;
  const data = new Uint8Array(400 * 560).fill(ground);
  for (let y = top; y < top + h; y++) data.fill(60, y * 400 + left, y * 400 + left + w);
  return { width: 400, height: 560, data };
}

describe('a picture that is white to the edge', () => {
  test('is a scan with print inside, and with a punch hole at the side', () => {
    expect(isWhiteToTheEdge(makePicture(248, [60, 60, 280, 400]))).toBe(true);
    expect(isWhiteToTheEdge(makePicture(248, [0, 270, 20, 16]))).toBe(true);
  });

  test('is not a sheet on a table or on a grey glass', () => {
    expect(isWhiteToTheEdge(makePicture(120, [60, 60, 10, 10]))).toBe(false);
    expect(isWhiteToTheEdge(makePicture(228, [60, 60, 10, 10]))).toBe(false);
    expect(isWhiteToTheEdge(makePicture(248, [0, 0, 40, 560]))).toBe(false);
  });
});
