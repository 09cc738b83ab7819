/** The sum in memory, beside a plain loop over the same days. */
import { addYears, formatISO, parseISO } from 'date-fns';
import { assess } from '../../retention/assess.ts';
import type { RuleSet } from '../../retention/rule-set.ts';
import { listCaseDays, makeBenchCases } from './bench-cases.ts';

export interface MemoryFigures {
  assessments: number;
  sumMs: number;
  loopMs: number;
  steps: number;
  days: number;
}

/** Works out so many sums with all their steps, then parses, adds and formats the days of the same cases. */
export function measureInMemory(ruleSet: RuleSet, assessments: number): MemoryFigures {
  const cases = makeBenchCases(20_000);
  const days = cases.map(listCaseDays);
  let steps = 0;
  let characters = 0;
  const sum = (count: number): number => {
    const started = performance.now();
    for (let index = 0; index < count; index += 1) {
      const retentionCase = cases[index % cases.length];
      if (retentionCase) steps += assess(retentionCase, ruleSet).steps.length;
    }
    return performance.now() - started;
  };
  let dayCount = 0;
  const loop = (count: number): number => {
    const started = performance.now();
    for (let index = 0; index < count; index += 1) {
      for (const day of days[index % days.length] ?? []) {
        characters += formatISO(addYears(parseISO(day), 6), { representation: 'date' }).length;
        dayCount += 1;
      }
    }
    return performance.now() - started;
  };
  // Both are warm before either is timed.
  sum(20_000);
  loop(20_000);
  steps = 0;
  dayCount = 0;
  const sumMs = sum(assessments);
  const loopMs = loop(assessments);
  if (characters === 0 || steps === 0) throw new Error('Nothing was worked out.');
  return { assessments, sumMs, loopMs, steps, days: dayCount };
}
