/** What holds in every country: unknown answers, holds, owners, evidence of the sum. */
import { describe, expect, it } from 'vitest';
import type { CaseInputs } from '../../server/contract/cases.ts';
import type { ClassId } from '../../server/contract/document-classes.ts';
import { assess } from '../../server/retention/assess.ts';
import { findCaseProblems } from '../../server/retention/case-problems.ts';
import { loadRuleTables } from '../../server/rule-tables.ts';

const ruleSet = loadRuleTables();
const ask = (country: string, id: ClassId, inputs: CaseInputs, on = '2026-12-01') =>
  assess({ country, class: id, on, inputs }, ruleSet);

const payslip: CaseInputs = { role: 'individual', documentDate: '2023-11-30' };

describe('what is not known', () => {
  it('leaves a paper open while the filing day is not known, with the date for a return in time', () => {
    const answer = ask('GB', 'payslip', payslip);
    expect(answer).toMatchObject({ open: true, keepUntil: null, shredFrom: null });
    expect(answer.provisional).toEqual({
      keepUntil: '2026-01-31',
      assuming: 'the return was filed on time',
    });
  });

  it('lets the date stand when no return was asked for, and stays open when one was', () => {
    expect(ask('GB', 'payslip', { ...payslip, filedOn: null }).keepUntil).toBe('2026-01-31');
    const asked = ask('GB', 'payslip', { ...payslip, filedOn: null, noticeToFileOn: '2024-04-06' });
    expect(asked).toMatchObject({ open: true, provisional: null });
  });

  it('counts every role while the role is not known, and says so', () => {
    const answer = ask('GB', 'payslip', { documentDate: '2023-11-30', filedOn: '2025-01-20' });
    expect(answer.keepUntil).toBe('2030-01-31');
    expect(answer.assumed.join(' ')).toContain('every possible role');
  });

  it('counts only the roles that the circumstances allow', () => {
    const inputs = { documentDate: '2023-11-30', filedOn: '2025-01-20' };
    const answer = assess({ country: 'GB', class: 'payslip', on: '2026-12-01', inputs }, ruleSet, {
      possibleRoles: ['household', 'individual'],
    });
    expect(answer.keepUntil).toBe('2026-01-31');
  });

  it('counts an unknown VAT registration as registered', () => {
    const inputs: CaseInputs = {
      role: 'self-employed',
      invoiceDate: '2024-03-20',
      taxYearEnd: '2024-04-05',
      filedOn: '2025-01-31',
    };
    expect(ask('GB', 'sales-invoice', inputs).keepUntil).toBe('2030-03-20');
    expect(ask('GB', 'sales-invoice', { ...inputs, vatRegistered: false }).keepUntil).toBe(
      '2030-01-31',
    );
  });

  it('takes the longest limitation period of the country while the region is not known', () => {
    const ended = { role: 'household', endedOn: '2020-02-29', usedForTax: false } as const;
    expect(ask('US', 'tenancy-agreement', ended).keepUntil).toBe('2030-02-28');
    expect(ask('US', 'tenancy-agreement', { ...ended, region: 'NY' }).keepUntil).toBe('2026-02-28');
    expect(ask('CA', 'tenancy-agreement', { ...ended, region: 'ontario' }).keepUntil).toBe(
      '2022-02-28',
    );
    expect(ask('CA', 'tenancy-agreement', ended).keepUntil).toBe('2026-02-28');
    expect(ask('GB', 'loan-settlement', { ...ended, region: 'scotland' }).keepUntil).toBe(
      '2025-02-28',
    );
    expect(ask('DE', 'tenancy-agreement', ended).keepUntil).toBe('2023-12-31');
  });

  it('leaves an injury open while the age or the court is not known', () => {
    const injury = { role: 'household', personalInjury: true, eventDate: '2018-06-30' } as const;
    expect(
      ask('GB', 'insurance-claim', { ...injury, birthDate: '1980-01-01', claimIssued: false })
        .keepUntil,
    ).toBe('2021-06-30');
    expect(ask('GB', 'insurance-claim', { ...injury, claimIssued: false }).open).toBe(true);
    expect(ask('GB', 'insurance-claim', { ...injury, birthDate: '1980-01-01' })).toMatchObject({
      open: true,
      provisional: { keepUntil: '2021-06-30' },
    });
  });
});

