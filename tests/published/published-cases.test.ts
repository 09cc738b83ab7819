/** Every worked case of every country. The day asked about is 1 December 2026, after all their enquiries. */
import { describe, expect, it } from 'vitest';
import { caseSchema } from '../../server/contract/cases.ts';
import { assess } from '../../server/retention/assess.ts';
import { loadRuleTables } from '../../server/rule-tables.ts';
import { auCases } from './au-cases.ts';
import { caCases } from './ca-cases.ts';
import { deCases } from './de-cases.ts';
import { gbCases } from './gb-cases.ts';
import { ieCases } from './ie-cases.ts';
import { usCases } from './us-cases.ts';

const ruleSet = loadRuleTables();
const cases = [...gbCases, ...usCases, ...caCases, ...auCases, ...ieCases, ...deCases];

describe('published cases', () => {
  it.each(cases)('$country $class: $title ($source)', (published) => {
    const { country, inputs, expected } = published;
    const answer = assess(
      caseSchema.parse({ country, class: published.class, on: '2026-12-01', inputs }),
      ruleSet,
    );
    expect({
      keepUntil: answer.keepUntil,
      shredFrom: answer.shredFrom,
      permanent: answer.permanent,
      open: answer.open,
    }).toEqual({ permanent: false, open: false, ...expected });
  });
});
