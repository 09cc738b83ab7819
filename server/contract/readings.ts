/** What the reader makes of scans: page text with places, facts with places, ranked classes. */
import { z } from 'zod';
import { isoDateSchema } from './dates.ts';
import { classIdSchema } from './document-classes.ts';

/** A rectangle on the upright page, each value a share of the page's width or height from 0 to 1. */
export const boxSchema = z.object({ x: z.number(), y: z.number(), w: z.number(), h: z.number() });
export type Box = z.infer<typeof boxSchema>;

export const wordSchema = z.object({
  text: z.string(),
  box: boxSchema,
  /** 0 to 1. */
  confidence: z.number(),
});
export type Word = z.infer<typeof wordSchema>;

/** Where a fact was seen: `page` counts from 1 within the paper. */
export const placeOnPageSchema = z.object({ page: z.number().int().min(1), box: boxSchema });
export type PlaceOnPage = z.infer<typeof placeOnPageSchema>;

const seen = { confidence: z.number(), seenAt: placeOnPageSchema.nullable() };
/** `corrected` is true when a person wrote the value; the reader's own opinion stays in `read`. */
export const dateFactSchema = z.object({
  value: isoDateSchema,
  ...seen,
  printed: z.string().nullable(),
});
export const textFactSchema = z.object({ value: z.string(), ...seen });
export const amountFactSchema = z.object({
  name: z.string(),
  value: z.number(),
  currency: z.string().nullable(),
  ...seen,
});

export const dateRoles = [
  'issued',
  'due',
  'periodStart',
  'periodEnd',
  'expiry',
  'eventDate',
] as const;
export type DateRole = (typeof dateRoles)[number];

export const mrzSchema = z.object({
  lines: z.array(z.string()),
  valid: z.boolean(),
  documentNumber: z.string().nullable(),
  issuingState: z.string().nullable(),
  surname: z.string().nullable(),
  givenNames: z.string().nullable(),
  birthDate: isoDateSchema.nullable(),
  expiryDate: isoDateSchema.nullable(),
  /** ICAO Doc 9303 check digits, each right or wrong. */
  checks: z.array(z.object({ field: z.string(), valid: z.boolean() })),
});

export const factsSchema = z.object({
  dates: z.object({
    issued: dateFactSchema.nullable(),
    due: dateFactSchema.nullable(),
    periodStart: dateFactSchema.nullable(),
    periodEnd: dateFactSchema.nullable(),
    expiry: dateFactSchema.nullable(),
    eventDate: dateFactSchema.nullable(),
  }),
  /** The date the clock or the reminder starts from, see `key-date.ts`. */
  keyDate: isoDateSchema.nullable(),
  /** `2025-26` for GB and AU, `2025` for US, CA, IE and DE. */
  taxYear: z.string().nullable(),
  reference: textFactSchema.nullable(),
  issuer: textFactSchema.nullable(),
  addressee: textFactSchema.nullable(),
  amounts: z.array(amountFactSchema),
  mrz: mrzSchema.nullable(),
});
export type Facts = z.infer<typeof factsSchema>;
export type DateFact = z.infer<typeof dateFactSchema>;
export type TextFact = z.infer<typeof textFactSchema>;
export type AmountFact = z.infer<typeof amountFactSchema>;
export type Mrz = z.infer<typeof mrzSchema>;

export const candidateSchema = z.object({
  class: classIdSchema,
  /** 0 to 1; the first candidate's is the paper's confidence. */
  confidence: z.number(),
  /** Words seen on the paper that speak for the class. */
  evidence: z.array(z.string()),
});
export type Candidate = z.infer<typeof candidateSchema>;

/** Facts of a paper about which nothing was read. */
export function emptyFacts(): Facts {
  return {
    dates: {
      issued: null,
      due: null,
      periodStart: null,
      periodEnd: null,
      expiry: null,
      eventDate: null,
    },
    keyDate: null,
    taxYear: null,
    reference: null,
    issuer: null,
    addressee: null,
    amounts: [],
    mrz: null,
  };
}
