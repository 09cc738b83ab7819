/** Which questions about a paper would move its dates. */
import type { Paper } from '../../../../server/contract/papers.ts';

type Asked = Pick<Paper, 'answers' | 'assessment' | 'subjectId' | 'open' | 'permanent'>;

/** Whether it matters if the paper was used for a tax return. */
export function asksForTaxUse(paper: Asked): boolean {
  return (
    paper.answers.usedForTax !== undefined ||
    paper.assessment.assumed.some((sentence) => /used for a tax return/i.test(sentence))
  );
}

/** Whether the paper waits for the end of something, or is linked to it already. */
export function asksForSubject(paper: Asked): boolean {
  if (paper.subjectId !== null) return true;
  return (
    paper.open &&
    !paper.permanent &&
    /\b(end|ended|sold|given up|settled|closed|still)\b/i.test(paper.assessment.openBecause ?? '')
  );
}
