import { PDFDocument } from 'pdf-lib';
import { beforeAll, describe, expect, test } from 'vitest';
import { fitText, wrapText } from '../../server/print/fit-text.ts';
import type { Typeface } from '../../server/print/typeface.ts';
import { embedTypefaces, missingSign } from '../../server/print/typeface.ts';
import { cutPicture, drawPage } from './read-pdf.ts';

let face: Typeface;
beforeAll(async () => {
  face = (await embedTypefaces(await PDFDocument.create())).regular;
});

describe('the face', () => {
  // The subsetter dropped letters whose outline has an odd length; their places stayed blank.
  test.each(['regular', 'strong'] as const)('draws every letter in weight %s', async (weight) => {
    const letters = [...'abcdefghijklmnopqrstuvwxyzABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789ßłŻéğπЖ§&@'];
    const document = await PDFDocument.create();
    const { font } = (await embedTypefaces(document))[weight];
    const page = document.addPage([letters.length * 20, 30]);
    letters.forEach((letter, index) =>
      page.drawText(letter, { x: index * 20, y: 9, size: 14, font }),
    );
    const picture = await drawPage(await document.save(), 1, 1);
    const blank = letters.filter((_, index) => {
      const cell = cutPicture(picture, index * 20, 0, 20, 30);
      return !cell.data.some((value, at) => at % 4 === 0 && value < 128);
    });
    expect(blank).toEqual([]);
  });

  test('keeps European names as they are', () => {
    for (const name of ['Łukasz Żółć', 'Søren Ångström', 'Ελένη', 'Дмитрий', 'Ñandú', 'Şişli']) {
      expect(face.clean(name)).toBe(name);
    }
  });

  test('replaces what it cannot draw, one sign a letter, and never throws', () => {
    expect(face.clean('東京 Ltd')).toBe(`${missingSign}${missingSign} Ltd`);
    expect(face.clean('👩‍👧 Ada')).toBe(`${missingSign} Ada`);
    expect(face.clean('\uD800 lone')).toBe(`${missingSign} lone`);
    expect(face.clean('ﬁne № 1')).toMatch(/^(ﬁ|fi)ne (№|No) 1$/);
  });

  test('makes one line of line breaks, tabs and control characters, and drops direction marks', () => {
    expect(face.clean(' a\r\nb\tc\u0007d ')).toBe('a b c d');
    expect(face.clean('Ada\u202Egnp.exe')).toBe('Adagnp.exe');
  });

  test('has figures of one width, so that columns of numbers stand', () => {
    const widths = new Set([...'0123456789'].map((figure) => face.measure(figure, 10)));
    expect(widths.size).toBe(1);
  });
});

describe('fitting', () => {
  test('leaves what fits and ends what does not with an ellipsis, within the width', () => {
    expect(fitText(face, 'Bank statement', 9, 200)).toBe('Bank statement');
    const cut = fitText(face, 'Bank statement of the harbour branch', 9, 80);
    expect(cut).toMatch(/^Bank state.*…$/);
    expect(face.measure(cut, 9)).toBeLessThanOrEqual(80);
    expect(fitText(face, 'Bank', 9, 1)).toBe('');
  });

  test('wraps at spaces and loses no word', () => {
    const text = 'Ask the accountant before destroying tax, legal or property papers.';
    const lines = wrapText(face, text, 9, 90);
    expect(lines.length).toBeGreaterThan(2);
    expect(lines.join(' ')).toBe(text);
    for (const line of lines) expect(face.measure(line, 9)).toBeLessThanOrEqual(90);
  });

  test('breaks a long word, after a dot or hyphen where it can', () => {
    const lines = wrapText(face, 'gb.bank-statement.self-employed', 9, 80);
    expect(lines.join('')).toBe('gb.bank-statement.self-employed');
    expect(lines.length).toBeGreaterThan(1);
    for (const line of lines.slice(0, -1)) expect(line).toMatch(/[.-]$/);
    const unbroken = wrapText(face, 'x'.repeat(100), 9, 80);
    expect(unbroken.join('')).toBe('x'.repeat(100));
    for (const line of unbroken) expect(face.measure(line, 9)).toBeLessThanOrEqual(80);
  });

  test('shows that lines were left out', () => {
    const lines = wrapText(face, 'one two three four five six seven', 9, 40, 2);
    expect(lines).toHaveLength(2);
    expect(lines[1]).toMatch(/…$/);
  });
});