describe('returns', () => {
  it('follows the published rule and the statute on either side of four years late', () => {
    const accounts = { role: 'self-employed', taxYearEnd: '2018-04-05' } as const;
    expect(ask('GB', 'business-accounts', { ...accounts, filedOn: '2023-01-21' }).keepUntil).toBe(
      '2024-01-31',
    );
    expect(ask('GB', 'business-accounts', { ...accounts, filedOn: '2024-03-15' }).keepUntil).toBe(
      '2025-06-15',
    );
  });

  it('takes no return for that of a sale that came after it', () => {
    const invoice = {
      role: 'individual',
      invoiceDate: '2011-05-20',
      disposedOn: '2024-08-09',
    } as const;
    for (const country of ['US', 'CA', 'GB']) {
      const filed = (filedOn: string) =>
        ask(country, 'home-improvement-invoice', { ...invoice, filedOn });
      expect(filed('2012-04-10'), country).toMatchObject({ open: true, keepUntil: null });
      expect(filed('2025-04-10').open, country).toBe(false);
    }
  });

  it('is permanent after a fraudulent US return even when none was filed', () => {
    const inputs = {
      role: 'self-employed',
      taxYear: 2019,
      filedOn: null,
      fraudulentReturn: true,
    } as const;
    expect(ask('US', 'sales-invoice', inputs)).toMatchObject({ permanent: true, open: false });
  });

  // 26 USC 6501(c)(7).
  it('adds sixty days for an amended US return that shows more tax and comes near the end', () => {
    const inputs: CaseInputs = {
      role: 'individual',
      taxYear: 2020,
      filedOn: '2021-04-15',
      amendedReturnReceivedOn: '2024-04-01',
      amendmentIncreasesTax: true,
    };
    expect(ask('US', 'donation-receipt', inputs).keepUntil).toBe('2024-05-31');
    expect(
      ask('US', 'donation-receipt', { ...inputs, amendedReturnReceivedOn: '2024-02-01' }).keepUntil,
    ).toBe('2024-04-15');
    expect(
      ask('US', 'donation-receipt', { ...inputs, amendmentIncreasesTax: false }).keepUntil,
    ).toBe('2024-04-15');
  });

  it('works out due days that are not given', () => {
    // Same cases as published, without their due days.
    expect(
      ask('CA', 'supplier-invoice', { role: 'self-employed', taxYear: 2023, filedOn: '2024-06-18' })
        .keepUntil,
    ).toBe('2030-06-18');
    expect(
      ask('CA', 'medical-bill', { role: 'individual', taxYear: 2022, filedOn: '2023-05-01' })
        .keepUntil,
    ).toBe('2028-12-31');
    expect(
      ask('US', 'donation-receipt', { role: 'individual', taxYear: 2022, filedOn: '2023-03-10' })
        .keepUntil,
    ).toBe('2026-04-15');
    expect(
      ask('AU', 'donation-receipt', {
        role: 'individual',
        incomeYearEnd: '2024-06-30',
        lodgedOn: '2024-07-10',
      }).keepUntil,
    ).toBe('2029-10-31');
    expect(
      ask('IE', 'estate-paper', {
        role: 'beneficiary',
        valuationDate: '2020-09-15',
        returnReceivedOn: '2021-10-31',
      }).keepUntil,
    ).toBe('2026-09-15');
  });

  // AO §147(3), Art. 97 §19a EGAO.
  it.each([
    ['2013-02-01', '2023-12-31'],
    ['2014-12-31', '2024-12-31'],
    ['2015-01-01', '2024-12-31'],
    ['2016-12-31', '2024-12-31'],
    ['2017-01-01', '2025-12-31'],
    ['2024-06-01', '2032-12-31'],
  ])('keeps a German voucher of %s until %s', (documentDate, expected) => {
    expect(ask('DE', 'supplier-invoice', { role: 'self-employed', documentDate }).keepUntil).toBe(
      expected,
    );
  });

  // NMW Regs 2015 reg. 59(8): records no longer required on 1 April 2021 kept their three years.
  it.each([
    ['2018-04-01', '2021-03-31'],
    ['2018-04-02', '2024-04-01'],
  ])(
    'keeps proof of the minimum wage for a next pay period ending %s until %s',
    (nextPayReferencePeriodEnd, expected) => {
      const inputs = {
        role: 'employer',
        recordKind: 'minimum-wage',
        nextPayReferencePeriodEnd,
      } as const;
      expect(ask('GB', 'payroll-record', inputs).keepUntil).toBe(expected);
    },
  );
});

