/** Canada: returns, objections, businesses that end, households. People and papers are invented. */
import type { HandCases } from './hand-case.ts';

const person = { role: 'individual', region: 'ontario' } as const;
const trader = { role: 'self-employed', region: 'ontario' } as const;
const quebec = { role: 'household', region: 'quebec' } as const;
const ontario = { role: 'household', region: 'ontario' } as const;

export const caHand: HandCases[] = [
  {
    country: 'CA',
    source: 'CRA, Where to keep your records, for how long; ITA s.230(4), (5); ETA s.286',
    cases: [
      [
        'filed on 30 April',
        'donation-receipt',
        { ...person, taxYear: 2018, filedOn: '2019-04-30' },
        '2024-12-31',
      ],
      [
        'filed on 1 May',
        'donation-receipt',
        { ...person, taxYear: 2018, filedOn: '2019-05-01' },
        '2025-05-01',
      ],
      [
        '30 April 2022 was a Saturday: Monday 2 May is in time',
        'medical-bill',
        { ...person, deducted: true, taxYear: 2021, filedOn: '2022-05-02' },
        '2027-12-31',
      ],
      [
        'and Tuesday 3 May is late',
        'medical-bill',
        { ...person, deducted: true, taxYear: 2021, filedOn: '2022-05-03' },
        '2028-05-03',
      ],
      [
        'day before the shift given',
        'annual-pay-statement',
        { ...person, taxYear: 2016, nominalDueOn: '2017-04-30', filedOn: '2017-05-01' },
        '2022-12-31',
      ],
      [
        'January and December of a year end together',
        'donation-receipt',
        { ...person, documentDate: '2020-01-02', filedOn: '2021-04-01' },
        '2026-12-31',
      ],
      [
        'filed late on 29 February',
        'investment-income-statement',
        { ...person, taxYear: 2022, filedOn: '2024-02-29' },
        '2030-02-28',
      ],
      [
        'self-employed until 15 June',
        'supplier-invoice',
        { ...trader, taxYear: 2022, filedOn: '2023-06-15' },
        '2028-12-31',
      ],
      [
        'self-employed on 16 June',
        'supplier-invoice',
        { ...trader, taxYear: 2022, filedOn: '2023-06-16' },
        '2029-06-16',
      ],
      [
        '15 June 2025 was a Sunday',
        'sales-invoice',
        { ...trader, taxYear: 2024, filedOn: '2025-06-16' },
        '2030-12-31',
      ],
      [
        'a landlord is due on 30 April',
        'supplier-invoice',
        { role: 'landlord', taxYear: 2022, filedOn: '2023-05-10' },
        '2029-05-10',
      ],
      [
        'corporation on the last day of the sixth month',
        'business-accounts',
        { role: 'company', financialYearEnd: '2020-11-30', filedOn: '2021-05-31' },
        '2026-11-30',
      ],
      [
        'corporation a day late',
        'business-accounts',
        { role: 'company', financialYearEnd: '2020-11-30', filedOn: '2021-06-01' },
        '2027-06-01',
      ],
      [
        'sales tax return late',
        'sales-tax-return',
        { ...trader, taxYear: 2019, dueOn: '2020-06-15', filedOn: '2020-08-08' },
        '2026-08-08',
      ],
      ['never filed', 'donation-receipt', { ...person, taxYear: 2018, filedOn: null }, 'open'],
      ['filing not known', 'donation-receipt', { ...person, taxYear: 2018 }, 'open'],
      [
        'property tax that a return used',
        'property-tax-bill',
        { ...person, usedForTax: true, taxYear: 2018, filedOn: '2019-04-12' },
        '2024-12-31',
      ],
      [
        'property tax that no return used: no rule',
        'property-tax-bill',
        { ...person, usedForTax: false, documentDate: '2010-04-12' },
        'open',
      ],
      [
        'bank statement used',
        'bank-statement',
        { ...person, usedForTax: true, taxYear: 2018, filedOn: '2019-04-12' },
        '2024-12-31',
      ],
      [
        'bank statement of a tax year, use not known',
        'bank-statement',
        { ...person, documentDate: '2018-03-31', taxYear: 2018, filedOn: '2019-04-12' },
        '2024-12-31',
      ],
      [
        'statement of an individual, use not known: counts as used',
        'bank-statement',
        { ...person, documentDate: '2018-03-31', filedOn: '2019-04-12' },
        '2024-12-31',
      ],
      [
        'and open while the filing is not known either',
        'bank-statement',
        { ...person, documentDate: '2018-03-31' },
        'open',
      ],
      [
        'loss carried forward to 2020',
        'investment-statement',
        { ...person, disposedOn: '2016-05-05', taxYear: 2020, filedOn: '2021-04-12' },
        '2026-12-31',
      ],
    ],
  },
  {
    country: 'CA',
    source: 'ITA s.230(6)',
    cases: [
      [
        'decided within the six years',
        'tax-assessment',
        {
          ...person,
          taxYear: 2018,
          filedOn: '2019-04-12',
          objection: { resolvedOn: '2020-05-05', furtherAppealExpiresOn: '2020-08-03' },
        },
        '2024-12-31',
      ],
      [
        'decided later',
        'tax-assessment',
        {
          ...person,
          taxYear: 2018,
          filedOn: '2019-04-12',
          objection: { resolvedOn: '2025-06-06', furtherAppealExpiresOn: '2025-09-04' },
        },
        '2025-09-04',
      ],
      [
        'further appeal runs beyond the day asked about',
        'tax-assessment',
        {
          ...person,
          taxYear: 2018,
          filedOn: '2019-04-12',
          objection: { resolvedOn: '2026-11-06', furtherAppealExpiresOn: '2027-02-04' },
        },
        '2027-02-04',
      ],
      [
        'further appeal still running',
        'tax-assessment',
        {
          ...person,
          taxYear: 2018,
          filedOn: '2019-04-12',
          objection: { resolvedOn: '2025-06-06', furtherAppealExpiresOn: null },
        },
        'open',
      ],
      [
        'not decided',
        'tax-assessment',
        { ...person, taxYear: 2018, filedOn: '2019-04-12', objection: { resolvedOn: null } },
        'open',
      ],
    ],
  },
  {
    country: 'CA',
    source: 'CRA; IC78-10R5; Income Tax Regulations 5800',
    cases: [
      [
        'minutes',
        'company-record',
        { role: 'company', recordKind: 'minutes-or-resolution', meetingDate: '2001-01-01' },
        'permanent',
      ],
      [
        'deed of a company',
        'property-deed',
        { role: 'company', disposedOn: '2001-01-01' },
        'permanent',
      ],
      ['deed of a home', 'property-deed', { ...ontario, disposedOn: null }, 'open'],
      [
        'home sold',
        'property-deed',
        { ...ontario, disposedOn: '2017-06-06', filedOn: '2018-04-15' },
        '2023-12-31',
      ],
      [
        'shares sold, return late',
        'trade-note',
        { ...person, disposedOn: '2017-06-06', filedOn: '2018-05-02' },
        '2024-05-02',
      ],
      [
        'business ended',
        'supplier-invoice',
        { ...trader, taxYear: 2015, filedOn: '2016-06-01', endedOn: '2018-03-31' },
        '2024-12-31',
      ],
      [
        'dissolved: two years are later',
        'supplier-invoice',
        {
          role: 'company',
          financialYearEnd: '2015-12-31',
          filedOn: '2016-06-01',
          endedOn: '2021-02-15',
        },
        '2023-02-15',
      ],
      [
        'dissolved: six years are later',
        'supplier-invoice',
        {
          role: 'company',
          financialYearEnd: '2019-12-31',
          filedOn: '2020-06-01',
          endedOn: '2021-02-15',
        },
        '2025-12-31',
      ],
      [
        'clearance certificate',
        'tax-return',
        { role: 'legal-representative', taxYear: 2022, clearanceCertificateOn: '2024-02-10' },
        '2024-02-10',
      ],
      [
        'no clearance certificate',
        'tax-return',
        { role: 'legal-representative', taxYear: 2012, clearanceCertificateOn: null },
        'open',
      ],
    ],
  },
  {
    country: 'CA',
    source: 'Gouvernement du Québec, Retention period (documents); Civil Code art. 2925',
    cases: [
      [
        'repair: six months from 31 March',
        'vehicle-service',
        { ...quebec, documentDate: '2025-03-31' },
        '2025-09-30',
      ],
      ['telephone', 'telecom-bill', { ...quebec, documentDate: '2022-06-01' }, '2025-06-01'],
      ['electricity', 'utility-bill', { ...quebec, documentDate: '2024-02-29' }, '2027-02-28'],
      [
        'property tax',
        'property-tax-bill',
        { ...quebec, documentDate: '2022-02-01' },
        '2025-02-01',
      ],
      [
        'medical bill not claimed',
        'medical-bill',
        { ...quebec, deducted: false, documentDate: '2022-06-01' },
        '2025-06-01',
      ],
      ['pay slip', 'payslip', { ...quebec, documentDate: '2019-06-30' }, '2025-06-30'],
      [
        'mortgage released',
        'loan-settlement',
        { ...quebec, documentDate: '2019-05-05' },
        '2025-05-05',
      ],
      [
        'warranty of a thing owned',
        'warranty',
        { ...quebec, warrantyEndsOn: '2020-01-01', disposedOn: null },
        'open',
      ],
      [
        'big purchase owned',
        'purchase-receipt',
        { ...quebec, usedForTax: false, documentDate: '2015-01-01', disposedOn: null },
        'open',
      ],
      ['home purchase', 'property-deed', { ...quebec, disposedOn: '2010-01-01' }, 'permanent'],
      [
        'separation judgment',
        'court-document',
        { ...quebec, documentKind: 'separation-judgment' },
        'permanent',
      ],
      ['diploma', 'education-certificate', { ...quebec }, 'permanent'],
    ],
  },
  {
    country: 'CA',
    source: 'Limitations Act, 2002 (Ont.) ss.4, 5, 15 and those of other provinces',
    cases: [
      [
        'mortgage running',
        'mortgage-statement',
        { ...ontario, documentDate: '2015-12-31', endedOn: null },
        'open',
      ],
      [
        'mortgage paid off',
        'mortgage-statement',
        { ...ontario, documentDate: '2015-12-31', endedOn: '2023-05-31' },
        '2025-05-31',
      ],
      ['lease ended', 'tenancy-agreement', { ...ontario, endedOn: '2022-08-31' }, '2024-08-31'],
      [
        'card statement of 29 February',
        'card-statement',
        { ...ontario, documentDate: '2024-02-29' },
        '2026-02-28',
      ],
      [
        'repair outside Québec',
        'vehicle-service',
        { ...ontario, documentDate: '2024-01-01' },
        '2026-01-01',
      ],
      [
        'receipt from delivery',
        'purchase-receipt',
        {
          role: 'household',
          region: 'alberta',
          documentDate: '2024-01-01',
          deliveredOn: '2024-01-20',
        },
        '2026-01-20',
      ],
      ['warranty ended', 'warranty', { ...ontario, warrantyEndsOn: '2024-01-01' }, '2026-01-01'],
      [
        'province not known: six years',
        'loan-agreement',
        { role: 'household', endedOn: '2019-02-02' },
        '2025-02-02',
      ],
      ['estate closed', 'estate-paper', { ...ontario, endedOn: '2023-03-03' }, '2025-03-03'],
      [
        'benefit: no rule',
        'benefit-award',
        { ...ontario, documentDate: '2001-01-01', endedOn: '2002-01-01' },
        'open',
      ],
      ['employment: no rule', 'employment-contract', { ...ontario, endedOn: '2002-01-01' }, 'open'],
      [
        'judgment: no rule',
        'court-document',
        { ...ontario, documentKind: 'judgment', finalOn: '2002-01-01' },
        'open',
      ],
    ],
  },
];
