import { z } from 'zod';
import { assessmentSchema } from './assessments.ts';
import { caseInputsSchema, countrySchema } from './cases.ts';
import { instantSchema, isoDateSchema } from './dates.ts';
import { classIdSchema } from './document-classes.ts';
import { defineEndpoint, idParams, listOf, listQueryShape } from './endpoint.ts';
import { candidateSchema, dateRoles, factsSchema } from './readings.ts';

export const paperStatuses = ['to-review', 'undecided', 'kept', 'leaving', 'left'] as const;
export const paperStatusSchema = z.enum(paperStatuses);
export type PaperStatus = z.infer<typeof paperStatusSchema>;

export const piles = [
  'file-here',
  'file-elsewhere',
  'give-back',
  'pass-on',
  'act-on',
  'recycle',
  'shred',
  'undecided',
] as const;
export const pileSchema = z.enum(piles);
export type Pile = z.infer<typeof pileSchema>;
export const pileLabels: Record<Pile, string> = {
  'file-here': 'File here',
  'file-elsewhere': 'File elsewhere',
  'give-back': 'Give back',
  'pass-on': 'Pass on',
  'act-on': 'Act on',
  recycle: 'Recycle',
  shred: 'Shred',
  undecided: 'Undecided',
};
/** The state that a pile puts a paper in. */
export const statusOfPile: Record<Pile, Exclude<PaperStatus, 'to-review' | 'left'>> = {
  'file-here': 'kept',
  'file-elsewhere': 'kept',
  'act-on': 'kept',
  'give-back': 'leaving',
  'pass-on': 'leaving',
  recycle: 'leaving',
  shred: 'leaving',
  undecided: 'undecided',
};

export const keptBecauseSchema = z.enum(['duty', 'use', 'dear']);

/** One line of the register. */
export const paperRowSchema = z.object({
  id: z.uuid(),
  householdId: z.uuid(),
  /** Running number within the household; with the box code it finds the sheet. */
  number: z.number().int(),
  boxId: z.uuid().nullable(),
  boxCode: z.string().nullable(),
  status: paperStatusSchema,
  class: classIdSchema,
  /** 0 to 1 while the class is the reader's suggestion; null when a person set it. */
  confidence: z.number().nullable(),
  country: countrySchema,
  /** Short description a person gave (papers and bundles entered without a scan). */
  title: z.string().nullable(),
  issuer: z.string().nullable(),
  addressee: z.string().nullable(),
  reference: z.string().nullable(),
  /** The date on the paper. */
  paperOn: isoDateSchema.nullable(),
  keyDate: isoDateSchema.nullable(),
  expiresOn: isoDateSchema.nullable(),
  taxYear: z.string().nullable(),
  pile: pileSchema.nullable(),
  keptBecause: keptBecauseSchema.nullable(),
  place: z.string().nullable(),
  subjectId: z.uuid().nullable(),
  subjectName: z.string().nullable(),
  keepUntil: isoDateSchema.nullable(),
  shredFrom: isoDateSchema.nullable(),
  advisedUntil: isoDateSchema.nullable(),
  permanent: z.boolean(),
  open: z.boolean(),
  held: z.boolean(),
  /** Id of the rule that decided. */
  rule: z.string().nullable(),
  securityLevel: z.string().nullable(),
  sheets: z.number().int(),
  bundle: z.boolean(),
  leftOn: isoDateSchema.nullable(),
  reviewedAt: instantSchema.nullable(),
  version: z.number().int(),
  firstPageId: z.uuid().nullable(),
  /** With a search: a piece of the text with the words found. */
  snippet: z.string().nullable(),
});
export type PaperRow = z.infer<typeof paperRowSchema>;

export const paperPageSchema = z.object({
  id: z.uuid(),
  /** Within the paper, from 1. */
  number: z.number().int(),
  scanId: z.uuid(),
  scanName: z.string(),
  scanPage: z.number().int(),
  width: z.number().int(),
  height: z.number().int(),
  blank: z.boolean(),
});

export const paperHoldSchema = z.object({
  id: z.uuid(),
  scope: z.enum(['paper', 'household']),
  reason: z.string(),
  kind: z.string(),
  placedOn: isoDateSchema,
  placedByName: z.string(),
  liftable: z.boolean(),
});

/** Answers of a person that the rules may need beyond the facts: any input of a case. */
export const answersSchema = caseInputsSchema.omit({ hold: true, holds: true, owners: true });

