import { z } from 'zod';
import { securityLevelSchema } from './assessments.ts';
import { instantSchema, isoDateSchema } from './dates.ts';
import { classIdSchema } from './document-classes.ts';
import { defineEndpoint, idParams, listOf } from './endpoint.ts';

export const shredListStatuses = ['draft', 'sent', 'approved', 'done', 'void'] as const;
export const rowOutcomes = ['destroyed', 'kept-back', 'not-found'] as const;

/** An A4 sheet of 80 g/m2: ISO 216 area (1/16 m2) x paper weight. */
export const sheetGrams = 5;
export const approvalDays = 60;
export const defaultWaitDays = 7;

export const shredRowSchema = z.object({
  paper: z.uuid(),
  position: z.number().int(),
  boxCode: z.string().nullable(),
  paperNumber: z.number().int(),
  class: classIdSchema,
  title: z.string().nullable(),
  issuer: z.string().nullable(),
  paperOn: isoDateSchema.nullable(),
  rule: z.string().nullable(),
  ruleBasis: z.string().nullable(),
  /** Words for a source that was not checked; null when it was read. */
  sourceNote: z.string().nullable(),
  keepUntil: isoDateSchema.nullable(),
  securityLevel: securityLevelSchema.nullable(),
  sheets: z.number().int(),
  firstPageId: z.uuid().nullable(),
  keptBack: z.boolean(),
  keptBackReason: z.string().nullable(),
  outcome: z.enum(rowOutcomes).nullable(),
  /** Why the gate would refuse it now; empty when it may go. */
  blocked: z.array(z.object({ code: z.string(), sentence: z.string() })),
});
export type ShredRow = z.infer<typeof shredRowSchema>;

export const leftOutSchema = z.object({
  paper: z.uuid(),
  paperNumber: z.number().int(),
  class: classIdSchema,
  issuer: z.string().nullable(),
  reasons: z.array(z.object({ code: z.string(), sentence: z.string() })),
});

export const shredListSchema = z.object({
  id: z.uuid(),
  householdId: z.uuid(),
  householdName: z.string(),
  number: z.number().int(),
  status: z.enum(shredListStatuses),
  version: z.number().int(),
  /** The day on which the papers were asked about. */
  on: isoDateSchema,
  rows: z.array(shredRowSchema),
  leftOut: z.array(leftOutSchema),
  sheets: z.number().int(),
  weightGrams: z.number().int(),
  /** Highest level that any row asks for. */
  securityLevel: securityLevelSchema.nullable(),
  cautions: z.array(z.string()),
  createdAt: instantSchema,
  sentAt: instantSchema.nullable(),
  approval: z
    .object({
      at: instantSchema,
      on: isoDateSchema,
      byName: z.string(),
      version: z.number().int(),
      /** Set when the practice approved on the client's recorded instruction. */
      instruction: z.object({ how: z.string(), on: isoDateSchema, words: z.string() }).nullable(),
      waitDays: z.number().int(),
      /** First day on which the papers may be destroyed unless the client is present. */
      notBefore: isoDateSchema,
      /** The last day on which the approval holds. */
      lapsesOn: isoDateSchema,
    })
    .nullable(),
  destruction: z
    .object({
      on: isoDateSchema,
      place: z.string(),
      method: z.string(),
      level: securityLevelSchema.nullable(),
      witness: z.string(),
      clientPresent: z.boolean(),
      recordedByName: z.string(),
      recordedAt: instantSchema,
    })
    .nullable(),
  /** What the caller may do next. */
  can: z.object({
    send: z.boolean(),
    approve: z.boolean(),
    carryOut: z.boolean(),
    void: z.boolean(),
  }),
});
export type ShredList = z.infer<typeof shredListSchema>;
export const shredListSummarySchema = shredListSchema
  .pick({
    id: true,
    number: true,
    status: true,
    version: true,
    on: true,
    sheets: true,
    weightGrams: true,
    createdAt: true,
  })
  .extend({ papers: z.number().int() });

export const createShredListSchema = z.object({
  on: isoDateSchema,
  /** Absent: every paper that is decided for shredding and eligible on the day. */
  papers: z.array(z.uuid()).max(5000).optional(),
});

