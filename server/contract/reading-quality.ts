/** How often people had to correct the reader. */
import { z } from 'zod';
import { classIdSchema } from './document-classes.ts';
import { defineEndpoint } from './endpoint.ts';

const counts = {
  /** Papers from scans that a person has decided. */
  papers: z.number().int(),
  /** Of these, whose kind was changed. */
  kindCorrected: z.number().int(),
  /** Of these, whose key date was changed or added. */
  dateCorrected: z.number().int(),
};

export const readingQualitySchema = z.object({
  ...counts,
  /** Latest first; `yyyy-mm`, the month of the review in the household's time zone. */
  months: z.array(z.object({ month: z.string(), ...counts })),
  /** By the kind that a person settled on, most papers first. */
  classes: z.array(
    z.object({
      class: classIdSchema,
      ...counts,
      /** What the reader took the corrected ones for, most frequent first. */
      takenFor: z.array(z.object({ class: classIdSchema, papers: z.number().int() })),
    }),
  ),
});
export type ReadingQuality = z.infer<typeof readingQualitySchema>;

export const readingQualityEndpoints = {
  getReadingQuality: defineEndpoint({
    method: 'get',
    path: '/api/reading-quality',
    tag: 'papers',
    summary: 'How often the reader was corrected, by month and by kind of paper',
    access: 'practice:read',
    status: 200,
    response: readingQualitySchema,
  }),
};
