/** Cases worked by hand from published rules of Australia; each names its source. People and papers are invented. */
import type { PublishedCase } from './published-case.ts';

export const auCases: PublishedCase[] = [
  {
    title: 'Lodged early',
    country: 'AU',
    class: 'donation-receipt',
    inputs: {
      role: 'individual',
      incomeYearEnd: '2024-06-30',
      dueOn: '2024-10-31',
      lodgedOn: '2024-07-10',
    },
    expected: { keepUntil: '2029-10-31', shredFrom: '2029-11-01' },
    source: 'ITAA 1997 s.900-25(2); ATO, Records you need to keep',
  },
  {
    title: 'Lodged late',
    country: 'AU',
    class: 'purchase-receipt',
    inputs: {
      role: 'individual',
      workExpense: true,
      incomeYearEnd: '2023-06-30',
      dueOn: '2023-10-31',
      lodgedOn: '2024-03-08',
    },
    expected: { keepUntil: '2029-03-08', shredFrom: '2029-03-09' },
    source: 'ITAA 1997 s.900-25(2)',
  },
  {
    title: 'Shares sold either side of 30 June',
    country: 'AU',
    class: 'trade-note',
    inputs: {
      role: 'individual',
      disposedOn: '2023-07-01',
      incomeYearEnd: '2024-06-30',
      dueOn: '2024-10-31',
      lodgedOn: '2024-09-02',
    },
    expected: { keepUntil: '2029-10-31', shredFrom: '2029-11-01' },
    source: 'ITAA 1997 s.121-25, s.900-25',
  },
  {
    title: 'Sole trader',
    country: 'AU',
    class: 'sales-invoice',
    inputs: {
      role: 'self-employed',
      obtainedOn: '2019-11-20',
      transactionCompletedOn: '2020-02-29',
      noticeOfAssessmentOn: '2021-01-12',
    },
    expected: { keepUntil: '2025-02-28', shredFrom: '2025-03-01' },
    source: 'ITAA 1936 s.262A(4); ATO, Records to keep longer than five years',
  },
  {
    title: 'Company',
    country: 'AU',
    class: 'business-accounts',
    inputs: { role: 'company', transactionCompletedOn: '2018-03-31' },
    expected: { keepUntil: '2025-03-31', shredFrom: '2025-04-01' },
    source: 'Corporations Act 2001 s.286(2)',
  },
];
