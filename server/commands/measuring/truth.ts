/** The file that says what sample papers are. Only what is measured is checked. */
import { readFile } from 'node:fs/promises';
import { z } from 'zod';
import { isoDateSchema } from '../../contract/dates.ts';

const paperSchema = z.object({
  class: z.string(),
  country: z.string(),
  keyDate: isoDateSchema.nullish(),
  handwritten: z.boolean().nullish(),
  text: z.array(z.array(z.string())).nullish(),
});
const dateSchema = z.object({
  dates: z.object({ expiry: isoDateSchema.nullish() }).partial().nullish(),
});
const documentSchema = paperSchema.extend(dateSchema.shape).extend({
  file: z.string(),
  quality: z.string(),
  household: z.string(),
  duplicateOf: z.string().nullish(),
  supersedes: z.string().nullish(),
});
const spanSchema = paperSchema.extend(dateSchema.shape).extend({
  duplicateOf: z.string().nullish(),
  from: z.number().int(),
  to: z.number().int(),
});
const stackSchema = z.object({
  file: z.string(),
  quality: z.string(),
  household: z.string(),
  documents: z.array(spanSchema),
});
const truthSchema = z.object({
  households: z.record(z.string(), z.object({ country: z.string() })),
  documents: z.array(documentSchema),
  stacks: z.array(stackSchema).default([]),
});

export type Truth = z.infer<typeof truthSchema>;
export type TruePaper = z.infer<typeof spanSchema>;
export type TrueDocument = z.infer<typeof documentSchema>;
export type TrueStack = z.infer<typeof stackSchema>;

/** Reads and checks the file; throws with a sentence when it is not what is expected. */
export async function loadTruth(file: string): Promise<Truth> {
  const text = await readFile(file, 'utf8').catch(() => {
    throw new Error(`There is no file ${file}.`);
  });
  const parsed = truthSchema.safeParse(JSON.parse(text));
  if (!parsed.success) {
    throw new Error(`${file} does not describe sample papers: ${z.prettifyError(parsed.error)}`);
  }
  return parsed.data;
}
