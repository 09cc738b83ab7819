import sharp from 'sharp';
import { beforeAll, describe, expect, test } from 'vitest';
import type { ShredList } from '../../server/contract/shred-lists.ts';
import { printDestructionRecord } from '../../server/print/destruction-record.ts';
import { printShredList } from '../../server/print/shred-list.ts';
import type { PrintedPage } from './read-pdf.ts';
import { drawPage, readPages } from './read-pdf.ts';
import { approval, destruction, idOf, makeList, makeRow } from './shred-list-fixture.ts';

const names = { practiceName: 'Quiet Drawer Organising', householdName: 'Marlow household' };

async function readList(
  changes: Partial<ShredList>,
  paper: 'A4' | 'Letter' = 'A4',
): Promise<PrintedPage[]> {
  const list = makeList(changes);
  return readPages(await printShredList({ list, pictures: new Map(), ...names, paper }));
}

async function readRecord(changes: Partial<ShredList>): Promise<PrintedPage[]> {
  const list = makeList({ status: 'done', approval, destruction, ...changes });
  return readPages(await printDestructionRecord({ list, ...names, paper: 'A4' }));
}

const wholeText = (pages: readonly PrintedPage[]) => pages.map(({ text }) => text).join(' ');

function expectWithinMargins(pages: readonly PrintedPage[]): void {
  for (const page of pages) {
    for (const item of page.items) {
      expect(item.x).toBeGreaterThan(40);
      expect(item.x + item.width).toBeLessThan(page.width - 40);
      expect(item.y).toBeGreaterThan(15);
      expect(item.y).toBeLessThan(page.height - 30);
    }
  }
}

