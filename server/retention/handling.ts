/** How a paper leaves when its time comes, whether the original is needed, and what to beware of. */
import type { Assessment } from '../contract/assessments.ts';
import type { RetentionCase } from '../contract/cases.ts';
import type { Verdict } from './combine.ts';
import type { RuleSet } from './rule-set.ts';
import type { Rule } from './rule-schema.ts';

/** Said last by every assessment, list and letter. */
export const guidanceSentence =
  'This is general guidance; local law decides. Ask the accountant or solicitor before destroying tax, legal or property papers.';

type HandlingAnswer = Pick<Assessment, 'disposal' | 'securityLevel' | 'original' | 'cautions'>;

const originalRank = { 'scan-is-enough': 0, conditional: 1, required: 2 } as const;

/** Disposal, security level, original and cautions from the class and the rules that applied. */
export function describeHandling(
  retentionCase: RetentionCase,
  ruleSet: RuleSet,
  says: readonly { readonly rule: Rule }[],
  verdict: Verdict,
): HandlingAnswer {
  const byClass = ruleSet.handling.classes[retentionCase.class];
  const cautions: string[] = [];
  let disposal: Assessment['disposal'] = byClass?.disposal ?? 'review';
  // Without a rule nobody has said that a scan would do.
  let original: Assessment['original'] = says.length === 0 ? 'conditional' : 'scan-is-enough';
  const add = (text: string): void => {
    if (!cautions.includes(text)) cautions.push(text);
  };
  for (const { rule } of says) {
    if (rule.disposal) disposal = rule.disposal;
    const needed = rule.originalFor?.[retentionCase.class] ?? rule.original;
    if (originalRank[needed] > originalRank[original]) original = needed;
    if (rule.originalCondition) add(rule.originalCondition);
    for (const caution of rule.cautions) add(caution);
  }
  if (verdict.kind === 'permanent') disposal = 'keep';
  else if (says.length === 0) disposal = 'review';
  if (byClass?.caution) add(byClass.caution);
  add(guidanceSentence);
  return { disposal, securityLevel: byClass?.level ?? null, original, cautions };
}
