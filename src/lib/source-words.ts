import type { z } from 'zod';
import type { sourceStatusSchema } from '../../server/contract/assessments.ts';

export type SourceStatus = z.infer<typeof sourceStatusSchema>;

/** How far a rule's source was checked, in the words screens and prints use. */
export const sourceStatusWords: Record<SourceStatus, string> = {
  read: 'checked at the source',
  secondary: 'checked in a copy or summary',
  memory: 'not checked at the source',
};
