/** Germany: vouchers, books, letters, building work, private papers. People and papers are invented. */
import type { HandCases } from './hand-case.ts';

const trader = { role: 'self-employed' } as const;
const home = { role: 'household' } as const;

export const deHand: HandCases[] = [
  {
    country: 'DE',
    source: 'AO §147; Art. 97 §19a EGAO; HGB §257; EStG §41',
    cases: [
      [
        '2014: eight years are over, ten until the change',
        'supplier-invoice',
        { ...trader, documentDate: '2014-01-02' },
        '2024-12-31',
      ],
      [
        '2016: ten years would be 2026',
        'sales-invoice',
        { ...trader, invoiceDate: '2016-12-31' },
        '2024-12-31',
      ],
      [
        '2013: ten years, over before the change',
        'supplier-invoice',
        { ...trader, documentDate: '2013-12-31' },
        '2023-12-31',
      ],
      [
        'statement of a business',
        'bank-statement',
        { ...trader, usedForTax: true, documentDate: '2018-05-05' },
        '2026-12-31',
      ],
      [
        'statement of a business, use not known',
        'bank-statement',
        { role: 'company', documentDate: '2018-05-05' },
        '2026-12-31',
      ],
      [
        'wage voucher',
        'payroll-record',
        { role: 'employer', documentDate: '2017-05-05' },
        '2025-12-31',
      ],
      [
        'wage account',
        'payroll-record',
        { role: 'employer', recordKind: 'wage-account', documentDate: '2019-05-05' },
        '2025-12-31',
      ],
      [
        'accounts count from drawing up',
        'business-accounts',
        {
          ...trader,
          documentKind: 'annual-accounts',
          financialYearEnd: '2014-12-31',
          drawnUpOn: '2015-01-02',
        },
        '2025-12-31',
      ],
      [
        'drawing up not known',
        'business-accounts',
        { ...trader, documentKind: 'annual-accounts', financialYearEnd: '2010-12-31' },
        'open',
      ],
      [
        'ledger counts from its last entry',
        'business-accounts',
        { ...trader, documentKind: 'ledger', documentDate: '2015-12-31' },
        '2025-12-31',
      ],
      [
        'letter received',
        'service-contract',
        { ...trader, documentKind: 'business-letter', receivedOn: '2018-03-05' },
        '2024-12-31',
      ],
      [
        'letter sent',
        'service-contract',
        { role: 'company', documentKind: 'business-letter', writtenOn: '2019-12-31' },
        '2025-12-31',
      ],
      [
        'contract of a business that ended',
        'service-contract',
        { ...trader, receivedOn: '2018-03-05', endedOn: '2023-05-05' },
        '2026-12-31',
      ],
      [
        'contract of a business that runs',
        'service-contract',
        { ...trader, receivedOn: '2018-03-05', endedOn: null },
        'open',
      ],
      [
        'receipt of a business',
        'purchase-receipt',
        { ...trader, usedForTax: true, documentDate: '2018-06-06', deliveredOn: '2018-06-10' },
        '2026-12-31',
      ],
    ],
  },
  {
    country: 'DE',
    source: 'UStG §14b(1) S. 5; BGB §634a',
    cases: [
      [
        'garden of a self-employed person',
        'home-improvement-invoice',
        {
          role: 'self-employed',
          usedForTax: false,
          buildingWork: false,
          invoiceDate: '2023-11-08',
        },
        '2025-12-31',
      ],
      [
        'building work accepted',
        'home-improvement-invoice',
        { ...home, invoiceDate: '2020-06-06', buildingWork: true, acceptedOn: '2020-07-01' },
        '2025-07-01',
      ],
      [
        'not accepted yet',
        'home-improvement-invoice',
        { ...home, invoiceDate: '2020-06-06', buildingWork: true, acceptedOn: null },
        'open',
      ],
      [
        'building work not known',
        'home-improvement-invoice',
        { ...home, invoiceDate: '2020-06-06' },
        'open',
      ],
      [
        'accepted on 29 February',
        'home-improvement-invoice',
        { ...home, invoiceDate: '2020-03-06', buildingWork: true, acceptedOn: '2020-02-29' },
        '2025-02-28',
      ],
    ],
  },
  {
    country: 'DE',
    source: 'BGB §§195, 197, 199, 201, 438',
    cases: [
      [
        'statement of 1 January',
        'bank-statement',
        { ...home, usedForTax: false, documentDate: '2022-01-01' },
        '2025-12-31',
      ],
      [
        'statement of 31 December',
        'card-statement',
        { ...home, documentDate: '2021-12-31' },
        '2024-12-31',
      ],
      ['tenancy ended', 'tenancy-agreement', { ...home, endedOn: '2021-06-30' }, '2024-12-31'],
      ['tenancy running', 'tenancy-agreement', { ...home, endedOn: null }, 'open'],
      ['membership ended', 'membership', { ...home, endedOn: '2021-01-01' }, '2024-12-31'],
      ['policy ended', 'insurance-policy', { ...home, endedOn: '2022-12-31' }, '2025-12-31'],
      [
        'goods: two years from delivery',
        'purchase-receipt',
        { ...home, documentDate: '2024-02-20', deliveredOn: '2024-02-29' },
        '2026-02-28',
      ],
      [
        'judgment: thirty years',
        'court-document',
        { ...home, documentKind: 'judgment', finalOn: '1995-04-04' },
        '2025-04-04',
      ],
      [
        'divorce',
        'court-document',
        { ...home, documentKind: 'divorce-decree', finalOn: '1965-04-04' },
        'permanent',
      ],
    ],
  },
  {
    country: 'DE',
    source: 'Deutsche Rentenversicherung; AO §§169, 170',
    cases: [
      [
        'pay slip until the pension account is cleared',
        'payslip',
        { role: 'individual', documentDate: '2001-01-31' },
        'open',
      ],
      [
        'the end of the job clears nothing',
        'annual-pay-statement',
        { role: 'individual', documentDate: '2001-12-31', endedOn: '2002-01-31' },
        'open',
      ],
      [
        'filed in the next year',
        'tax-return',
        { role: 'individual', taxYear: 2019, filedOn: '2020-05-05' },
        '2024-12-31',
      ],
      [
        'filed two years later',
        'tax-assessment',
        { role: 'individual', taxYear: 2019, filedOn: '2021-02-02' },
        '2025-12-31',
      ],
      [
        'not filed: starts three years later',
        'donation-receipt',
        { role: 'individual', taxYear: 2018, filedOn: null },
        '2025-12-31',
      ],
      ['filing not known', 'tax-return', { role: 'individual', taxYear: 2010 }, 'open'],
      ['medical opinion', 'medical-record', { ...home }, 'permanent'],
      ['deed', 'property-deed', { ...home, disposedOn: '2001-01-01' }, 'permanent'],
      ['employment: no rule', 'employment-contract', { ...home, endedOn: '2001-01-01' }, 'open'],
      [
        'VAT return: no rule',
        'sales-tax-return',
        { ...trader, documentDate: '2001-01-01' },
        'open',
      ],
    ],
  },
];
