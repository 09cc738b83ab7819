/** The rule tables as people read them, and the retention sum for a case asked directly. */
import type { Assessment } from '../contract/assessments.ts';
import type { RetentionCase } from '../contract/cases.ts';
import type { RuleView } from '../contract/rule-tables.ts';
import { InvalidInputError, NotFoundError } from '../errors.ts';
import { assess } from '../retention/assess.ts';
import { findCaseProblems } from '../retention/case-problems.ts';
import { describeRule } from '../retention/describe-rule.ts';
import type { IndexedTable, RuleSet } from '../retention/rule-set.ts';

/** The retention sum; stores nothing. @throws InvalidInputError naming each field that does not fit */
export function assessCase(retentionCase: RetentionCase, ruleSet: RuleSet): Assessment {
  const problems = findCaseProblems(retentionCase, ruleSet);
  if (problems.length > 0) throw new InvalidInputError(problems.map((p) => ({ ...p })));
  return assess(retentionCase, ruleSet);
}

export function listRuleTables(ruleSet: RuleSet) {
  return {
    version: ruleSet.version,
    items: [...ruleSet.tables].map(([country, { table }]) => ({
      country,
      name: table.name,
      rules: table.rules.length,
    })),
  };
}

/** One country's rules, then those common to all. @throws NotFoundError when it has no table */
export function getRuleTable(country: string, ruleSet: RuleSet) {
  const found = ruleSet.tables.get(country.toUpperCase());
  if (!found) {
    throw new NotFoundError(
      `There is no rule table for "${country}": its papers are open, ask the adviser.`,
    );
  }
  return {
    country: country.toUpperCase(),
    name: found.table.name,
    version: ruleSet.version,
    rules: [...viewRules(found), ...viewRules(ruleSet.common)],
  };
}

function viewRules({ table }: IndexedTable): RuleView[] {
  return table.rules.map((rule) => ({
    id: rule.id,
    classes: [...rule.classes],
    basis: rule.basis,
    sentence: describeRule(rule),
    original: rule.original,
    source: {
      authority: rule.source.authority,
      title: rule.source.title,
      section: rule.source.section ?? null,
      status: rule.source.status,
      readOn: rule.source.readOn ?? null,
    },
    cautions: [...rule.cautions],
    note: rule.note ?? null,
  }));
}
