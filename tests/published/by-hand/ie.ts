/** Ireland: reliefs, business, VAT, gifts, wages, contracts. People and papers are invented. */
import type { HandCases } from './hand-case.ts';

const person = { role: 'individual' } as const;
const trader = { role: 'self-employed', vatRegistered: false } as const;
const home = { role: 'household' } as const;

export const ieHand: HandCases[] = [
  {
    country: 'IE',
    source: 'TCA 1997 s.886A; Finance Act 2005 s.25',
    cases: [
      [
        'the year claimed for, not the year paid',
        'medical-bill',
        { ...person, claimYear: 2022, paidOn: '2021-12-30' },
        '2028-12-31',
      ],
      [
        'the year paid where none is claimed',
        'medical-bill',
        { ...person, paidOn: '2022-01-01' },
        '2028-12-31',
      ],
      ['gift', 'donation-receipt', { ...person, taxYear: 2021 }, '2027-12-31'],
      ['pay slip', 'payslip', { ...person, documentDate: '2019-02-02' }, '2025-12-31'],
      [
        'enquiry open',
        'annual-pay-statement',
        { ...person, taxYear: 2018, enquiry: { openedOn: '2023-05-05', closedOn: null } },
        'open',
      ],
      [
        'enquiry closed later',
        'annual-pay-statement',
        { ...person, taxYear: 2018, enquiry: { openedOn: '2023-05-05', closedOn: '2026-03-03' } },
        '2026-03-03',
      ],
      [
        'no relief claimed: six years from the bill',
        'medical-bill',
        { ...home, deducted: false, documentDate: '2019-04-04' },
        '2025-04-04',
      ],
    ],
  },
  {
    country: 'IE',
    source: 'TCA 1997 s.886(4); Revenue eBrief 33/2015; Companies Act 2014 s.285',
    cases: [
      [
        'delivered on 31 October',
        'sales-invoice',
        { ...trader, taxYear: 2021, returnDeliveredOn: '2022-10-31' },
        '2027-12-31',
      ],
      [
        'delivered on 1 November',
        'sales-invoice',
        { ...trader, taxYear: 2021, returnDeliveredOn: '2022-11-01' },
        '2028-12-31',
      ],
      [
        'pay-and-file day given',
        'sales-invoice',
        { ...trader, taxYear: 2021, dueOn: '2022-11-16', returnDeliveredOn: '2022-11-16' },
        '2027-12-31',
      ],
      [
        'year of the transaction',
        'supplier-invoice',
        { ...trader, transactionDate: '2020-12-31', returnDeliveredOn: '2021-10-01' },
        '2026-12-31',
      ],
      [
        'completed in the next year',
        'supplier-invoice',
        {
          ...trader,
          taxYear: 2020,
          transactionCompletedOn: '2021-02-01',
          returnDeliveredOn: '2022-10-01',
        },
        '2027-12-31',
      ],
      [
        'never delivered',
        'business-accounts',
        { ...trader, taxYear: 2017, returnDeliveredOn: null },
        'open',
      ],
      ['delivery not known', 'business-accounts', { role: 'landlord', taxYear: 2017 }, 'open'],
      [
        'shares sold',
        'trade-note',
        { ...person, disposedOn: '2018-05-05', returnDeliveredOn: '2019-10-01' },
        '2024-12-31',
      ],
      [
        'shares kept',
        'trade-note',
        { ...person, disposedOn: null, returnDeliveredOn: '2019-10-01' },
        'open',
      ],
      [
        'company',
        'business-accounts',
        { role: 'company', financialYearEnd: '2018-03-31', returnDeliveredOn: '2018-12-01' },
        '2024-03-31',
      ],
      [
        'company, late',
        'business-accounts',
        {
          role: 'company',
          financialYearEnd: '2018-03-31',
          dueOn: '2018-12-23',
          returnDeliveredOn: '2019-01-15',
        },
        '2025-12-31',
      ],
      [
        'accounts among the company’s papers',
        'company-record',
        { role: 'company', recordKind: 'accounts', financialYearEnd: '2019-12-31' },
        '2025-12-31',
      ],
      [
        'minutes',
        'company-record',
        { role: 'company', recordKind: 'minutes-or-resolution', meetingDate: '2001-01-01' },
        'permanent',
      ],
    ],
  },
  {
    country: 'IE',
    source: 'VATCA 2010 ss.84, 91; CATCA 2003 s.45A',
    cases: [
      [
        'one-stop shop',
        'sales-invoice',
        {
          role: 'self-employed',
          oneStopShop: true,
          supplyDate: '2022-05-05',
          taxYear: 2022,
          returnDeliveredOn: '2023-10-01',
        },
        '2032-12-31',
      ],
      [
        'VAT return',
        'sales-tax-return',
        { role: 'self-employed', documentDate: '2020-01-15' },
        '2026-01-15',
      ],
      [
        'valued on 31 August: due that October',
        'estate-paper',
        { role: 'beneficiary', valuationDate: '2020-08-31', returnReceivedOn: '2020-10-31' },
        '2026-08-31',
      ],
      [
        'received a day late',
        'estate-paper',
        { role: 'beneficiary', valuationDate: '2020-08-31', returnReceivedOn: '2020-11-01' },
        '2026-11-01',
      ],
      [
        'valued on 1 September: due the October after',
        'estate-paper',
        { role: 'beneficiary', valuationDate: '2020-09-01', returnReceivedOn: '2021-10-31' },
        '2026-09-01',
      ],
      [
        'corrected return',
        'estate-paper',
        {
          role: 'beneficiary',
          valuationDate: '2020-09-01',
          returnReceivedOn: '2021-10-31',
          amendedReturnReceivedOn: '2023-03-03',
        },
        '2029-03-03',
      ],
      [
        'no return received',
        'estate-paper',
        { role: 'beneficiary', valuationDate: '2010-09-01', returnReceivedOn: null },
        'open',
      ],
    ],
  },
  {
    country: 'IE',
    source: 'TCA; Organisation of Working Time Act 1997 s.25; Statute of Limitations 1957 s.11',
    cases: [
      ['payroll', 'payroll-record', { role: 'employer', documentDate: '2019-06-30' }, '2025-06-30'],
      [
        'working time',
        'payroll-record',
        { role: 'employer', recordKind: 'working-time', documentDate: '2019-06-30' },
        '2022-06-30',
      ],
      ['tenancy ended', 'tenancy-agreement', { ...home, endedOn: '2020-02-29' }, '2026-02-28'],
      ['utility bill', 'utility-bill', { ...home, documentDate: '2019-04-04' }, '2025-04-04'],
      [
        'statement not used',
        'bank-statement',
        { ...person, usedForTax: false, documentDate: '2019-04-04' },
        '2025-04-04',
      ],
      [
        'statement used',
        'bank-statement',
        { ...person, usedForTax: true, documentDate: '2019-04-04' },
        '2025-12-31',
      ],
      ['deed', 'property-deed', { ...home, disposedOn: '2001-01-01' }, 'permanent'],
      [
        'return: no rule',
        'tax-return',
        { ...person, taxYear: 2001, returnDeliveredOn: '2002-10-01' },
        'open',
      ],
      [
        'property tax: no rule',
        'property-tax-bill',
        { ...home, documentDate: '2001-01-01' },
        'open',
      ],
      ['diploma', 'education-certificate', { ...home }, 'permanent'],
    ],
  },
];
