import { z } from 'zod';
import { countrySchema } from './cases.ts';
import { instantSchema, isoDateSchema } from './dates.ts';
import { defineEndpoint, idParams, listOf, listQuery } from './endpoint.ts';
import { membershipSchema } from './permissions.ts';

export const circumstanceNames = [
  'selfEmployed',
  'landlord',
  'company',
  'vatRegistered',
  'employer',
  'filesReturn',
  'attorneyActing',
  'capacityInDoubt',
] as const;
export type CircumstanceName = (typeof circumstanceNames)[number];

/** Yes (with days from and to), no, or not asked; not asked counts as yes in the sum. */
export const circumstanceSchema = z.object({
  answer: z.enum(['yes', 'no', 'not-asked']),
  from: isoDateSchema.nullable().default(null),
  to: isoDateSchema.nullable().default(null),
});
export const circumstancesSchema = z.partialRecord(z.enum(circumstanceNames), circumstanceSchema);
export type Circumstances = z.infer<typeof circumstancesSchema>;

export const personSchema = z.object({
  name: z.string().trim().min(1, 'Enter a name.').max(120),
  birthDate: isoDateSchema.nullable().default(null),
  diedOn: isoDateSchema.nullable().default(null),
});

/** Days before an expiry on which the reminder goes out, by class. */
export const leadDaysSchema = z.record(z.string(), z.number().int().min(0).max(1000));
export const defaultLeadDays: Record<string, number> = {
  passport: 270,
  'driving-licence': 56,
  'immigration-paper': 180,
  'insurance-policy': 30,
  warranty: 30,
  'vehicle-service': 30,
};

const timeZoneSchema = z.string().refine(
  (zone) => {
    try {
      new Intl.DateTimeFormat('en', { timeZone: zone });
      return true;
    } catch {
      return false;
    }
  },
  { message: 'Give a time zone by its name, for example Europe/London.' },
);

const householdShape = {
  name: z.string().trim().min(1, 'Enter a name for the household.').max(120),
  country: countrySchema,
  region: z.string().max(40).nullable(),
  timeZone: timeZoneSchema,
  circumstances: circumstancesSchema,
  people: z.array(personSchema).max(40),
  businessNames: z.array(z.string().trim().min(1).max(120)).max(20),
  hopes: z.string().max(2000),
  leadDays: leadDaysSchema,
};

export const createHouseholdSchema = z.object({
  name: householdShape.name,
  country: householdShape.country,
  region: householdShape.region.default(null),
  timeZone: timeZoneSchema.default('Europe/London'),
  circumstances: circumstancesSchema.default({}),
  people: householdShape.people.default([]),
  businessNames: householdShape.businessNames.default([]),
  hopes: householdShape.hopes.default(''),
});
export const updateHouseholdSchema = z.strictObject(householdShape).partial();

export const householdSchema = z.object({
  id: z.uuid(),
  ...householdShape,
  practiceId: z.uuid(),
  practiceName: z.string(),
  version: z.number().int(),
  createdAt: instantSchema,
  /** Papers by state, and scans still to be read. */
  counts: z.object({
    toReview: z.number().int(),
    undecided: z.number().int(),
    kept: z.number().int(),
    leaving: z.number().int(),
    left: z.number().int(),
    reading: z.number().int(),
    holds: z.number().int(),
    boxes: z.number().int(),
  }),
  /** Today in the household's time zone. */
  today: isoDateSchema,
});
export type Household = z.infer<typeof householdSchema>;

/** The outflow: sheets still to leave by the year in which they may go, and what stays for good. */
export const outflowSchema = z.object({
  today: isoDateSchema,
  left: z.number().int(),
  /** May go already, whether decided or not. */
  dueNow: z.number().int(),
  years: z.array(
    z.object({ year: z.number().int(), sheets: z.number().int(), papers: z.number().int() }),
  ),
  permanent: z.number().int(),
  /** Looked at and not settled: open (waiting for an event or an answer), held, or without a date. */
  open: z.number().int(),
  /** Not yet looked at; counted here and nowhere else. */
  toReview: z.number().int(),
});
export type Outflow = z.infer<typeof outflowSchema>;

