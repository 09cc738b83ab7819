/** Every class in every country: always an answer, never by another country's rule or source. */
import { describe, expect, it } from 'vitest';
import { tableCountries } from '../../server/contract/cases.ts';
import type { CaseInputs } from '../../server/contract/cases.ts';
import type { ClassId } from '../../server/contract/document-classes.ts';
import { classIds } from '../../server/contract/document-classes.ts';
import { assess } from '../../server/retention/assess.ts';
import { describeRule } from '../../server/retention/describe-rule.ts';
import { guidanceSentence } from '../../server/retention/handling.ts';
import { loadRuleTables } from '../../server/rule-tables.ts';

const ruleSet = loadRuleTables();
const on = '2026-12-01';
const ask = (country: string, id: ClassId, inputs: CaseInputs = {}) =>
  assess({ country, class: id, on, inputs }, ruleSet);

const authoritiesOf = (country: string): string[] => [
  ...(ruleSet.tables.get(country)?.table.authorities ?? []),
  ...ruleSet.common.table.authorities,
];

/** Everything a paper's life can hold, so that every rule has its say. */
const fullLife: CaseInputs = {
  documentDate: '2015-05-20',
  taxYearEnd: '2016-04-05',
  taxYear: 2015,
  incomeYearEnd: '2016-06-30',
  financialYearEnd: '2015-12-31',
  filedOn: '2016-04-10',
  lodgedOn: '2016-09-01',
  returnDeliveredOn: '2016-09-01',
  endedOn: '2018-03-01',
  disposedOn: '2018-03-01',
};

const pairs = tableCountries.flatMap((country) => classIds.map((id) => [country, id] as const));

describe('class by country', () => {
  it.each(pairs)('%s %s answers with its own or common sources', (country, id) => {
    for (const inputs of [{}, fullLife]) {
      const answer = ask(country, id, inputs);
      const outcomes = [answer.permanent, answer.open, answer.shredFrom !== null];
      expect(outcomes.filter(Boolean)).toHaveLength(1);
      for (const rule of answer.rules) {
        expect(rule.id).toMatch(new RegExp(`^(${country.toLowerCase()}|common)\\.`));
        expect(authoritiesOf(country)).toContain(rule.source.authority);
      }
      if (answer.rules.length === 0) {
        expect(answer.openBecause).toMatch(/No rule is known here .* ask the adviser/);
      }
      expect(answer.cautions.at(-1)).toBe(guidanceSentence);
    }
  });

  it.each(tableCountries)('%s never schedules what is permanent everywhere', (country) => {
    for (const id of [
      'birth-certificate',
      'marriage-certificate',
      'death-certificate',
      'immigration-paper',
      'national-id-number',
      'education-certificate',
      'vaccination-record',
      'will',
      'name-change',
    ] as const) {
      expect(ask(country, id, fullLife).permanent, id).toBe(true);
      expect(ask(country, id, fullLife).disposal, id).toBe('keep');
    }
  });

  it.each(tableCountries)(
    '%s leaves finds, identity papers and personal papers to people',
    (country) => {
      for (const id of [
        'bearer-paper',
        'secret-note',
        'payment-card',
        'trust-deed',
        'photograph',
        'personal-letter',
        'keepsake',
        'user-manual',
        'school-report',
        'passport',
        'driving-licence',
        'unrecognised',
      ] as const) {
        const answer = ask(country, id, fullLife);
        expect(answer.open, id).toBe(true);
        expect(answer.shredFrom, id).toBeNull();
      }
    },
  );

  it.each(tableCountries)('%s lets advertising go on the day it came', (country) => {
    for (const id of ['circular', 'envelope'] as const) {
      expect(
        ask(country, id, { receivedOn: '2026-01-09', documentDate: '2026-01-05' }).shredFrom,
      ).toBe('2026-01-09');
      expect(ask(country, id, { documentDate: '2026-01-05' }).shredFrom).toBe('2026-01-05');
      expect(ask(country, id).shredFrom).toBe(on);
      expect(ask(country, id).disposal).toBe('recycle');
    }
  });

  it('answers open for a country without a table, whatever the class', () => {
    for (const id of classIds) {
      const answer = ask('FR', id, fullLife);
      expect(answer).toMatchObject({ open: true, permanent: false, keepUntil: null, rules: [] });
      expect(answer.openBecause).toContain('FR');
    }
  });

  it('describes every rule in a sentence of its own', () => {
    const sentences = ruleSet.rules.map(describeRule);
    for (const sentence of sentences) expect(sentence).toMatch(/^[A-Z].+: .+\.$/);
    expect(sentences).toContain(
      'Pay and tax papers of an individual: kept for 1 year after the 31 January that follows the end of the tax year; longer after a late or amended return.',
    );
  });
});
