/** Cases worked by hand from published rules of Ireland; each names its source. People and papers are invented. */
import type { PublishedCase } from './published-case.ts';

export const ieCases: PublishedCase[] = [
  {
    title: 'Medical receipts',
    country: 'IE',
    class: 'medical-bill',
    inputs: { role: 'individual', claimYear: 2022, paidOn: '2022-07-19' },
    expected: { keepUntil: '2028-12-31', shredFrom: '2029-01-01' },
    source: 'TCA 1997 s.886A',
  },
  {
    title: 'Self-employed, return late',
    country: 'IE',
    class: 'sales-invoice',
    inputs: {
      role: 'self-employed',
      transactionDate: '2021-03-09',
      taxYear: 2021,
      dueOn: '2022-10-31',
      returnDeliveredOn: '2023-02-17',
    },
    expected: { keepUntil: '2029-12-31', shredFrom: '2030-01-01' },
    source: 'TCA 1997 s.886(4)',
  },
  {
    title: 'Inheritance return late',
    country: 'IE',
    class: 'estate-paper',
    inputs: {
      role: 'beneficiary',
      valuationDate: '2020-09-15',
      dueOn: '2021-10-31',
      returnReceivedOn: '2022-01-20',
    },
    expected: { keepUntil: '2028-01-20', shredFrom: '2028-01-21' },
    source: 'CATCA 2003 s.45A',
  },
];
