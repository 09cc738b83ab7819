import { z } from 'zod';
import { isoDateSchema } from './dates.ts';
import { defineEndpoint, idParams, listOf } from './endpoint.ts';

/** What a paper is about; when it ends, the clocks of its papers start. */
export const subjectKinds = [
  'account',
  'property',
  'vehicle',
  'policy',
  'employment',
  'business',
  'loan',
  'tenancy',
  'person',
  'other',
] as const;
export const subjectKindLabels: Record<(typeof subjectKinds)[number], string> = {
  account: 'Account',
  property: 'Property',
  vehicle: 'Vehicle',
  policy: 'Policy',
  employment: 'Employment',
  business: 'Business',
  loan: 'Loan',
  tenancy: 'Tenancy',
  person: 'Person',
  other: 'Something else',
};

export const subjectSchema = z.object({
  id: z.uuid(),
  householdId: z.uuid(),
  kind: z.enum(subjectKinds),
  name: z.string(),
  reference: z.string().nullable(),
  startedOn: isoDateSchema.nullable(),
  /** When it ended, was sold or was closed; null while it runs or while nobody knows. */
  endedOn: isoDateSchema.nullable(),
  /** False: nobody has said whether it still runs. */
  endKnown: z.boolean(),
  papers: z.number().int(),
  version: z.number().int(),
});
export type Subject = z.infer<typeof subjectSchema>;

export const createSubjectSchema = z.object({
  kind: z.enum(subjectKinds),
  name: z.string().trim().min(1, 'Give it a name.').max(120),
  reference: z.string().trim().max(120).nullable().default(null),
  startedOn: isoDateSchema.nullable().default(null),
  endedOn: isoDateSchema.nullable().default(null),
  endKnown: z.boolean().default(false),
});
export const updateSubjectSchema = z.strictObject({
  kind: z.enum(subjectKinds).optional(),
  name: z.string().trim().min(1, 'Give it a name.').max(120).optional(),
  reference: z.string().trim().max(120).nullable().optional(),
  startedOn: isoDateSchema.nullable().optional(),
  endedOn: isoDateSchema.nullable().optional(),
  endKnown: z.boolean().optional(),
});

export const subjectEndpoints = {
  listSubjects: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/subjects',
    tag: 'subjects',
    summary: 'What the papers of a household are about',
    access: 'subject:read',
    params: idParams,
    status: 200,
    response: listOf(subjectSchema),
  }),
  createSubject: defineEndpoint({
    method: 'post',
    path: '/api/households/:id/subjects',
    tag: 'subjects',
    summary: 'Add something that papers are about',
    access: 'subject:write',
    params: idParams,
    body: createSubjectSchema,
    status: 201,
    response: subjectSchema,
  }),
  updateSubject: defineEndpoint({
    method: 'patch',
    path: '/api/subjects/:id',
    tag: 'subjects',
    summary: 'Change it, or record that it ended; its papers are assessed anew',
    access: 'subject:write',
    params: idParams,
    body: updateSubjectSchema,
    ifMatch: true,
    status: 200,
    response: subjectSchema,
  }),
};
