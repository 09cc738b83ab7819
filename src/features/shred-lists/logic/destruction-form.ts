/** What is asked once for the whole list when its destruction is recorded. */
import type { z } from 'zod';
import { destructionSchema } from '../../../../server/contract/shred-lists.ts';

export const destructionFormSchema = destructionSchema
  .omit({ rows: true })
  .required({ clientPresent: true });
export type DestructionForm = z.input<typeof destructionFormSchema>;
export type DestructionRecord = z.output<typeof destructionFormSchema>;
