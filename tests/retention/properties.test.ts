/** What holds for any case: nothing is ever counted short, and the steps add up. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Assessment } from '../../server/contract/assessments.ts';
import { assessmentSchema } from '../../server/contract/assessments.ts';
import { caseSchema, roles, tableCountries } from '../../server/contract/cases.ts';
import type { CaseInputs, RetentionCase } from '../../server/contract/cases.ts';
import { classIds } from '../../server/contract/document-classes.ts';
import { assess } from '../../server/retention/assess.ts';
import { addDays, fromDayNumber, nextDay } from '../../server/retention/dates.ts';
import type { Rule } from '../../server/retention/rule-schema.ts';
import { buildRuleSet } from '../../server/retention/rule-set.ts';
import { loadRuleTables } from '../../server/rule-tables.ts';

const ruleSet = loadRuleTables();
const day = fc.integer({ min: 9_000, max: 20_000 }).map(fromDayNumber);
const maybeDay = fc.oneof(
  { weight: 4, arbitrary: day },
  { weight: 1, arbitrary: fc.constant(null) },
);
const flag = fc.boolean();
const year = fc.integer({ min: 1995, max: 2024 });
const end = (monthDay: string) => year.map((y) => `${y}-${monthDay}`);

/** Every kind that a rule tells apart. */
const kindsOf = (name: 'documentKind' | 'recordKind'): string[] => [
  ...new Set(ruleSet.rules.flatMap((rule) => rule[name]?.only ?? rule[name]?.except ?? [])),
];

const inputsOf = fc.record(
  {
    role: fc.constantFrom(...roles),
    documentDate: day,
    invoiceDate: day,
    receivedOn: day,
    taxYearEnd: end('04-05'),
    taxYear: year,
    incomeYearEnd: end('06-30'),
    financialYearEnd: end('12-31'),
    filedOn: maybeDay,
    lodgedOn: maybeDay,
    returnDeliveredOn: maybeDay,
    returnReceivedOn: maybeDay,
    amendedOn: day,
    taxPaidOn: maybeDay,
    transactionCompletedOn: maybeDay,
    endedOn: maybeDay,
    disposedOn: maybeDay,
    paidOn: maybeDay,
    eventDate: day,
    birthDate: day,
    personalInjury: flag,
    claimIssued: flag,
    vatRegistered: flag,
    usedForTax: flag,
    deducted: flag,
    workExpense: flag,
    buildingWork: flag,
    acceptedOn: maybeDay,
    valuationDate: day,
    drawnUpOn: day,
    socialSecurityBenefitsBeganOn: maybeDay,
    documentKind: fc.constantFrom(...kindsOf('documentKind')),
    recordKind: fc.constantFrom(...kindsOf('recordKind')),
    amendedReturnReceivedOn: day,
    amendmentIncreasesTax: flag,
    incomeOmittedOver25Percent: flag,
    worthlessSecurityClaim: flag,
    refundClaim: flag,
    oneStopShop: flag,
    noticeOfAssessmentOn: maybeDay,
    deliveredOn: day,
    warrantyEndsOn: day,
    hiredOn: day,
    finalOn: day,
    quarterEnd: day,
    payReferencePeriodEnd: day,
    supersededOn: day,
    obtainedOn: day,
    supplyDate: day,
    claimYear: year,
    clearanceCertificateOn: maybeDay,
  },
  { requiredKeys: [] },
);
const anyCase: fc.Arbitrary<RetentionCase> = fc.record({
  country: fc.constantFrom(...tableCountries),
  class: fc.constantFrom(...classIds),
  on: fc.constant('2026-12-01'),
  inputs: inputsOf,
});

const privateRoles: unknown[] = ['household', 'individual', 'beneficiary', 'legal-representative'];

/** Orders answers by how long they keep: a day, then open, then permanent. */
function rank(answer: Assessment): string {
  if (answer.permanent) return 'permanent';
  if (answer.open) return 'open';
  return answer.shredFrom ?? 'open';
}