export const paperSchema = paperRowSchema.omit({ snippet: true }).extend({
  pages: z.array(paperPageSchema),
  text: z.string(),
  facts: factsSchema,
  /** The reader's own opinion; stays when a person corrects it. */
  read: z
    .object({
      class: classIdSchema.nullable(),
      confidence: z.number().nullable(),
      facts: factsSchema,
    })
    .nullable(),
  candidates: z.array(candidateSchema),
  answers: answersSchema,
  assessment: assessmentSchema,
  ruleSetVersion: z.string(),
  assessedOn: isoDateSchema,
  holds: z.array(paperHoldSchema),
  note: z.string().nullable(),
  /** Seen by the practice only. Null for everybody else. */
  practiceNote: z.string().nullable(),
  bundleFrom: isoDateSchema.nullable(),
  bundleTo: isoDateSchema.nullable(),
  reviewedByName: z.string().nullable(),
  /** Stepping down from "advised until" to the rule's own date. */
  steppedDown: z.object({ on: isoDateSchema, byName: z.string(), reason: z.string() }).nullable(),
  /** Why it could not leave today by its pile (or by shredding), one sentence each; empty when it could. */
  gate: z.array(z.object({ code: z.string(), sentence: z.string() })),
  /** The papers before and after it in the same scan, for joining. */
  previousInScan: z.uuid().nullable(),
  nextInScan: z.uuid().nullable(),
  likelyCopyOf: z
    .object({ id: z.uuid(), number: z.number().int(), class: classIdSchema })
    .nullable(),
  canUndo: z.boolean(),
});
export type Paper = z.infer<typeof paperSchema>;

const correctedText = z.string().trim().max(200).nullable();
/** Corrections of facts by a person; `null` says the paper shows none. */
export const factsPatchSchema = z.strictObject({
  dates: z.partialRecord(z.enum(dateRoles), isoDateSchema.nullable()).optional(),
  taxYear: z
    .string()
    .regex(/^\d{4}(-\d{2})?$/, 'Give the tax year as 2024-25 or 2024.')
    .nullable()
    .optional(),
  reference: correctedText.optional(),
  issuer: correctedText.optional(),
  addressee: correctedText.optional(),
});

export const updatePaperSchema = z.strictObject({
  class: classIdSchema.optional(),
  country: countrySchema.optional(),
  facts: factsPatchSchema.optional(),
  answers: answersSchema.optional(),
  /** Choosing a pile is a decision: it sets the state that goes with the pile unless `status` says otherwise. */
  pile: pileSchema.optional(),
  keptBecause: keptBecauseSchema.nullable().optional(),
  place: z.string().trim().max(200).nullable().optional(),
  note: z.string().max(4000).nullable().optional(),
  practiceNote: z.string().max(4000).nullable().optional(),
  title: z.string().trim().max(200).nullable().optional(),
  subjectId: z.uuid().nullable().optional(),
  sheets: z.number().int().min(1).max(5000).optional(),
  status: z.enum(['to-review', 'undecided', 'kept', 'leaving']).optional(),
});
export type UpdatePaper = z.infer<typeof updatePaperSchema>;

/** A paper or bundle described by hand, without a scan. */
export const enterPaperSchema = z
  .object({
    class: classIdSchema,
    /** May be left out: the kind of paper then says what it is. */
    title: z
      .string()
      .trim()
      .min(1, 'Say what it is in a few words.')
      .max(200)
      .nullable()
      .default(null),
    boxId: z.uuid().nullable().default(null),
    country: countrySchema.optional(),
    facts: factsPatchSchema.default({}),
    bundle: z.boolean().default(false),
    bundleFrom: isoDateSchema.nullable().default(null),
    bundleTo: isoDateSchema.nullable().default(null),
    sheets: z.number().int().min(1).max(5000).default(1),
    note: z.string().max(4000).nullable().default(null),
    place: z.string().trim().max(200).nullable().default(null),
  })
  .refine((p) => !p.bundleFrom || !p.bundleTo || p.bundleFrom <= p.bundleTo, {
    path: ['bundleTo'],
    message: 'The last date of a bundle cannot be before its first.',
  });

export const paperFilterShape = {
  q: z.string().trim().max(200).optional(),
  class: z.string().max(400).optional().describe('One class id, or several with commas'),
  group: z.string().max(40).optional(),
  pile: z.string().max(200).optional(),
  status: z.string().max(200).optional().describe('One state, or several with commas'),
  box: z.uuid().optional(),
  subject: z.uuid().optional(),
  country: countrySchema.optional(),
  held: z.enum(['true', 'false']).optional(),
  /** Papers that may be shredded on or before this day. */
  dueBy: isoDateSchema.optional(),
};
export const listPapersQuery = z.object({ ...listQueryShape, ...paperFilterShape });

