/**
 * The case that the retention sum is asked about. In the product it is put together from a paper's facts,
 * its subject, the household's circumstances and the holds; `POST /api/assessments` takes it directly.
 * An input that is absent is not known; `null` means known not to have happened.
 */
import { z } from 'zod';
import { isoDateSchema } from './dates.ts';
import { classIdSchema } from './document-classes.ts';

export const roles = [
  'household',
  'individual',
  'self-employed',
  'landlord',
  'company',
  'employer',
  'joint',
  'beneficiary',
  'legal-representative',
] as const;
export const caseRoleSchema = z.enum(roles);
export type CaseRole = z.infer<typeof caseRoleSchema>;

/** ISO 3166-1 alpha-2 countries for which a rule table ships. */
export const tableCountries = ['GB', 'US', 'CA', 'AU', 'IE', 'DE'] as const;
export type TableCountry = (typeof tableCountries)[number];

const day = isoDateSchema.nullable().optional();
const flag = z.boolean().nullable().optional();
const yearSchema = z.number().int().min(1800).max(2300).nullable().optional();
const word = z
  .string()
  .regex(/^[a-zA-Z0-9-]{1,60}$/)
  .nullable()
  .optional();

export const holdInputSchema = z.strictObject({
  reason: z.string().max(500).optional(),
  placedOn: isoDateSchema.nullable().optional(),
  releasedOn: isoDateSchema.nullable().optional(),
});

/** Dates, flags and circumstances, without the list of joint owners. */
const inputShape = {
  role: caseRoleSchema.optional(),
  region: z.string().max(40).nullable().optional(),
  documentKind: word,
  recordKind: word,
  documentDate: day,
  invoiceDate: day,
  writtenOn: day,
  receivedOn: day,
  signedOn: day,
  supersededOn: day,
  drawnUpOn: day,
  meetingDate: day,
  effectiveDate: day,
  transactionDate: day,
  transactionCompletedOn: day,
  obtainedOn: day,
  supplyDate: day,
  paidOn: day,
  claimYear: yearSchema,
  taxYearEnd: day,
  taxYear: yearSchema,
  incomeYearEnd: day,
  financialYearEnd: day,
  quarterEnd: day,
  payReferencePeriodEnd: day,
  nextPayReferencePeriodEnd: day,
  filedOn: day,
  lodgedOn: day,
  returnDeliveredOn: day,
  returnReceivedOn: day,
  dueOn: day,
  nominalDueOn: day,
  statutoryDueOn: day,
  extendedDueOn: day,
  noticeToFileOn: day,
  amendedOn: day,
  amendedReturnReceivedOn: day,
  amendmentIncreasesTax: flag,
  taxDueOn: day,
  taxPaidOn: day,
  noticeOfAssessmentOn: day,
  fraudulentReturn: flag,
  incomeOmittedOver25Percent: flag,
  worthlessSecurityClaim: flag,
  refundClaim: flag,
  acquiredOn: day,
  startedOn: day,
  endedOn: day,
  disposedOn: day,
  acceptedOn: day,
  deliveredOn: day,
  warrantyEndsOn: day,
  hiredOn: day,
  finalOn: day,
  valuationDate: day,
  clearanceCertificateOn: day,
  testatorLiving: flag,
  socialSecurityBenefitsBeganOn: day,
  birthDate: day,
  eventDate: day,
  personalInjury: flag,
  claimIssued: flag,
  vatRegistered: flag,
  oneStopShop: flag,
  employer: flag,
  usedForTax: flag,
  deducted: flag,
  workExpense: flag,
  buildingWork: flag,
  enquiry: z
    .strictObject({
      openedOn: isoDateSchema.nullable().optional(),
      closedOn: isoDateSchema.nullable().optional(),
    })
    .nullable()
    .optional(),
  objection: z
    .strictObject({
      resolvedOn: isoDateSchema.nullable().optional(),
      furtherAppealExpiresOn: isoDateSchema.nullable().optional(),
    })
    .nullable()
    .optional(),
  hold: holdInputSchema.nullable().optional(),
  holds: z.array(holdInputSchema).max(100).nullable().optional(),
};

export const ownerInputsSchema = z.strictObject(inputShape);
export const caseInputsSchema = z.strictObject({
  ...inputShape,
  owners: z.array(ownerInputsSchema).min(1).max(20).optional(),
});
export type CaseInputs = z.infer<typeof caseInputsSchema>;

/** ISO 3166-1 alpha-2, upper case. Whether the country exists is checked where the case is used. */
export const countrySchema = z
  .string()
  .regex(/^[A-Z]{2}$/, 'Give the country as two capital letters, for example GB.');

export const caseSchema = z.strictObject({
  country: countrySchema,
  class: classIdSchema,
  on: isoDateSchema,
  inputs: caseInputsSchema.default({}),
});
export type RetentionCase = z.infer<typeof caseSchema>;