describe('a printed shred list', () => {
  test('says of each row where it is, what it is, and which rule and date allow it', async () => {
    const text = wholeText(
      await readList({
        rows: [
          makeRow(1, { ruleBasis: 'guidance', sheets: 12 }),
          makeRow(2, { sourceNote: 'Not checked at the source.', boxCode: null }),
        ],
      }),
    );
    for (const words of [
      'B-03, paper 101',
      'Paper 102',
      'Bank statement',
      'Harbour & Vale Bank',
      '31 Mar 2017',
      'Keep until 31 Jan 2023',
      'gb.bank-statement.self- employed',
      "an authority's guidance",
      'set by law',
      'Not checked at the source.',
      'P-4',
      '12 sheets',
    ]) {
      expect(text).toContain(words);
    }
    expect(text).toContain('In all 2 papers, 15 sheets, about 75 g.');
  });

  test('carries the cautions, the guidance, the columns to tick and the lines to sign', async () => {
    const text = wholeText(await readList({ cautions: ['Mind the loose stair.'] }));
    for (const words of [
      'Lifting',
      'Dust',
      'fingers, hair, ties',
      'children',
      'staples',
      'Never unclip or feed a will, a deed, a passport or a photograph',
      'Mind the loose stair.',
      'local law decides. Ask the accountant or solicitor',
      'ISO/IEC 21964 and DIN 66399',
      'Pulled',
      'Kept back',
      'Not found',
      'Client: signature',
      'Carried out by: signature',
      'Witness: signature',
    ]) {
      expect(text).toContain(words);
    }
  });

  test.each(['draft', 'sent', 'void'] as const)(
    'says on every page that nothing may be destroyed while it is %s',
    async (status) => {
      const rows = Array.from({ length: 30 }, (_, index) => makeRow(index + 1));
      const pages = await readList({ status, rows });
      expect(pages.length).toBeGreaterThan(2);
      expect(pages[0]?.text).toMatch(/nothing on this list may be destroyed/);
      for (const page of pages) expect(page.text).toContain('nothing on it may be destroyed');
    },
  );

  test('says who approved which version, and between which days it holds', async () => {
    const text = wholeText(await readList({ status: 'approved', approval }));
    expect(text).toContain('Approved by Ada Marlow on 2 Dec 2026, version 3 of the list.');
    expect(text).toContain('before 9 Dec 2026 unless the client is present');
    expect(text).toContain('lapses after 31 Jan 2027');
    expect(text).not.toContain('may be destroyed');
  });

  test('quotes the instruction when the practice approved for the client', async () => {
    const instruction = { how: 'in-person', on: '2026-12-01', words: 'Let them all go.' };
    const text = wholeText(
      await readList({ status: 'approved', approval: { ...approval, instruction } }),
    );
    expect(text).toContain('(in person, 1 Dec 2026): “Let them all go.”');
  });

  test('warns at rows that stay, and gives them nothing to tick as pulled', async () => {
    const rows = [
      makeRow(1),
      makeRow(2, { keptBack: true, keptBackReason: 'For the accountant' }),
      makeRow(3, { blocked: [{ code: 'held', sentence: 'It is on hold.' }] }),
    ];
    const list = makeList({ rows });
    const bytes = await printShredList({ list, pictures: new Map(), ...names, paper: 'A4' });
    const [page] = await readPages(bytes);
    expect(page?.text).toContain('Kept back: For the accountant');
    expect(page?.text).toContain('Do not pull. It is on hold.');
    const heading = page?.items.find(({ words }) => words === 'Pulled');
    const picture = await drawPage(bytes, 1, 2);
    const hasBox = (paper: string) => {
      const row = page?.items.find(({ words }) => words === paper);
      if (!page || !heading || !row) throw new Error('The row or its heading is not on the page.');
      // The lower edge of a tick box lies 14 points below the top of its row, 5 below the base line.
      const x = Math.round((heading.x + heading.width / 2) * 2);
      const from = Math.round((page.height - row.y) * 2);
      return Array.from({ length: 20 }, (_, step) => (from + step) * picture.width + x).some(
        (point) => (picture.data[point * 4] ?? 255) < 100,
      );
    };
    expect(hasBox('B-03, paper 101')).toBe(true);
    expect(hasBox('B-03, paper 102')).toBe(false);
    expect(hasBox('B-03, paper 103')).toBe(false);
  });

  test('goes on over many pages: every row once, heading and footer on each', async () => {
    const rows = Array.from({ length: 250 }, (_, index) => makeRow(index + 1));
    const pages = await readList({ rows }, 'Letter');
    const text = wholeText(pages);
    for (const row of rows) {
      expect(text.split(`B-03, paper ${row.paperNumber} `)).toHaveLength(2);
    }
    pages.forEach((page, index) => {
      expect(page).toMatchObject({ width: 612, height: 792 });
      expect(page.text).toContain(`Page ${index + 1} of ${pages.length}`);
      expect(page.text).toContain('Shred list 7, version 3 | Marlow household');
      if (page.text.includes('paper 1')) expect(page.text).toContain('Date on it');
    });
    expectWithinMargins(pages);
  });

  test('cuts nothing at the edge, whatever is written, and says where a letter is missing', async () => {
    const odd = '東京電力 شركة 😀 ' + 'Donaudampfschifffahrtsgesellschaft'.repeat(6);
    const rows = [
      makeRow(1, {
        issuer: odd,
        title: odd,
        rule: 'gb.' + 'x'.repeat(200),
        ruleBasis: odd,
        sourceNote: odd,
        boxCode: 'BOX-UNDER-THE-STAIRS-'.repeat(5),
        keptBack: true,
        keptBackReason: odd.repeat(10),
        paperNumber: 123456,
        sheets: 5000,
      }),
    ];
    const instruction = { how: 'letter', on: '2026-12-01', words: odd.repeat(4) };
    const list = makeList({ rows, status: 'approved', approval: { ...approval, instruction } });
    const pages = await readPages(
      await printShredList({
        list,
        pictures: new Map(),
        practiceName: odd.repeat(3),
        householdName: odd.repeat(3),
        paper: 'A4',
      }),
    );
    expectWithinMargins(pages);
    expect(wholeText(pages)).toContain('stands for a character that this page cannot print');
  });

  test('claims nothing about a paper for which no date is known', async () => {
    const rows = [makeRow(1, { keepUntil: null, rule: null, ruleBasis: null, paperOn: null })];
    const text = wholeText(await readList({ rows }));
    expect(text).toContain('No keep-until date');
    expect(text).toContain('no date');
  });

  test('is the same file for the same list', async () => {
    const input = { list: makeList(), pictures: new Map(), ...names, paper: 'A4' as const };
    expect(await printShredList(input)).toEqual(await printShredList(input));
  });

  describe('with pictures', () => {
    let jpeg: Uint8Array;
    beforeAll(async () => {
      const red = {
        create: { width: 60, height: 80, channels: 3 as const, background: '#c00000' },
      };
      jpeg = new Uint8Array(await sharp(red).jpeg().toBuffer());
    });
    const rows = [makeRow(1, { firstPageId: idOf(501) }), makeRow(2, { firstPageId: idOf(502) })];

    const countRed = async (pictures: Map<string, Uint8Array>) => {
      const list = makeList({ rows });
      const bytes = await printShredList({ list, pictures, ...names, paper: 'A4' });
      const { data } = await drawPage(bytes, 1, 1);
      let count = 0;
      for (let at = 0; at < data.length; at += 4) {
        if ((data[at] ?? 0) > 170 && (data[at + 1] ?? 255) < 40) count += 1;
      }
      return count;
    };

    test('shows the picture of each paper', async () => {
      const one = await countRed(new Map([[idOf(501), jpeg]]));
      const two = await countRed(
        new Map([
          [idOf(501), jpeg],
          [idOf(502), jpeg],
        ]),
      );
      expect(one).toBeGreaterThan(1000);
      expect(two / one).toBeCloseTo(2, 1);
    });

    test('is printed although a picture is missing or broken', async () => {
      expect(await countRed(new Map([[idOf(501), new Uint8Array([1, 2, 3])]]))).toBe(0);
      expect(await countRed(new Map([[idOf(501), jpeg.subarray(0, 4)]]))).toBe(0);
    });
  });
});

