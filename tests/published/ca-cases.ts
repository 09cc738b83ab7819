/** Cases worked by hand from published rules of Canada; each names its source. People and papers are invented. */
import type { PublishedCase } from './published-case.ts';

export const caCases: PublishedCase[] = [
  {
    title: 'Ordinary individual',
    country: 'CA',
    class: 'donation-receipt',
    inputs: { role: 'individual', taxYear: 2018, filedOn: '2019-04-12', dueOn: '2019-04-30' },
    expected: { keepUntil: '2024-12-31', shredFrom: '2025-01-01' },
    source: 'CRA, Where to keep your records, for how long; ITA s.230',
  },
  {
    title: '30 April on a Sunday',
    country: 'CA',
    class: 'medical-bill',
    inputs: {
      role: 'individual',
      taxYear: 2022,
      filedOn: '2023-05-01',
      dueOn: '2023-05-01',
      nominalDueOn: '2023-04-30',
    },
    expected: { keepUntil: '2028-12-31', shredFrom: '2029-01-01' },
    source: 'CRA, Where to keep your records, for how long; ITA s.230',
  },
  {
    title: 'Self-employed, one day late',
    country: 'CA',
    class: 'supplier-invoice',
    inputs: {
      role: 'self-employed',
      taxYear: 2023,
      filedOn: '2024-06-18',
      dueOn: '2024-06-17',
      nominalDueOn: '2024-06-15',
    },
    expected: { keepUntil: '2030-06-18', shredFrom: '2030-06-19' },
    source: 'CRA, Where to keep your records, for how long; ITA s.230 (5)',
  },
  {
    title: 'Corporation, fiscal year',
    country: 'CA',
    class: 'business-accounts',
    inputs: {
      role: 'company',
      financialYearEnd: '2020-11-30',
      filedOn: '2021-08-15',
      dueOn: '2021-05-31',
    },
    expected: { keepUntil: '2027-08-15', shredFrom: '2027-08-16' },
    source: 'CRA, Where to keep your records, for how long; ITA s.230',
  },
  {
    title: 'Share register',
    country: 'CA',
    class: 'company-record',
    inputs: { role: 'company', recordKind: 'share-register' },
    expected: { keepUntil: null, shredFrom: null, permanent: true },
    source: 'CRA, Where to keep your records, for how long; ITA s.230',
  },
  {
    title: 'Québec repair invoice',
    country: 'CA',
    class: 'vehicle-service',
    inputs: { role: 'household', region: 'quebec', documentDate: '2024-08-31' },
    expected: { keepUntil: '2025-02-28', shredFrom: '2025-03-01' },
    source: 'Gouvernement du Québec, Retention period (documents)',
  },
];
