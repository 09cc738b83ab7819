import type { Filing } from '../../../../server/contract/households.ts';
import { formatDay } from '../../../lib/format.ts';

/** The answers to "when was the return sent?", as a list offers them. */
export const answerWords: Record<Filing['answer'], string> = {
  'on-time': 'on time',
  'on-day': 'on a day I know',
  never: 'not at all',
  unknown: 'not known',
};

/** One answer as part of a line. */
export function describeFiling(filing: Filing): string {
  if (filing.answer === 'on-day' && filing.filedOn) return `sent on ${formatDay(filing.filedOn)}`;
  if (filing.answer === 'on-time') return 'sent on time';
  if (filing.answer === 'never') return 'not sent at all';
  return 'not known';
}
