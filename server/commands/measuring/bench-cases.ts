/** Cases like those of real boxes, each with days of its own, for measuring how quick the sum is. */
import type { CaseInputs, RetentionCase } from '../../contract/cases.ts';
import type { ClassId } from '../../contract/document-classes.ts';
import { addDays } from '../../retention/dates.ts';

type Template = readonly [country: string, classId: ClassId, inputs: CaseInputs];

const templates: readonly Template[] = [
  ['GB', 'payslip', { role: 'individual', documentDate: '2021-11-30', filedOn: '2023-01-20' }],
  [
    'GB',
    'annual-pay-statement',
    { role: 'individual', taxYearEnd: '2022-04-05', filedOn: '2023-06-10' },
  ],
  [
    'GB',
    'sales-invoice',
    {
      role: 'self-employed',
      vatRegistered: true,
      invoiceDate: '2021-03-20',
      filedOn: '2022-01-31',
    },
  ],
  [
    'GB',
    'supplier-invoice',
    {
      role: 'company',
      vatRegistered: false,
      financialYearEnd: '2021-02-28',
      filedOn: '2021-11-30',
    },
  ],
  ['GB', 'bank-statement', { role: 'household', usedForTax: false, documentDate: '2019-03-31' }],
  ['GB', 'utility-bill', { role: 'household', region: 'scotland', documentDate: '2020-03-15' }],
  [
    'GB',
    'tenancy-agreement',
    { role: 'household', startedOn: '2015-09-01', endedOn: '2018-08-31' },
  ],
  ['GB', 'trade-note', { role: 'individual', disposedOn: '2022-05-05', filedOn: '2023-10-02' }],
  [
    'GB',
    'bank-statement',
    {
      role: 'joint',
      usedForTax: true,
      taxYearEnd: '2022-04-05',
      owners: [
        { role: 'individual', filedOn: '2023-05-20' },
        { role: 'self-employed', filedOn: '2023-01-15' },
      ],
    },
  ],
  ['US', 'donation-receipt', { role: 'individual', taxYear: 2022, filedOn: '2023-04-18' }],
  ['US', 'supplier-invoice', { role: 'self-employed', taxYear: 2021, filedOn: '2022-09-12' }],
  [
    'US',
    'card-statement',
    { role: 'household', region: 'NY', usedForTax: false, documentDate: '2024-02-29' },
  ],
  [
    'US',
    'mortgage-statement',
    { role: 'individual', disposedOn: '2022-06-06', filedOn: '2023-04-18' },
  ],
  [
    'CA',
    'medical-bill',
    { role: 'individual', deducted: true, taxYear: 2021, filedOn: '2022-05-02' },
  ],
  [
    'CA',
    'business-accounts',
    { role: 'company', financialYearEnd: '2020-11-30', filedOn: '2021-08-15' },
  ],
  [
    'AU',
    'donation-receipt',
    { role: 'individual', incomeYearEnd: '2024-06-30', lodgedOn: '2024-07-10' },
  ],
  [
    'AU',
    'sales-invoice',
    {
      role: 'self-employed',
      obtainedOn: '2019-11-20',
      transactionCompletedOn: '2020-02-29',
      noticeOfAssessmentOn: '2021-01-12',
    },
  ],
  [
    'IE',
    'sales-invoice',
    {
      role: 'self-employed',
      vatRegistered: false,
      transactionDate: '2021-03-09',
      returnDeliveredOn: '2023-02-17',
    },
  ],
  ['DE', 'supplier-invoice', { role: 'self-employed', documentDate: '2015-06-03' }],
  ['DE', 'bank-statement', { role: 'household', usedForTax: false, documentDate: '2022-01-01' }],
];

const isoDay = /^\d{4}-\d{2}-\d{2}$/;

function moveDays(inputs: CaseInputs, days: number): CaseInputs {
  const moved = Object.entries(inputs).map(([name, value]): [string, unknown] => {
    if (typeof value === 'string' && isoDay.test(value)) return [name, addDays(value, days)];
    if (name === 'owners' && Array.isArray(value)) {
      return [name, value.map((owner) => moveDays(owner as CaseInputs, days))];
    }
    return [name, value];
  });
  return Object.fromEntries(moved);
}

/** Different cases, as many as asked for, the same ones each time. */
export function makeBenchCases(count: number): RetentionCase[] {
  return Array.from({ length: count }, (_, index) => {
    const [country, classId, inputs] = templates[index % templates.length] ?? ['GB', 'payslip', {}];
    return {
      country,
      class: classId,
      on: '2026-12-01',
      inputs: moveDays(inputs, (index * 37) % 700),
    };
  });
}

/** Every day that a case names. */
export function listCaseDays({ inputs }: RetentionCase): string[] {
  const { owners = [], ...own } = inputs;
  const values = [own, ...owners].flatMap((entry) => Object.values(entry) as unknown[]);
  return values.filter((value): value is string => typeof value === 'string' && isoDay.test(value));
}
