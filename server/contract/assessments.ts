/** What the rules say of one paper on one day. Field meanings are fixed: outsiders rely on them. */
import { z } from 'zod';
import { isoDateSchema } from './dates.ts';

export const bases = ['law', 'guidance', 'practice'] as const;
export const basisSchema = z.enum(bases);
/** How far a rule's source was checked: at the source, in a copy or summary, or from memory only. */
export const sourceStatuses = ['read', 'secondary', 'memory'] as const;
export const sourceStatusSchema = z.enum(sourceStatuses);
export const disposals = ['shred', 'recycle', 'return', 'keep', 'review'] as const;
export const securityLevels = ['P-1', 'P-2', 'P-3', 'P-4', 'P-5', 'P-6', 'P-7'] as const;
export const securityLevelSchema = z.enum(securityLevels);
export type SecurityLevel = z.infer<typeof securityLevelSchema>;
export const originals = ['required', 'scan-is-enough', 'conditional'] as const;

export const sourceSchema = z.object({
  authority: z.string(),
  title: z.string(),
  section: z.string().nullable(),
  status: sourceStatusSchema,
});

export const appliedRuleSchema = z.object({
  id: z.string(),
  basis: basisSchema,
  keepUntil: isoDateSchema.nullable(),
  source: sourceSchema,
});

export const stepSchema = z.object({ text: z.string(), date: isoDateSchema.nullable() });

export const assessmentSchema = z.object({
  keepUntil: isoDateSchema.nullable(),
  shredFrom: isoDateSchema.nullable(),
  permanent: z.boolean(),
  open: z.boolean(),
  openBecause: z.string().nullable(),
  heldBy: z.array(z.object({ reason: z.string().nullable(), placedOn: isoDateSchema.nullable() })),
  scheduledUntil: isoDateSchema.nullable(),
  provisional: z.object({ keepUntil: isoDateSchema, assuming: z.string() }).nullable(),
  advisedUntil: isoDateSchema.nullable(),
  advisedBecause: z.string().nullable(),
  assumed: z.array(z.string()),
  disposal: z.enum(disposals),
  securityLevel: securityLevelSchema.nullable(),
  original: z.enum(originals),
  rules: z.array(appliedRuleSchema),
  steps: z.array(stepSchema),
  cautions: z.array(z.string()),
});
export type Assessment = z.infer<typeof assessmentSchema>;
export type AppliedRule = z.infer<typeof appliedRuleSchema>;
export type AssessmentStep = z.infer<typeof stepSchema>;
