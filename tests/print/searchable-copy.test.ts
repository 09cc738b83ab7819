import sharp from 'sharp';
import { beforeAll, describe, expect, test } from 'vitest';
import type { Word } from '../../server/contract/readings.ts';
import { printSearchableCopy } from '../../server/print/searchable-copy.ts';
import { type PrintedPage, readPages } from './read-pdf.ts';

const word = (text: string, x: number, y: number): Word => ({
  text,
  confidence: 0.9,
  box: { x, y, w: 0.2, h: 0.02 },
});
let picture: Buffer;
let pages: PrintedPage[];

beforeAll(async () => {
  picture = await sharp({
    create: { width: 827, height: 1169, channels: 3, background: '#ffffff' },
  })
    .jpeg()
    .toBuffer();
  const lines = [{ words: [word('Electricity', 0.1, 0.1), word('£184.20', 0.6, 0.1)] }];
  pages = await readPages(
    await printSearchableCopy({
      title: 'Pennelow: papers',
      paper: 'A4',
      papers: [
        { name: 'No. 1 · Utility bill', pages: [{ picture, lines }] },
        { name: 'No. 2 · Will', pages: [{ picture, lines: [] }] },
      ],
    }),
  );
});

// Outside reference: pdf.js, a general-purpose PDF reader, reads the text back.
describe('a copy to take away', () => {
  test('begins with an index that names each paper and its page', () => {
    expect(pages).toHaveLength(3);
    expect(pages[0]?.text).toContain('No. 1 · Utility bill 2');
    expect(pages[0]?.text).toContain('No. 2 · Will 3');
  });

  test('has the words that were read where they stand on the page', () => {
    const found = pages[1]?.items.find(({ words }) => words.includes('£184.20'));
    expect(found?.x).toBeCloseTo(0.6 * (pages[1]?.width ?? 0), 0);
    expect(found?.y).toBeCloseTo((1 - 0.12) * (pages[1]?.height ?? 0), 0);
    expect(pages[1]?.text).toContain('Electricity');
  });

  test('has no index when there is one paper', async () => {
    const single = await printSearchableCopy({
      title: 'No. 1 · Utility bill',
      paper: 'Letter',
      papers: [{ name: 'No. 1 · Utility bill', pages: [{ picture, lines: [] }] }],
    });
    expect(await readPages(single)).toHaveLength(1);
  });
});