export const changeSchema = z.object({
  id: z.string(),
  at: instantSchema,
  byName: z.string(),
  /** Plain sentence of what changed. */
  sentence: z.string(),
  undone: z.boolean(),
});

export const departurePiles = ['recycle', 'give-back', 'pass-on'] as const;
export const departSchema = z.object({
  how: z.enum(departurePiles),
  on: isoDateSchema,
  to: z.string().trim().max(200).nullable().default(null),
});

export const paperEndpoints = {
  listPapers: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/papers',
    tag: 'papers',
    summary: 'The register: filter, search, sort, page',
    access: 'paper:read',
    params: idParams,
    query: listPapersQuery,
    status: 200,
    response: listOf(paperRowSchema),
  }),
  exportPapers: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/papers.csv',
    tag: 'papers',
    summary: 'The register as CSV, with the same filters',
    access: 'paper:export',
    params: idParams,
    query: listPapersQuery,
    status: 200,
    mediaType: 'text/csv',
  }),
  copyPapers: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/papers.pdf',
    tag: 'papers',
    summary: 'The pages of the papers as one PDF that can be searched, with the same filters',
    access: 'paper:export',
    params: idParams,
    query: listPapersQuery,
    status: 200,
    mediaType: 'application/pdf',
  }),
  copyPaper: defineEndpoint({
    method: 'get',
    path: '/api/papers/:id.pdf',
    tag: 'papers',
    summary: 'The pages of one paper as a PDF that can be searched',
    access: 'paper:export',
    params: idParams,
    status: 200,
    mediaType: 'application/pdf',
  }),
  enterPaper: defineEndpoint({
    method: 'post',
    path: '/api/households/:id/papers',
    tag: 'papers',
    summary: 'Enter a paper or a bundle without a scan',
    access: 'paper:enter',
    params: idParams,
    body: enterPaperSchema,
    status: 201,
    response: paperSchema,
  }),
  getPaper: defineEndpoint({
    method: 'get',
    path: '/api/papers/:id',
    tag: 'papers',
    summary: 'One paper with pages, facts, ranked classes and assessment',
    access: 'paper:read',
    params: idParams,
    status: 200,
    response: paperSchema,
  }),
  updatePaper: defineEndpoint({
    method: 'patch',
    path: '/api/papers/:id',
    tag: 'papers',
    summary: 'Correct or decide a paper',
    access: 'paper:review',
    params: idParams,
    body: updatePaperSchema,
    ifMatch: true,
    status: 200,
    response: paperSchema,
  }),
  undoPaper: defineEndpoint({
    method: 'post',
    path: '/api/papers/:id/undo',
    tag: 'papers',
    summary: 'Take the last change of a paper back, as long as it has not left',
    access: 'paper:review',
    params: idParams,
    ifMatch: true,
    status: 200,
    response: paperSchema,
  }),
  splitPaper: defineEndpoint({
    method: 'post',
    path: '/api/papers/:id/split',
    tag: 'papers',
    summary: 'Split a paper before one of its pages; both parts are read and classed anew',
    access: 'paper:review',
    params: idParams,
    body: z.object({ beforePage: z.number().int().min(2) }),
    ifMatch: true,
    status: 200,
    response: z.object({ first: paperSchema, second: paperSchema }),
  }),
  joinPaper: defineEndpoint({
    method: 'post',
    path: '/api/papers/:id/join',
    tag: 'papers',
    summary: 'Join a paper with the one before or after it in the same scan',
    access: 'paper:review',
    params: idParams,
    body: z.object({ with: z.uuid() }),
    ifMatch: true,
    status: 200,
    response: paperSchema,
  }),
  stepDown: defineEndpoint({
    method: 'post',
    path: '/api/papers/:id/step-down',
    tag: 'papers',
    summary: 'Step down from "advised until" to the rule\'s own date, with a reason',
    access: 'paper:step-down',
    params: idParams,
    body: z.object({
      reason: z.string().trim().min(3, 'Say why the shorter date is enough.').max(500),
    }),
    ifMatch: true,
    status: 200,
    response: paperSchema,
  }),
  departPaper: defineEndpoint({
    method: 'post',
    path: '/api/papers/:id/departure',
    tag: 'papers',
    summary:
      'Record that a paper left by recycling, giving back or passing on; goes through the gate',
    access: 'paper:depart',
    params: idParams,
    body: departSchema,
    ifMatch: true,
    status: 200,
    response: paperSchema,
  }),
  listPaperChanges: defineEndpoint({
    method: 'get',
    path: '/api/papers/:id/changes',
    tag: 'papers',
    summary: 'What was changed on a paper, newest first',
    access: 'paper:read',
    params: idParams,
    status: 200,
    response: listOf(changeSchema),
  }),
};
