import readQrCode from 'jsqr';
import { describe, expect, test } from 'vitest';
import type { BoxLabel } from '../../server/print/box-label.ts';
import { printBoxLabel } from '../../server/print/box-label.ts';
import { choosePaper } from '../../server/print/paper-sizes.ts';
import { printSeparatorSheet } from '../../server/print/separator-sheet.ts';
import type { Picture } from './read-pdf.ts';
import { cutPicture, drawPage, readPages } from './read-pdf.ts';

const label: BoxLabel = {
  householdName: 'Marlow household',
  practiceName: 'Quiet Drawer Organising',
  code: 'B-03',
  label: 'Desk, left drawer',
  areaName: 'Home office',
  url: 'https://slackwater.example/boxes/0b5b6a0e-0000-4000-8000-000000000001',
  paper: 'A4',
};

function readCode(picture: Picture): string | null {
  return readQrCode(picture.data, picture.width, picture.height)?.data ?? null;
}

describe('a box label', () => {
  test('says three times what box it is and whose', async () => {
    const [page, ...more] = await readPages(await printBoxLabel(label));
    expect(more).toEqual([]);
    for (const words of ['B-03', 'Desk, left drawer', 'Home office', 'Marlow household']) {
      expect(page?.text.split(words)).toHaveLength(4);
    }
  });

  test('has codes that open the box, on the large label and on both small ones', async () => {
    const picture = await drawPage(await printBoxLabel(label), 1, 2);
    const middleX = Math.floor(picture.width / 2);
    const middleY = Math.floor(picture.height / 2);
    const parts = [
      cutPicture(picture, middleX, 0, picture.width - middleX, middleY),
      cutPicture(picture, 0, middleY, middleX, picture.height - middleY),
      cutPicture(picture, middleX, middleY, picture.width - middleX, picture.height - middleY),
    ];
    expect(parts.map(readCode)).toEqual([label.url, label.url, label.url]);
  });

  test('keeps long words within its frame', async () => {
    const long: BoxLabel = {
      ...label,
      paper: 'Letter',
      code: 'THE-BOX-UNDER-THE-STAIRS-NUMBER-12',
      householdName: 'The household of '.repeat(12),
      label: 'Letters, bills and statements '.repeat(12),
      areaName: 'Donaudampfschifffahrtsgesellschaftskapitänskajüte'.repeat(4),
      practiceName: 'Quiet Drawer Organising and Daughters '.repeat(6),
    };
    const [page] = await readPages(await printBoxLabel(long));
    expect(page).toMatchObject({ width: 612, height: 792 });
    for (const item of page?.items ?? []) {
      expect(item.x).toBeGreaterThan(18);
      expect(item.x + item.width).toBeLessThan(612 - 18);
    }
    const leftHalf = page?.items.filter(({ x, y }) => x < 306 && y < 390) ?? [];
    expect(leftHalf.length).toBeGreaterThan(0);
    for (const item of leftHalf) expect(item.x + item.width).toBeLessThan(306);
  });

  test('leaves room to write where nothing is known yet', async () => {
    const [page] = await readPages(await printBoxLabel({ ...label, label: '', areaName: null }));
    expect(page?.text).toContain('B-03');
    expect(page?.text).not.toContain('null');
  });
});

describe('a separator sheet', () => {
  test.each([
    ['A4' as const, 595.28, 841.89],
    ['Letter' as const, 612, 792],
  ])('on %s has the code that splits a pile', async (paper, width, height) => {
    const bytes = await printSeparatorSheet({ paper });
    const [page] = await readPages(bytes);
    expect(page?.width).toBeCloseTo(width, 1);
    expect(page?.height).toBeCloseTo(height, 1);
    expect(readCode(await drawPage(bytes, 1, 1.5))).toBe('SLACKWATER:SEPARATOR');
  });
});

describe('the paper in the printer', () => {
  test('is Letter in the United States and Canada, A4 elsewhere', () => {
    expect(['US', 'CA', 'GB', 'IE', 'DE', 'AU', 'MX'].map(choosePaper)).toEqual([
      'Letter',
      'Letter',
      'A4',
      'A4',
      'A4',
      'A4',
      'A4',
    ]);
  });
});
