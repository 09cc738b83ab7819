/** What is wrong with a case that its shape alone does not show: places that do not exist, days out of reach. */
import type { RetentionCase } from '../contract/cases.ts';
import { yearOf } from './dates.ts';
import { isCountry } from './countries.ts';
import { dayInputs } from './moments.ts';
import type { RuleSet } from './rule-set.ts';
import { normaliseRegion } from './rule-set.ts';

export interface CaseProblem {
  /** Path of the field, for example `inputs.region`. */
  readonly field: string;
  readonly message: string;
}

const firstYear = 1800;
const lastYear = 2300;

type Inputs = RetentionCase['inputs'];

function findInputProblems(
  inputs: Omit<Inputs, 'owners'>,
  path: string,
  country: string,
  ruleSet: RuleSet,
): CaseProblem[] {
  const problems: CaseProblem[] = [];
  const table = ruleSet.tables.get(country)?.table;
  const region = normaliseRegion(inputs.region);
  if (region !== null && table && table.regions.length > 0 && !table.regions.includes(region)) {
    problems.push({
      field: `${path}.region`,
      message: `There is no region "${inputs.region ?? ''}" in ${table.name}. Known are: ${table.regions.join(', ')}.`,
    });
  }
  for (const name of dayInputs) {
    const day = inputs[name];
    if (day && (yearOf(day) < firstYear || yearOf(day) > lastYear)) {
      problems.push({
        field: `${path}.${name}`,
        message: `The day ${day} is out of reach. Give a day from ${firstYear} to ${lastYear}.`,
      });
    }
  }
  return problems;
}

/** Problems of a case by field, none when it can be assessed; the HTTP door answers them with 422. */
export function findCaseProblems(retentionCase: RetentionCase, ruleSet: RuleSet): CaseProblem[] {
  const { country, inputs, on } = retentionCase;
  const problems: CaseProblem[] = [];
  if (!isCountry(country)) {
    problems.push({
      field: 'country',
      message: `There is no country "${country}". Give an ISO 3166-1 code of two letters, for example GB.`,
    });
  }
  if (yearOf(on) < firstYear || yearOf(on) > lastYear) {
    problems.push({
      field: 'on',
      message: `The day ${on} is out of reach. Give a day from ${firstYear} to ${lastYear}.`,
    });
  }
  problems.push(...findInputProblems(inputs, 'inputs', country, ruleSet));
  for (const [index, owner] of (inputs.owners ?? []).entries()) {
    problems.push(...findInputProblems(owner, `inputs.owners.${index}`, country, ruleSet));
  }
  return problems;
}
