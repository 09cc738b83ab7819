/** Cases worked out by hand from the published rules, beside the worked examples. */
import { describe, expect, it } from 'vitest';
import { caseSchema } from '../../../server/contract/cases.ts';
import { assess } from '../../../server/retention/assess.ts';
import { findCaseProblems } from '../../../server/retention/case-problems.ts';
import { loadRuleTables } from '../../../server/rule-tables.ts';
import { auHand } from './au.ts';
import { caHand } from './ca.ts';
import { deHand } from './de.ts';
import { gbPrivate } from './gb-private.ts';
import { gbTax } from './gb-tax.ts';
import type { Expected } from './hand-case.ts';
import { ieHand } from './ie.ts';
import { usHand } from './us.ts';

const ruleSet = loadRuleTables();
const groups = [...gbTax, ...gbPrivate, ...usHand, ...caHand, ...auHand, ...ieHand, ...deHand];

describe.each(groups)('$country by hand: $source', ({ country, cases }) => {
  it.each(cases)('%s (%s)', (_words, classId, inputs, expected, on = '2026-12-01') => {
    const retentionCase = caseSchema.parse({ country, class: classId, on, inputs });
    expect(findCaseProblems(retentionCase, ruleSet)).toEqual([]);
    const answer = assess(retentionCase, ruleSet);
    let got: Expected = `from ${answer.shredFrom ?? 'nothing'}`;
    if (answer.permanent) got = 'permanent';
    else if (answer.open) got = 'open';
    else if (answer.keepUntil) got = answer.keepUntil as Expected;
    expect(got, JSON.stringify(answer.steps, null, 1)).toBe(expected);
  });
});
