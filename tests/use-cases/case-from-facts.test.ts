import { describe, expect, it } from 'vitest';
import { caseInputsSchema } from '../../server/contract/cases.ts';
import { classIds } from '../../server/contract/document-classes.ts';
import {
  dateRoles,
  emptyFacts,
  type DateRole,
  type Facts,
} from '../../server/contract/readings.ts';
import { caseInputsFromFacts } from '../../server/use-cases/case-from-facts.ts';

function factsWith(dates: Partial<Record<DateRole, string>>, taxYear: string | null = null): Facts {
  const facts = emptyFacts();
  for (const role of dateRoles) {
    const value = dates[role];
    if (value) facts.dates[role] = { value, confidence: 1, seenAt: null, printed: value };
  }
  return { ...facts, taxYear };
}

describe('case inputs from facts', () => {
  it('takes the date of a bill as the date of the paper', () => {
    const facts = factsWith({ issued: '2026-04-09', periodEnd: '2026-04-05', due: '2026-04-23' });
    expect(caseInputsFromFacts('utility-bill', 'GB', facts)).toEqual({
      documentDate: '2026-04-09',
    });
  });

  it('falls back to the end of the period for a statement without a date of its own', () => {
    const facts = factsWith({ periodStart: '2025-11-01', periodEnd: '2025-11-30' });
    expect(caseInputsFromFacts('bank-statement', 'GB', facts).documentDate).toBe('2025-11-30');
  });

  // ITA 2007 s.4: the tax year ends on 5 April.
  it('turns a GB tax year in words into its last day', () => {
    expect(caseInputsFromFacts('annual-pay-statement', 'GB', factsWith({}, '2025-26'))).toEqual({
      taxYearEnd: '2026-04-05',
    });
  });

  // ITAA 1997 s.4-10: the income year ends on 30 June.
  it('turns an AU income year into its last day', () => {
    expect(caseInputsFromFacts('tax-assessment', 'AU', factsWith({}, '2024-25'))).toEqual({
      incomeYearEnd: '2025-06-30',
    });
  });

  it.each(['US', 'CA', 'IE'])('gives the number of the tax year in %s', (country) => {
    expect(caseInputsFromFacts('tax-return', country, factsWith({}, '2025')).taxYear).toBe(2025);
  });

  it('does not take the printed end of a tenancy as its end, since tenancies run on', () => {
    const facts = factsWith({
      issued: '2021-08-20',
      periodStart: '2021-09-01',
      expiry: '2022-08-31',
    });
    expect(caseInputsFromFacts('tenancy-agreement', 'GB', facts)).toEqual({
      documentDate: '2021-08-20',
      startedOn: '2021-09-01',
    });
  });

  it('takes the end of cover of an insurance policy', () => {
    const facts = factsWith({ periodStart: '2026-02-01', expiry: '2027-01-31' });
    expect(caseInputsFromFacts('insurance-policy', 'GB', facts).endedOn).toBe('2027-01-31');
  });

  it('knows delivery and end of a warranty', () => {
    const facts = factsWith({ issued: '2024-05-02', expiry: '2034-05-01' });
    expect(caseInputsFromFacts('warranty', 'IE', facts)).toMatchObject({
      deliveredOn: '2024-05-02',
      warrantyEndsOn: '2034-05-01',
    });
  });

  it('lets answers from elsewhere have the last word, but not an undefined one', () => {
    const facts = factsWith({ issued: '2026-01-02' });
    const inputs = caseInputsFromFacts('payslip', 'GB', facts, {
      role: 'individual',
      documentDate: '2026-01-31',
      filedOn: null,
      region: undefined,
    });
    expect(inputs).toEqual({ role: 'individual', documentDate: '2026-01-31', filedOn: null });
  });

  it('gives inputs that the sum accepts for every class and country', () => {
    const dates = Object.fromEntries(dateRoles.map((role) => [role, '2025-03-01']));
    for (const classId of classIds) {
      for (const country of ['GB', 'US', 'CA', 'AU', 'IE', 'DE', 'FR']) {
        const inputs = caseInputsFromFacts(classId, country, factsWith(dates, '2025'));
        expect(caseInputsSchema.parse(inputs)).toEqual(inputs);
      }
    }
  });

  it('says nothing where nothing was read', () => {
    for (const classId of classIds)
      expect(caseInputsFromFacts(classId, 'GB', emptyFacts())).toEqual({});
  });
});