/** The answer "when was the return sent?" for a person and tax year; it settles all papers of that year. */
export const filingSchema = z.object({
  id: z.uuid(),
  person: z.string().nullable(),
  country: countrySchema,
  /** `2024-25` for GB and AU, `2024` elsewhere. */
  taxYear: z.string(),
  answer: z.enum(['on-time', 'on-day', 'never', 'unknown']),
  filedOn: isoDateSchema.nullable(),
  papersWaiting: z.number().int(),
});
export const putFilingSchema = z
  .object({
    person: z.string().max(120).nullable().default(null),
    country: countrySchema,
    taxYear: z.string().regex(/^\d{4}(-\d{2})?$/, 'Give the tax year as 2024-25 or 2024.'),
    answer: z.enum(['on-time', 'on-day', 'never', 'unknown']),
    filedOn: isoDateSchema.nullable().default(null),
  })
  .refine((f) => f.answer !== 'on-day' || f.filedOn !== null, {
    path: ['filedOn'],
    message: 'Give the day on which the return was sent.',
  });
/** A question that would free papers, the one that frees most first. */
export const filingQuestionSchema = z.object({
  country: countrySchema,
  taxYear: z.string(),
  papers: z.number().int(),
});
export type Filing = z.infer<typeof filingSchema>;

export const memberSchema = z.object({
  membership: membershipSchema,
  user: z.object({ id: z.uuid(), name: z.string(), email: z.string() }),
});

export const householdEndpoints = {
  listHouseholds: defineEndpoint({
    method: 'get',
    path: '/api/households',
    tag: 'households',
    summary: 'The households one may see',
    access: 'signed-in',
    query: listQuery,
    status: 200,
    response: listOf(householdSchema),
  }),
  createHousehold: defineEndpoint({
    method: 'post',
    path: '/api/households',
    tag: 'households',
    summary: 'Add a household',
    access: 'household:create',
    body: createHouseholdSchema,
    status: 201,
    response: householdSchema,
  }),
  getHousehold: defineEndpoint({
    method: 'get',
    path: '/api/households/:id',
    tag: 'households',
    summary: 'One household',
    access: 'household:read',
    params: idParams,
    status: 200,
    response: householdSchema,
  }),
  updateHousehold: defineEndpoint({
    method: 'patch',
    path: '/api/households/:id',
    tag: 'households',
    summary: 'Change a household; its papers are assessed anew',
    access: 'household:update',
    params: idParams,
    body: updateHouseholdSchema,
    ifMatch: true,
    status: 200,
    response: householdSchema,
  }),
  getOutflow: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/outflow',
    tag: 'households',
    summary: 'Year by year, how much is still to leave and what stays',
    access: 'household:read',
    params: idParams,
    status: 200,
    response: outflowSchema,
  }),
  listMembers: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/members',
    tag: 'households',
    summary: 'Who belongs to a household',
    access: 'household:read',
    params: idParams,
    status: 200,
    response: listOf(memberSchema),
  }),
  listFilings: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/filings',
    tag: 'households',
    summary: 'Answers about tax returns sent, and the questions that would free most papers',
    access: 'household:read',
    params: idParams,
    status: 200,
    response: z.object({
      items: z.array(filingSchema),
      total: z.number().int(),
      questions: z.array(filingQuestionSchema),
    }),
  }),
  putFiling: defineEndpoint({
    method: 'put',
    path: '/api/households/:id/filings',
    tag: 'households',
    summary: 'Say when a return was sent; papers of that year are assessed anew',
    access: 'subject:write',
    params: idParams,
    body: putFilingSchema,
    status: 200,
    response: filingSchema,
  }),
};
