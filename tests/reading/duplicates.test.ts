import { describe, expect, test } from 'vitest';
import { findDuplicates, type ComparedPaper } from '../../server/reading/duplicates.ts';

const bill = `Brackwater Energy 3 Lock Lane Wenford electricity bill account number 7714 2209
bill date 4 March 2025 bill period 1 December 2024 to 28 February 2025 units used 686 kWh at 24.1p
standing charge 90 days at 52p 46.80 VAT at 5% 10.61 total to pay 222.74 meter 11204 11890`;

const nextBill = `Brackwater Energy 3 Lock Lane Wenford electricity bill account number 7714 2209
bill date 4 June 2025 bill period 1 March 2025 to 31 May 2025 units used 502 kWh at 24.1p
standing charge 92 days at 52p 47.84 VAT at 5% 8.44 total to pay 177.26 meter 11890 12392`;

function paper(id: string, text: string, more: Partial<ComparedPaper> = {}): ComparedPaper {
  return {
    id,
    text,
    keyDate: null,
    dates: [],
    reference: null,
    legibility: 0.9,
    ...more,
  };
}

const pairs = (...papers: ComparedPaper[]) =>
  findDuplicates(papers).map(({ better, other }) => [better, other]);

describe('one paper twice', () => {
  test('is found although the second scan has a stain and misread letters', () => {
    const stained = bill
      .replace('Lock Lane', 'L0ck Lone')
      .replace('standing charge 90 days at 52p', '')
      .replace('222.74', '222.7A');
    expect(
      pairs(
        paper('first', bill, { keyDate: '2025-03-04' }),
        paper('stained', stained, { keyDate: '2025-03-04', legibility: 0.7 }),
      ),
    ).toEqual([['first', 'stained']]);
  });

  test('is found where the date was lost on one of them', () => {
    expect(pairs(paper('a', bill, { keyDate: '2025-03-04' }), paper('b', bill))).toEqual([
      ['a', 'b'],
    ]);
  });

  test('is found where a second date was taken for the date of the paper', () => {
    expect(
      pairs(
        paper('a', bill, { keyDate: '2025-03-04', dates: ['2025-03-04', '2025-03-18'] }),
        paper('b', bill, { keyDate: '2025-03-18', dates: ['2025-03-18'] }),
      ),
    ).toEqual([['a', 'b']]);
  });

  test('offers the more legible copy as the better, wherever it came', () => {
    expect(
      pairs(paper('photo', bill, { legibility: 0.71 }), paper('pdf', bill, { legibility: 1 })),
    ).toEqual([['pdf', 'photo']]);
  });

  test('offers the fuller copy where both are as legible, else the first', () => {
    const full = `${bill} power cut call 105 moving home tell us two working days before`;
    expect(pairs(paper('short', bill), paper('full', full))).toEqual([['full', 'short']]);
    expect(pairs(paper('one', bill), paper('two', bill))).toEqual([['one', 'two']]);
  });
});

describe('two papers', () => {
  test('are not a pair when they are the bills of two quarters', () => {
    expect(
      pairs(
        paper('march', bill, { keyDate: '2025-03-04' }),
        paper('june', nextBill, { keyDate: '2025-06-04' }),
      ),
    ).toEqual([]);
    expect(pairs(paper('march', bill), paper('june', nextBill))).toEqual([]);
  });

  test('are not a pair with one word for word but another key date', () => {
    expect(
      pairs(
        paper('a', bill, { keyDate: '2025-03-04' }),
        paper('b', bill, { keyDate: '2024-03-04' }),
      ),
    ).toEqual([]);
  });

  test('are not a pair because hardly anything is printed on them', () => {
    expect(
      pairs(paper('a', 'Private and confidential'), paper('b', 'Private and confidential')),
    ).toEqual([]);
  });
});