describe('stops', () => {
  const invoice: CaseInputs = {
    role: 'self-employed',
    vatRegistered: false,
    invoiceDate: '2018-07-02',
    taxYearEnd: '2019-04-05',
    filedOn: '2020-01-20',
  };
  const held = (releasedOn: string | null, on?: string) =>
    ask(
      'GB',
      'supplier-invoice',
      { ...invoice, hold: { reason: 'claim', placedOn: '2024-11-30', releasedOn } },
      on,
    );

  it('is open while a hold runs, and says what the schedule would be', () => {
    expect(held(null)).toMatchObject({
      open: true,
      keepUntil: null,
      shredFrom: null,
      scheduledUntil: '2025-01-31',
      heldBy: [{ reason: 'claim', placedOn: '2024-11-30' }],
    });
  });

  it('counts to the later of schedule and release', () => {
    expect(held('2026-05-12').keepUntil).toBe('2026-05-12');
    expect(held('2025-01-03').keepUntil).toBe('2025-01-31');
  });

  it('judges a hold on the day asked about', () => {
    expect(held('2026-05-12', '2026-05-11').open).toBe(true);
    expect(held('2026-05-12', '2026-05-12').keepUntil).toBe('2026-05-12');
    expect(held(null, '2024-11-29').keepUntil).toBe('2025-01-31');
  });

  it('needs every hold lifted, and holds the paper for each owner', () => {
    const holds = [{ releasedOn: '2026-01-01' }, { reason: 'probate' }];
    expect(ask('GB', 'supplier-invoice', { ...invoice, holds }).open).toBe(true);
    const joint = ask('GB', 'bank-statement', {
      role: 'joint',
      usedForTax: true,
      taxYearEnd: '2022-04-05',
      owners: [
        { role: 'individual', filedOn: '2023-01-20' },
        { role: 'individual', filedOn: null, hold: { reason: 'divorce' } },
      ],
    });
    expect(joint.heldBy).toEqual([{ reason: 'divorce', placedOn: null }]);
    expect(joint.shredFrom).toBeNull();
  });

  it('holds advertising, but never turns a permanent paper into an open one', () => {
    expect(ask('GB', 'envelope', { hold: { reason: 'dispute' } })).toMatchObject({
      open: true,
      shredFrom: null,
    });
    expect(ask('GB', 'will', { hold: { reason: 'probate' } })).toMatchObject({
      permanent: true,
      open: false,
    });
  });

  // ITA s.230(6).
  it('waits for the last day of a further appeal', () => {
    const inputs: CaseInputs = { role: 'individual', taxYear: 2018, filedOn: '2019-04-12' };
    expect(ask('CA', 'donation-receipt', { ...inputs, objection: { resolvedOn: null } }).open).toBe(
      true,
    );
    const decided = { resolvedOn: '2026-08-01', furtherAppealExpiresOn: '2026-10-30' };
    expect(ask('CA', 'donation-receipt', { ...inputs, objection: decided }).keepUntil).toBe(
      '2026-10-30',
    );
  });
});

describe('the answer', () => {
  it('advises a longer time beside the date, not in it', () => {
    const answer = ask('GB', 'payslip', { ...payslip, filedOn: '2025-01-20' });
    expect(answer).toMatchObject({ keepUntil: '2026-01-31', advisedUntil: '2028-04-05' });
    expect(
      ask('US', 'donation-receipt', { role: 'individual', taxYear: 2023, filedOn: '2024-02-20' })
        .advisedUntil,
    ).toBe('2030-04-15');
    expect(
      ask('US', 'donation-receipt', {
        role: 'individual',
        taxYear: 2023,
        filedOn: '2024-02-20',
        incomeOmittedOver25Percent: false,
      }).advisedUntil,
    ).toBeNull();
  });

  it('puts a council tax bill sent in March into the year it is for', () => {
    const bill = (documentDate: string) =>
      ask('GB', 'property-tax-bill', { role: 'household', region: 'england-wales', documentDate })
        .keepUntil;
    expect(bill('2024-03-08')).toBe('2031-03-31');
    expect(bill('2024-03-31')).toBe('2030-03-31');
    expect(bill('2024-04-01')).toBe('2031-03-31');
  });

  it('asks for the original by the class where a rule is for several', () => {
    const sold = { role: 'individual', disposedOn: '2023-06-06', filedOn: '2024-03-03' } as const;
    expect(ask('US', 'property-deed', sold).original).toBe('required');
    expect(ask('US', 'trade-note', sold).original).toBe('conditional');
    expect(ask('DE', 'business-accounts', { documentKind: 'annual-accounts' }).original).toBe(
      'required',
    );
    expect(ask('DE', 'business-accounts', { documentKind: 'ledger' }).original).toBe(
      'scan-is-enough',
    );
  });

  it('names places that do not exist', () => {
    const problems = (country: string, region: string | null = null) =>
      findCaseProblems(
        { country, class: 'payslip', on: '2026-12-01', inputs: { region } },
        ruleSet,
      );
    expect(problems('XX')[0]).toMatchObject({
      field: 'country',
      message: expect.stringContaining('"XX"') as string,
    });
    expect(problems('GB', 'atlantis')[0]).toMatchObject({ field: 'inputs.region' });
    expect(problems('FR')).toEqual([]);
    expect(problems('US', 'NY')).toEqual([]);
  });
});
