import { z } from 'zod';
import { instantSchema, isoDateSchema } from './dates.ts';
import { defineEndpoint, idParams, listOf } from './endpoint.ts';

/** Reasons not to destroy. Shown in violet, as "don't destroy yet". */
export const holdKinds = [
  'enquiry',
  'dispute',
  'claim',
  'probate',
  'divorce',
  'insolvency',
  'capacity',
  'wish',
  'other',
] as const;
export const holdKindLabels: Record<(typeof holdKinds)[number], string> = {
  enquiry: 'Tax enquiry or audit',
  dispute: 'Dispute or complaint',
  claim: 'Claim or court case',
  probate: 'An estate being settled',
  divorce: 'Divorce or separation',
  insolvency: 'Insolvency',
  capacity: 'Doubt about capacity',
  wish: 'Somebody wishes it',
  other: 'Another reason',
};

export const holdSchema = z.object({
  id: z.uuid(),
  householdId: z.uuid(),
  scope: z.enum(['paper', 'household']),
  paperId: z.uuid().nullable(),
  paperLabel: z.string().nullable(),
  kind: z.enum(holdKinds),
  reason: z.string(),
  placedOn: isoDateSchema,
  placedByName: z.string(),
  reviewOn: isoDateSchema.nullable(),
  liftedOn: isoDateSchema.nullable(),
  liftedByName: z.string().nullable(),
  liftReason: z.string().nullable(),
  createdAt: instantSchema,
  /** Whether the caller may lift it. */
  liftable: z.boolean(),
});
export type Hold = z.infer<typeof holdSchema>;

export const placeHoldSchema = z.object({
  /** Absent: the whole household. */
  paperId: z.uuid().nullable().default(null),
  kind: z.enum(holdKinds),
  reason: z.string().trim().min(3, 'Say in a few words why nothing may be destroyed.').max(500),
  reviewOn: isoDateSchema.nullable().default(null),
});
export const liftHoldSchema = z.object({
  reason: z.string().trim().min(3, 'Say why the hold can be lifted.').max(500),
});

export const holdEndpoints = {
  listHolds: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/holds',
    tag: 'holds',
    summary: 'Holds, those in force first',
    access: 'hold:read',
    params: idParams,
    status: 200,
    response: listOf(holdSchema),
  }),
  placeHold: defineEndpoint({
    method: 'post',
    path: '/api/households/:id/holds',
    tag: 'holds',
    summary: 'Place a hold on a paper or on the household',
    access: 'hold:place',
    params: idParams,
    body: placeHoldSchema,
    status: 201,
    response: holdSchema,
  }),
  liftHold: defineEndpoint({
    method: 'post',
    path: '/api/holds/:id/lift',
    tag: 'holds',
    summary: 'Lift a hold, with a reason',
    access: 'hold:lift',
    params: idParams,
    body: liftHoldSchema,
    status: 200,
    response: holdSchema,
  }),
};