describe('a printed destruction record', () => {
  const rows = [
    makeRow(1, { outcome: 'destroyed', sheets: 7 }),
    makeRow(2, { outcome: 'kept-back', keptBack: true, keptBackReason: 'For the accountant' }),
    makeRow(3, { outcome: 'not-found' }),
  ];

  test('says who destroyed what, when, where, how, at which level, and who watched', async () => {
    const text = wholeText(await readRecord({ rows }));
    for (const words of [
      'Shred list 7',
      '10 Dec 2026',
      'Kitchen table, 4 Quay Street',
      'Cross-cut shredder of the practice',
      'Level P-4 of ISO/IEC 21964 and DIN 66399',
      'Ada Marlow; the client was present',
      'Recorded by Robin Teal',
      'Approved by Ada Marlow on 2 Dec 2026, version 3',
      'Keep until 31 Jan 2023',
      'gb.bank-statement.self-employed',
      'Carried out by: signature',
      'Witness: signature',
    ]) {
      expect(text).toContain(words);
    }
  });

  test('counts only what was destroyed, and names what became of each row', async () => {
    const text = wholeText(await readRecord({ rows }));
    expect(text).toContain('Destroyed: 1 paper, 7 sheets, about 35 g.');
    expect(text).toMatch(/paper 101.*Destroyed.*paper 102.*Kept back.*paper 103.*Not found/);
    expect(text).toContain('For the accountant');
  });

  test('says when the client was away and no level was stated', async () => {
    const away = { ...destruction, clientPresent: false, level: null, witness: 'Kim Vale' };
    const text = wholeText(await readRecord({ rows, destruction: away }));
    expect(text).toContain('Kim Vale; the client was not present');
    expect(text).toContain('Not stated (levels are those of ISO/IEC 21964 and DIN 66399).');
  });

  test('keeps within the margins over many pages', async () => {
    const many = Array.from({ length: 120 }, (_, index) =>
      makeRow(index + 1, { outcome: 'destroyed', issuer: 'Versorgungsgesellschaft '.repeat(8) }),
    );
    const pages = await readRecord({ rows: many });
    expect(pages.length).toBeGreaterThan(5);
    expectWithinMargins(pages);
  });

  test('is not printed before the destruction was recorded', async () => {
    await expect(readRecord({ destruction: null })).rejects.toThrow(
      /not carried out yet: record the destruction first/,
    );
  });
});
