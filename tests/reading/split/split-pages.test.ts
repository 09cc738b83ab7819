import { describe, expect, test } from 'vitest';
import { isSeparator, splitPages } from '../../../server/reading/split/split-pages.ts';
import { pageOfText, pagesOfText } from '../support/page-of-text.ts';

const energyBill = `
# Brackwater Energy
3 Lock Lane, Wenford WN1 2AB      Tel 01632 960111
Mr P Olander
9 Birch Walk
Wenford WN4 5CD
Electricity bill        Bill date 4 March 2025
Account number 7714 2209
Total to pay  £184.20`;

const energyBillBack = `
Units used and prices
Reading 1 Dec 2024  11204   Reading 1 Mar 2025  11890
Unit price 24.1p per kWh   Standing charge 52.0p per day
Tariff Standard Variable
Electricity used 686 kWh
Complaints are answered within eight weeks.`;

const council = `
# Wenford Borough Council
Civic Offices, Wenford WN1 1AA     www.wenford.example
Council Tax bill 2025/26
Mr P Olander
9 Birch Walk
Wenford WN4 5CD
Date 10 March 2025    Account reference 30041882
Band D  Total to pay  £1,998.40`;

const letter = `
Dr A Quill
Wenford Surgery, Mill Road, Wenford WN2 3EF
12 May 2025
Dear Mr Olander
Your blood test results are normal. Please make an appointment to review your medication
with the practice nurse within the next three months.
Yours sincerely`;

function payslip(month: string, date: string, net: string): string {
  return `
# Holt Joinery Limited    PAY ADVICE
Employee Olander P    Payroll number 114    Tax period Month ${month}
Pay date ${date}   NI number QQ123456C   Tax code 1257L
Payments  Basic pay 2,300.00     Deductions  PAYE tax 250.40
Net pay ${net}`;
}

function statement(number: number, page: string, rows: string): string {
  return `
# Corrin Bank
Current account statement   Sort code 01-02-03
Account number 33445566   Statement number ${number}
${page}
Date   Details   Money out   Money in   Balance
${rows}`;
}

const starts = (pages: Parameters<typeof splitPages>[0]) =>
  splitPages(pages).map((span) => [span.from, span.to]);

describe('a pile', () => {
  test('is cut where another letterhead begins', () => {
    const pages = pagesOfText(
      energyBill,
      council,
      letter,
      payslip('1', '30 April 2025', '1,870.00'),
      letter,
    );
    expect(starts(pages)).toEqual([
      [1, 1],
      [2, 2],
      [3, 3],
      [4, 4],
      [5, 5],
    ]);
  });

  test('keeps a page without any head with the page before it', () => {
    const pages = pagesOfText(council, energyBill, energyBillBack, letter, council);
    expect(starts(pages)).toEqual([
      [1, 1],
      [2, 3],
      [4, 4],
      [5, 5],
    ]);
  });

  test('is cut between two pay slips that differ in month and figures only', () => {
    const pages = pagesOfText(
      payslip('1', '30 April 2025', '1,870.00'),
      payslip('2', '30 May 2025', '1,871.20'),
      payslip('3', '30 June 2025', '1,869.90'),
      council,
      letter,
    );
    expect(starts(pages).map(([from]) => from)).toEqual([1, 2, 3, 4, 5]);
  });

  test('follows printed page numbers, also misread ones, rather than letterheads', () => {
    const rows = '3 May  CARD GROCER  12.10    904.00\n4 May  CARD FUEL  40.00    864.00';
    const pages = pagesOfText(
      statement(8, 'Page 1 of 2', rows),
      statement(8, 'Page 2 0f 2', rows),
      statement(9, 'Page 1of 2', rows),
      statement(9, 'Page 2 of 2', rows),
      letter,
    );
    expect(starts(pages)).toEqual([
      [1, 2],
      [3, 4],
      [5, 5],
    ]);
  });

  test('takes statements without page numbers apart by the number of the statement', () => {
    const rows = '3 May  CARD GROCER  12.10    904.00';
    const pages = pagesOfText(
      statement(8, '', rows),
      statement(8, '', rows),
      statement(9, '', rows),
      letter,
      council,
    );
    expect(starts(pages)).toEqual([
      [1, 2],
      [3, 3],
      [4, 4],
      [5, 5],
    ]);
  });

  test('gives a blank back to the paper before it', () => {
    const pages = pagesOfText(council, '', letter, '', energyBill, energyBillBack);
    expect(starts(pages)).toEqual([
      [1, 2],
      [3, 4],
      [5, 6],
    ]);
  });

  test('begins no paper on a back when both sides were scanned', () => {
    const pages = pagesOfText(energyBill, council, letter, '', council, '');
    expect(starts(pages).map(([from]) => from)).toEqual([1, 3, 5]);
  });

  test('keeps numbered clauses together that go on over the page', () => {
    const agreement = `
# Tenancy agreement
between Ann Lister (landlord) and P Olander (tenant)   Date 1 June 2024
1. The tenant pays rent of £900 a month.
2. The tenant keeps the garden tidy.`;
    const more = `
3. The tenant must not sub-let.
4. The landlord keeps the structure in repair.
5. Notice is two months.`;
    expect(starts(pagesOfText(council, agreement, more, letter, council))).toEqual([
      [1, 1],
      [2, 3],
      [4, 4],
      [5, 5],
    ]);
  });
});

describe('separator sheets', () => {
  test('always cut, and belong to no paper', () => {
    const sheet = pageOfText('SEPARATOR', 2, { code: 'SLACKWATER:SEPARATOR:1' });
    const pages = [
      pageOfText(energyBill, 1),
      sheet,
      pageOfText(energyBillBack, 3),
      pageOfText('', 4),
    ];
    expect(isSeparator(sheet)).toBe(true);
    expect(starts(pages)).toEqual([
      [1, 1],
      [3, 4],
    ]);
  });

  test('are not taken for other codes', () => {
    expect(isSeparator(pageOfText('x', 1, { code: 'https://pay.example/1' }))).toBe(false);
  });
});

describe('a short file', () => {
  test('is one paper although its second page has a heading of its own', () => {
    const terms = `
Terms and conditions of supply
1. These terms apply to every supply made on or after 1 March 2025.
2. We read meters twice a year.`;
    expect(starts(pagesOfText(energyBill, terms))).toEqual([[1, 2]]);
  });

  test('of nothing but blank pages is one paper', () => {
    expect(starts(pagesOfText('', ''))).toEqual([[1, 2]]);
  });

  test('without pages has no papers', () => {
    expect(splitPages([])).toEqual([]);
  });
});