/** Days that decide to which year a paper belongs while the year is not given. */
const yearDays: string[] = [
  'documentDate',
  'invoiceDate',
  'receivedOn',
  'payReferencePeriodEnd',
  'quarterEnd',
  'supplyDate',
  'obtainedOn',
  'drawnUpOn',
  'paidOn',
];
const change = (retentionCase: RetentionCase, inputs: CaseInputs): RetentionCase => ({
  ...retentionCase,
  inputs,
});
/** Not used for tax, and yet deducted: such a case has no right answer. */
const isContradiction = ({ usedForTax, deducted, workExpense }: CaseInputs): boolean =>
  (usedForTax === false && (deducted === true || workExpense === true)) ||
  (usedForTax === true && (deducted === false || workExpense === false));
const check = (property: fc.IProperty<[RetentionCase]>): void => {
  fc.assert(property, { numRuns: 1000, seed: 20261201 });
};

describe('any case', () => {
  it('gets exactly one answer, in the published shape, whose steps add up', () => {
    check(
      fc.property(anyCase, (retentionCase) => {
        const answer = assess(caseSchema.parse(retentionCase), ruleSet);
        assessmentSchema.parse(answer);
        if (answer.permanent || answer.open) {
          expect([answer.keepUntil, answer.shredFrom]).toEqual([null, null]);
        } else {
          expect(answer.shredFrom).not.toBeNull();
        }
        if (answer.keepUntil) {
          expect(answer.shredFrom).toBe(nextDay(answer.keepUntil));
          expect(answer.steps.findLast((step) => step.date !== null)?.date).toBe(answer.keepUntil);
          for (const rule of answer.rules) {
            expect(rule.keepUntil !== null && rule.keepUntil <= answer.keepUntil).toBe(true);
          }
        }
        if (answer.advisedUntil) {
          expect(answer.keepUntil !== null && answer.advisedUntil > answer.keepUntil).toBe(true);
        }
      }),
    );
  });

  it('never gets shorter when a hold is added or released later', () => {
    check(
      fc.property(anyCase, (retentionCase) => {
        const plain = rank(assess(retentionCase, ruleSet));
        const { inputs } = retentionCase;
        const released = rank(
          assess(change(retentionCase, { ...inputs, hold: { releasedOn: '2026-03-01' } }), ruleSet),
        );
        const later = rank(
          assess(change(retentionCase, { ...inputs, hold: { releasedOn: '2026-06-01' } }), ruleSet),
        );
        const held = assess(
          change(retentionCase, { ...inputs, hold: { reason: 'dispute' } }),
          ruleSet,
        );
        expect(released >= plain && later >= released && rank(held) >= later).toBe(true);
        expect(held.shredFrom).toBeNull();
      }),
    );
  });

  // Dates that only stand in for others (a document's date beside a delivery day) and the role of a
  // company without its year end are left out: their absence is counted from what else is known.
  // So are answers of which silence says no: a later payment or completion, a child's birthday, an injury, a deed.
  const questions = [
    'role',
    'filedOn',
    'lodgedOn',
    'returnDeliveredOn',
    'returnReceivedOn',
    'vatRegistered',
    'usedForTax',
    'deducted',
    'workExpense',
    'buildingWork',
    'disposedOn',
    'claimIssued',
    'socialSecurityBenefitsBeganOn',
    'acceptedOn',
    'hiredOn',
    'amendmentIncreasesTax',
    'clearanceCertificateOn',
  ] as const satisfies readonly (keyof CaseInputs)[];

  it.each(questions)('never gets shorter when "%s" becomes unknown', (name) => {
    check(
      fc.property(anyCase, (retentionCase) => {
        if (retentionCase.inputs.role === 'company' || isContradiction(retentionCase.inputs))
          return;
        // A private bill counts as used for tax only when somebody says so.
        if (name === 'usedForTax' && privateRoles.includes(retentionCase.inputs.role)) return;
        // Deeds of a sold home outlast any late return but one of a decade; a company's invoice is of no asset.
        const { class: classId, country } = retentionCase;
        // In Australia and Canada medical bills are tax papers until somebody says that they are not.
        const isTaxPaper = classId === 'medical-bill' && (country === 'AU' || country === 'CA');
        if (isTaxPaper && (name === 'deducted' || name === 'usedForTax')) return;
        if (country === 'GB' && classId === 'property-deed' && name === 'filedOn') return;
        if (country === 'GB' && classId === 'supplier-invoice' && name === 'disposedOn') return;
        const known = assess(retentionCase, ruleSet);
        // An answer that leaves no rule of the country is open for want of a rule, not of an answer.
        if (known.rules.length === 0) return;
        const inputs = { ...retentionCase.inputs };
        delete inputs[name];
        const unknown = assess(change(retentionCase, inputs), ruleSet);
        expect(rank(unknown) >= rank(known), `${rank(unknown)} after ${rank(known)}`).toBe(true);
      }),
    );
  });

  it.each([
    'documentDate',
    'filedOn',
    'lodgedOn',
    'endedOn',
    'disposedOn',
    'taxYearEnd',
    'financialYearEnd',
    'paidOn',
    'amendedOn',
    'amendedReturnReceivedOn',
    'returnDeliveredOn',
    'returnReceivedOn',
    'taxPaidOn',
    'transactionCompletedOn',
    'deliveredOn',
    'warrantyEndsOn',
    'acceptedOn',
    'hiredOn',
    'finalOn',
    'birthDate',
    'eventDate',
    'noticeOfAssessmentOn',
    'supersededOn',
    'obtainedOn',
    'supplyDate',
    'valuationDate',
    'drawnUpOn',
    'payReferencePeriodEnd',
    'quarterEnd',
    'clearanceCertificateOn',
    'socialSecurityBenefitsBeganOn',
    'invoiceDate',
    'receivedOn',
  ] as const)('never gets shorter when "%s" moves later', (name) => {
    fc.assert(
      fc.property(anyCase, fc.integer({ min: 1, max: 1500 }), (retentionCase, days) => {
        const value = retentionCase.inputs[name];
        if (!value) return;
        const { country, inputs: given } = retentionCase;
        // A later year can turn a late return into one in time; that is another case, not a later one.
        const restarts = country === 'CA' || country === 'IE';
        if (restarts && yearDays.includes(name) && (given.filedOn ?? given.returnDeliveredOn))
          return;
        const isYear = /YearEnd$|^disposedOn$|^transactionCompletedOn$|^valuationDate$/.test(name);
        if (isYear && (given.filedOn ?? given.returnDeliveredOn ?? given.returnReceivedOn)) return;
        if (name === 'financialYearEnd' && given.transactionCompletedOn) return;
        // Filed before the sale, it was another year's return.
        const sold = given.disposedOn ?? given.endedOn;
        if (/^(filed|lodged|returnDelivered)On$/.test(name) && sold && value < sold) return;
        // An American return amended after its period has ended changes nothing any more.
        if (name.startsWith('amended') && country === 'US') return;
        const known = rank(assess(retentionCase, ruleSet));
        const moved = rank(
          assess(
            change(retentionCase, { ...retentionCase.inputs, [name]: addDays(value, days) }),
            ruleSet,
          ),
        );
        expect(moved >= known, `${moved} after ${known}`).toBe(true);
      }),
      { numRuns: 1000, seed: 20261201 },
    );
  });

  it('never gets shorter when a rule is added', () => {
    const extra: Rule = {
      id: 'gb.extra.long',
      title: 'A practice of our own',
      classes: [...classIds],
      addition: true,
      keep: {
        how: 'period',
        trigger: ['documentDate'],
        pick: 'first',
        startAt: 'trigger',
        counting: 'after',
        period: 'P9Y',
        needsBirthDate: false,
        alignEnd: 'none',
      },
      ifRegionUnknown: 'count',
      original: 'scan-is-enough',
      cautions: [],
      advised: [],
      basis: 'practice',
      source: {
        authority: 'Common practice',
        title: 'Ours',
        section: null,
        status: 'memory',
        readOn: null,
      },
    };
    const tables = [
      ruleSet.common.table,
      ...[...ruleSet.tables.values()].map((entry) => entry.table),
    ];
    const longer = buildRuleSet(
      tables.map((table) =>
        table.country === 'GB' ? { ...table, rules: [...table.rules, extra] } : table,
      ),
      ruleSet.handling,
      'longer',
    );
    check(
      fc.property(anyCase, (retentionCase) => {
        const before = assess(retentionCase, ruleSet);
        // Where no rule was known, the added one is what the adviser said.
        if (before.rules.length === 0) return;
        expect(rank(assess(retentionCase, longer)) >= rank(before)).toBe(true);
      }),
    );
  });
});