export const approveShredListSchema = z.object({
  version: z.number().int(),
  keepBack: z.array(z.uuid()).default([]),
  waitDays: z.number().int().min(0).max(60).default(defaultWaitDays),
  /** Required when somebody of the practice approves for the client. */
  instruction: z
    .object({
      how: z.enum(['in-person', 'phone', 'letter', 'e-mail']),
      on: isoDateSchema,
      words: z.string().trim().min(3, "Write down the client's words.").max(1000),
    })
    .optional(),
});

export const destructionSchema = z.object({
  on: isoDateSchema,
  place: z.string().trim().min(1, 'Say where it was destroyed.').max(200),
  method: z
    .string()
    .trim()
    .min(1, 'Say how it was destroyed, for example a cross-cut shredder.')
    .max(200),
  level: securityLevelSchema.nullable().default(null),
  witness: z.string().trim().min(1, 'Say who watched.').max(200),
  /** When the client was present the waiting time does not apply. Absent: whether the witness is one of the household. */
  clientPresent: z.boolean().optional(),
  rows: z.array(z.object({ paper: z.uuid(), outcome: z.enum(rowOutcomes) })).max(5000),
});

export const shredListEndpoints = {
  listShredLists: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/shred-lists',
    tag: 'shred lists',
    summary: 'The shred lists of a household, newest first',
    access: 'shred-list:read',
    params: idParams,
    status: 200,
    response: listOf(shredListSummarySchema),
  }),
  createShredList: defineEndpoint({
    method: 'post',
    path: '/api/households/:id/shred-lists',
    tag: 'shred lists',
    summary: 'Gather what may be shredded on a day, with what was left out and why',
    access: 'shred-list:prepare',
    params: idParams,
    body: createShredListSchema,
    status: 201,
    response: shredListSchema,
  }),
  getShredList: defineEndpoint({
    method: 'get',
    path: '/api/shred-lists/:id',
    tag: 'shred lists',
    summary: 'One shred list',
    access: 'shred-list:read',
    params: idParams,
    status: 200,
    response: shredListSchema,
  }),
  getShredListPdf: defineEndpoint({
    method: 'get',
    path: '/api/shred-lists/:id.pdf',
    tag: 'shred lists',
    summary: 'The list to print and work from',
    access: 'shred-list:read',
    params: idParams,
    status: 200,
    mediaType: 'application/pdf',
  }),
  getDestructionRecordPdf: defineEndpoint({
    method: 'get',
    path: '/api/shred-lists/:id/record.pdf',
    tag: 'shred lists',
    summary: 'What was shredded: the record to print',
    access: 'shred-list:read',
    params: idParams,
    status: 200,
    mediaType: 'application/pdf',
  }),
  removeShredRow: defineEndpoint({
    method: 'delete',
    path: '/api/shred-lists/:id/rows/:paper',
    tag: 'shred lists',
    summary: 'Take a paper off a list that is not approved yet',
    access: 'shred-list:prepare',
    params: z.object({ id: z.uuid(), paper: z.uuid() }),
    ifMatch: true,
    status: 200,
    response: shredListSchema,
  }),
  sendShredList: defineEndpoint({
    method: 'post',
    path: '/api/shred-lists/:id/sending',
    tag: 'shred lists',
    summary: 'Send the list to the client for approval',
    access: 'shred-list:prepare',
    params: idParams,
    ifMatch: true,
    status: 200,
    response: shredListSchema,
  }),
  approveShredList: defineEndpoint({
    method: 'post',
    path: '/api/shred-lists/:id/approval',
    tag: 'shred lists',
    summary: 'Approve this version of the list, keeping single rows back',
    access: 'shred-list:approve',
    params: idParams,
    body: approveShredListSchema,
    status: 200,
    response: shredListSchema,
  }),
  recordDestruction: defineEndpoint({
    method: 'post',
    path: '/api/shred-lists/:id/destruction',
    tag: 'shred lists',
    summary: 'Record the destruction, row by row',
    access: 'shred-list:carry-out',
    params: idParams,
    body: destructionSchema,
    status: 200,
    response: shredListSchema,
  }),
  voidShredList: defineEndpoint({
    method: 'post',
    path: '/api/shred-lists/:id/voiding',
    tag: 'shred lists',
    summary: 'Give a list up; its papers go back to where they were',
    access: 'shred-list:prepare',
    params: idParams,
    body: z.object({ reason: z.string().trim().min(3, 'Say why the list is given up.').max(500) }),
    ifMatch: true,
    status: 200,
    response: shredListSchema,
  }),
};
