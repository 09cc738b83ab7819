/** Cases worked by hand from published rules of Germany; each names its source. People and papers are invented. */
import type { PublishedCase } from './published-case.ts';

export const deCases: PublishedCase[] = [
  {
    title: 'Invoice of 2015 and the change of 2025',
    country: 'DE',
    class: 'supplier-invoice',
    inputs: { role: 'self-employed', documentDate: '2015-06-03' },
    expected: { keepUntil: '2024-12-31', shredFrom: '2025-01-01' },
    source: 'AO §147(3); Art.97 §19a EGAO',
  },
  {
    title: 'Invoice of 2017',
    country: 'DE',
    class: 'sales-invoice',
    inputs: { role: 'self-employed', documentDate: '2017-12-31' },
    expected: { keepUntil: '2025-12-31', shredFrom: '2026-01-01' },
    source: 'AO §147(3), (4); UStG §14b',
  },
  {
    title: 'Annual accounts',
    country: 'DE',
    class: 'business-accounts',
    inputs: {
      role: 'self-employed',
      documentKind: 'annual-accounts',
      financialYearEnd: '2016-12-31',
      drawnUpOn: '2017-05-22',
    },
    expected: { keepUntil: '2027-12-31', shredFrom: '2028-01-01' },
    source: 'AO §147(1) Nr.1, (4); HGB §257',
  },
  {
    title: 'Gardener, private household',
    country: 'DE',
    class: 'home-improvement-invoice',
    inputs: { role: 'household', invoiceDate: '2023-11-08', buildingWork: false },
    expected: { keepUntil: '2025-12-31', shredFrom: '2026-01-01' },
    source: 'UStG §14b(1) S.5',
  },
];
