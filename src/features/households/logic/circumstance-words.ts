import { circumstanceNames } from '../../../../server/contract/households.ts';
import type { CircumstanceName, Circumstances } from '../../../../server/contract/households.ts';
import { formatDay } from '../../../lib/format.ts';

/** Each circumstance as a statement that is true, not true, or was not asked. */
export const circumstanceWords: Record<CircumstanceName, string> = {
  selfEmployed: 'Somebody works for themselves',
  landlord: 'Somebody lets out property',
  company: 'Somebody runs a company',
  vatRegistered: 'A business here is registered for VAT or sales tax',
  employer: 'Somebody employs people, in the business or at home',
  filesReturn: 'Somebody sends in a tax return',
  attorneyActing: 'An attorney or deputy acts for somebody',
  capacityInDoubt: 'It is in doubt whether somebody can decide for themselves',
};

/** The answers with those that were not asked filled in, as a form wants them. */
export function fillCircumstances(circumstances: Circumstances): Required<Circumstances> {
  const filled = {} as Required<Circumstances>;
  for (const name of circumstanceNames) {
    filled[name] = circumstances[name] ?? { answer: 'not-asked', from: null, to: null };
  }
  return filled;
}

/** One answer in words: "Yes, since 6 April 2019", "No", "Not asked". */
export function describeCircumstance(answer: Circumstances[CircumstanceName]): string {
  if (!answer || answer.answer === 'not-asked') return 'Not asked';
  if (answer.answer === 'no') return 'No';
  if (answer.from && answer.to) return `Yes, ${formatDay(answer.from)} to ${formatDay(answer.to)}`;
  if (answer.from) return `Yes, since ${formatDay(answer.from)}`;
  if (answer.to) return `Yes, until ${formatDay(answer.to)}`;
  return 'Yes';
}
