/** RFC 9457 problem details, with a field list for invalid input. */
import { z } from 'zod';

export const fieldProblemSchema = z.object({ field: z.string(), message: z.string() });
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  /** A sentence that says what to do next. */
  detail: z.string(),
  fields: z.array(fieldProblemSchema).optional(),
  /** With 412: the record as it stands now. */
  current: z.unknown().optional(),
  /** With a refusal of the gate: why, one sentence each. */
  reasons: z
    .array(z.object({ code: z.string(), paper: z.string().nullable(), sentence: z.string() }))
    .optional(),
});
export type Problem = z.infer<typeof problemSchema>;
export type FieldProblem = z.infer<typeof fieldProblemSchema>;
