/** Australia: lodgement, gains, business, employees, households. People and papers are invented. */
import type { HandCases } from './hand-case.ts';

const person = { role: 'individual' } as const;
const trader = { role: 'self-employed' } as const;
const nsw = { role: 'household', region: 'NSW' } as const;

export const auHand: HandCases[] = [
  {
    country: 'AU',
    source: 'ITAA 1997 s.900-25; ATO, Records you need to keep',
    cases: [
      [
        'lodged on the due day',
        'donation-receipt',
        { ...person, incomeYearEnd: '2023-06-30', lodgedOn: '2023-10-31' },
        '2028-10-31',
      ],
      [
        'lodged a day late',
        'donation-receipt',
        { ...person, incomeYearEnd: '2023-06-30', lodgedOn: '2023-11-01' },
        '2028-11-01',
      ],
      [
        'agent’s programme, lodged before its due day',
        'annual-pay-statement',
        { ...person, incomeYearEnd: '2023-06-30', dueOn: '2024-05-15', lodgedOn: '2024-05-01' },
        '2029-05-15',
      ],
      [
        'lodged on 29 February',
        'tax-return',
        { ...person, incomeYearEnd: '2023-06-30', lodgedOn: '2024-02-29' },
        '2029-02-28',
      ],
      [
        'pay slip of 30 June',
        'payslip',
        { ...person, documentDate: '2023-06-30', lodgedOn: '2023-08-01' },
        '2028-10-31',
      ],
      [
        'pay slip of 1 July',
        'payslip',
        { ...person, documentDate: '2023-07-01', lodgedOn: '2024-08-01' },
        '2029-10-31',
      ],
      [
        'never lodged',
        'donation-receipt',
        { ...person, incomeYearEnd: '2018-06-30', lodgedOn: null },
        'open',
      ],
      ['lodging not known', 'donation-receipt', { ...person, incomeYearEnd: '2018-06-30' }, 'open'],
      [
        'dispute running',
        'tax-assessment',
        {
          ...person,
          incomeYearEnd: '2018-06-30',
          lodgedOn: '2018-08-01',
          objection: { resolvedOn: null },
        },
        'open',
      ],
      [
        'dispute ended later',
        'tax-assessment',
        {
          ...person,
          incomeYearEnd: '2018-06-30',
          lodgedOn: '2018-08-01',
          objection: { resolvedOn: '2025-03-03' },
        },
        '2025-03-03',
      ],
      [
        'no work expense: six years from delivery',
        'purchase-receipt',
        { ...person, workExpense: false, deliveredOn: '2020-01-01' },
        '2026-01-01',
      ],
      [
        'said not to be used for tax',
        'purchase-receipt',
        { ...nsw, usedForTax: false, deliveredOn: '2020-01-01' },
        '2026-01-01',
      ],
      [
        'work expense not known: six years from the receipt are longer',
        'purchase-receipt',
        { ...person, documentDate: '2023-05-05', lodgedOn: '2023-08-08' },
        '2029-05-05',
      ],
    ],
  },
  {
    country: 'AU',
    source: 'ITAA 1997 s.121-25, s.900-25; Corporations Act 2001 s.286(2)',
    cases: [
      [
        'sold on 30 June',
        'trade-note',
        { ...person, disposedOn: '2023-06-30', lodgedOn: '2023-09-02' },
        '2028-10-31',
      ],
      [
        'sold, lodged late',
        'property-deed',
        { ...person, disposedOn: '2023-06-30', lodgedOn: '2025-03-03' },
        '2030-03-03',
      ],
      [
        'not sold',
        'home-improvement-invoice',
        { ...person, disposedOn: null, lodgedOn: '2023-09-02' },
        'open',
      ],
      [
        'loss carried forward to 2024-25',
        'investment-statement',
        {
          ...person,
          disposedOn: '2020-05-05',
          incomeYearEnd: '2025-06-30',
          lodgedOn: '2025-09-01',
        },
        '2030-10-31',
      ],
      [
        'asset of a company',
        'trade-note',
        { role: 'company', disposedOn: '2018-05-05' },
        '2025-05-05',
      ],
    ],
  },
  {
    country: 'AU',
    source: 'ITAA 1936 s.262A(4); TAA 1953 Sch 1 s.382-5; Corporations Act 2001 s.286(2)',
    cases: [
      [
        'obtained after completion',
        'supplier-invoice',
        { ...trader, obtainedOn: '2019-11-20', transactionCompletedOn: '2019-10-01' },
        '2024-11-20',
      ],
      [
        'review period is later',
        'sales-invoice',
        {
          ...trader,
          obtainedOn: '2019-11-20',
          transactionCompletedOn: '2019-12-01',
          noticeOfAssessmentOn: '2023-12-01',
        },
        '2025-12-01',
      ],
      [
        'amended assessment',
        'sales-invoice',
        {
          ...trader,
          obtainedOn: '2019-11-20',
          transactionCompletedOn: '2019-12-01',
          noticeOfAssessmentOn: '2021-12-01',
          amendedOn: '2024-06-06',
        },
        '2026-06-06',
      ],
      [
        'not assessed yet',
        'sales-invoice',
        {
          ...trader,
          obtainedOn: '2019-11-20',
          transactionCompletedOn: '2019-12-01',
          noticeOfAssessmentOn: null,
        },
        'open',
      ],
      [
        'not completed',
        'sales-invoice',
        { ...trader, obtainedOn: '2019-11-20', transactionCompletedOn: null },
        'open',
      ],
      ['completion not known', 'sales-invoice', { ...trader, obtainedOn: '2019-11-20' }, 'open'],
      [
        'company, completed on 29 February',
        'sales-invoice',
        { role: 'company', transactionCompletedOn: '2016-02-29' },
        '2023-02-28',
      ],
      [
        'company, not completed',
        'sales-invoice',
        { role: 'company', transactionCompletedOn: null, financialYearEnd: '2016-06-30' },
        'open',
      ],
      [
        'company, four years of review',
        'sales-invoice',
        {
          role: 'company',
          transactionCompletedOn: '2017-03-31',
          noticeOfAssessmentOn: '2021-01-12',
        },
        '2025-01-12',
      ],
    ],
  },
  {
    country: 'AU',
    source: 'Fair Work Act 2009 s.535; SIS Act 1993 ss.103, 105; limitation acts of the states',
    cases: [
      [
        'employee record',
        'payroll-record',
        { role: 'employer', documentDate: '2018-06-30' },
        '2025-06-30',
      ],
      [
        'minutes of an own fund',
        'pension-statement',
        { ...person, documentKind: 'fund-minutes', meetingDate: '2015-07-07' },
        '2025-07-07',
      ],
      [
        'accounts of an own fund',
        'pension-statement',
        { ...person, documentKind: 'fund-accounts', financialYearEnd: '2019-06-30' },
        '2024-06-30',
      ],
      [
        'mortgage running',
        'mortgage-statement',
        { ...nsw, documentDate: '2015-12-31', endedOn: null },
        'open',
      ],
      ['utility bill', 'utility-bill', { ...nsw, documentDate: '2020-01-05' }, '2026-01-05'],
      [
        'utility bill in the Northern Territory',
        'utility-bill',
        { role: 'household', region: 'NT', documentDate: '2020-01-05' },
        '2023-01-05',
      ],
      [
        'tenancy ended, state not known',
        'tenancy-agreement',
        { role: 'household', endedOn: '2020-02-29' },
        '2026-02-28',
      ],
      [
        'medical bill not claimed',
        'medical-bill',
        { ...nsw, deducted: false, documentDate: '2020-01-05' },
        '2026-01-05',
      ],
      ['employment: no rule', 'employment-contract', { ...nsw, endedOn: '2002-01-01' }, 'open'],
      [
        'rates: no rule',
        'property-tax-bill',
        { ...nsw, usedForTax: false, documentDate: '2002-01-01' },
        'open',
      ],
      ['will', 'will', { ...nsw }, 'permanent'],
    ],
  },
];
