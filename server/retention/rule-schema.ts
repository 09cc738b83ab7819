/** The shape of a rule table. Every key is known or refused; data only, no computed value. */
import { z } from 'zod';
import {
  basisSchema,
  disposals,
  originals,
  securityLevelSchema,
  sourceStatusSchema,
} from '../contract/assessments.ts';
import { caseRoleSchema } from '../contract/cases.ts';
import { isoDateSchema } from '../contract/dates.ts';
import { classIdSchema } from '../contract/document-classes.ts';
import { parsePeriod } from './dates.ts';
import { holidayCalendars } from './holidays.ts';
import { dayInputs, inputNames, momentNames } from './moments.ts';

const sentence = z.string().min(3).max(600);
const monthDaySchema = z
  .string()
  .regex(/^(0[1-9]|1[0-2])-([0-2]\d|3[01])$/, 'Write the day as mm-dd, for example 01-31.');
const slugSchema = z.string().regex(/^[a-zA-Z0-9-]{1,60}$/);

export const periodSchema = z.string().superRefine((text, context) => {
  try {
    parsePeriod(text);
  } catch (error) {
    context.addIssue({
      code: 'custom',
      message: error instanceof Error ? error.message : 'not a period',
    });
  }
});
export const limitationKinds = ['contract', 'deed', 'injury'] as const;
export type LimitationKind = (typeof limitationKinds)[number];

/** A fixed period, or the country's own limitation period for contracts, deeds or injuries. */
const lengthSchema = z.union([
  periodSchema,
  z.strictObject({ limitation: z.enum(limitationKinds) }),
]);

const momentSchema = z.enum(momentNames);
const inputNameSchema = z.enum(inputNames);
const dayInputSchema = z.enum(dayInputs);

export const ruleSourceSchema = z.strictObject({
  authority: z.string().min(2),
  title: z.string().min(2),
  section: z.string().nullable().default(null),
  status: sourceStatusSchema,
  /** Day on which the source was last opened; null when none is recorded, and for a rule from memory. */
  readOn: isoDateSchema.nullable().default(null),
});

/**
 * Whether an input lets a rule apply. "or-unknown" counts a missing answer towards the rule and says so;
 * `known` / `not-known` ask whether a value is there; `never` is a known "has not happened".
 */
export const conditionValues = [
  'yes',
  'no',
  'yes-or-unknown',
  'no-or-unknown',
  'known',
  'not-known',
  'never',
  'unknown',
  'not-never',
  'not-unknown',
  'not-no',
] as const;
export type ConditionValue = (typeof conditionValues)[number];

const kindConditionSchema = z
  .strictObject({
    only: z.array(slugSchema).min(1).optional(),
    except: z.array(slugSchema).min(1).optional(),
    /** Whether the rule applies while the kind is not known. */
    orUnknown: z.boolean(),
  })
  .refine((value) => (value.only === undefined) !== (value.except === undefined), {
    message: 'Give either "only" or "except".',
  });

/** The day by which a return is due, counted from the end of its year. */
export const dueSchema = z.discriminatedUnion('rule', [
  z.strictObject({
    rule: z.literal('next-month-day'),
    monthDay: monthDaySchema,
    shift: z.enum(holidayCalendars).optional(),
  }),
  z.strictObject({
    rule: z.literal('months-after'),
    months: z.number().int().min(1).max(36),
    shift: z.enum(holidayCalendars).optional(),
  }),
  z.strictObject({ rule: z.literal('fifteenth-of-fourth-month') }),
  z.strictObject({
    rule: z.literal('gift-tax-october'),
    monthDay: monthDaySchema,
    splitAfter: monthDaySchema,
  }),
]);
export type DueRule = z.infer<typeof dueSchema>;

const triggerShape = {
  /** Moments in order of preference; `pick: latest` takes the latest of those known. */
  trigger: z.array(momentSchema).min(1),
  pick: z.enum(['first', 'latest']).default('first'),
  /** With `pick: latest`: moments that must be known, or the rule stays open. */
  needs: z.array(momentSchema).optional(),
  /** With `pick: latest`: one of these must be known, or the rule stays open. */
  needsOneOf: z.array(momentSchema).optional(),
  /** An event that must have happened before anything is counted. */
  waitsFor: dayInputSchema.optional(),
  /** An event that is said not to have happened (`null`) keeps the rule open; silence does not. */
  openWhile: dayInputSchema.optional(),
};

const periodKeepSchema = z.strictObject({
  how: z.literal('period'),
  ...triggerShape,
  startAt: z.enum(['trigger', 'end-of-calendar-year', 'end-of-month']).default('trigger'),
  /** `beginning-with` counts the first day itself. */
  counting: z.enum(['after', 'beginning-with']).default('after'),
  period: lengthSchema,
  /** Claims of a person under 18 do not start before the 18th birthday. */
  notBeforeAge: z.number().int().min(1).max(30).optional(),
  /** Whether an unknown birth date keeps the rule open. */
  needsBirthDate: z.boolean().default(false),
  alignEnd: z.enum(['none', 'end-of-month', 'end-of-calendar-year']).default('none'),
  shift: z.enum(holidayCalendars).optional(),
});

const quarterDaysSchema = z.array(monthDaySchema).min(1);

/** GB: base date, the window after a late or amended return up to a quarter day, and the published months. */
const returnWindowSchema = z.strictObject({
  how: z.literal('return-window'),
  ...triggerShape,
  /** Months and days: the base is this period after `anchor` next following the year, or after the year's end. */
  anchor: monthDaySchema.optional(),
  period: periodSchema,
  due: dueSchema,
  noticeExtends: periodSchema.optional(),
  onTimeWindow: periodSchema.optional(),
  lateWindow: periodSchema.optional(),
  lateWindowAfter: periodSchema.optional(),
  quarterDays: quarterDaysSchema,
  ifFilingUnknown: z.enum(['open', 'on-time']).default('open'),
});

/** Base date from the end of the year; a late return starts the clock again from its delivery. */
const lateRestartSchema = z.strictObject({
  how: z.literal('late-restart'),
  ...triggerShape,
  startAt: z.enum(['trigger', 'end-of-calendar-year']).default('trigger'),
  period: periodSchema,
  filing: dayInputSchema,
  due: dueSchema,
  restartAt: z.enum(['delivery', 'end-of-calendar-year']),
  /** A corrected or additional return counts like a late one. */
  correctionRestarts: z.boolean().default(false),
});

/** The clock starts on the later of the filing day and the due day. */
const filingStartSchema = z.strictObject({
  how: z.literal('filing-start'),
  ...triggerShape,
  filing: dayInputSchema,
  due: dueSchema,
  dueInput: dayInputSchema,
  startFrom: z.enum(['later-of-filing-and-due', 'due']).default('later-of-filing-and-due'),
  period: periodSchema,
  lateAmendment: periodSchema.optional(),
  shift: z.enum(holidayCalendars).optional(),
});

/** A shortened period with its change-over: nothing ends before the change that the old law still held. */
const changeOverSchema = z.strictObject({
  how: z.literal('change-over'),
  ...triggerShape,
  formerPeriod: periodSchema,
  period: periodSchema,
  changedFrom: isoDateSchema,
});

/** Counted from the end of the year in which the return was filed. */
const filingYearSchema = z.strictObject({
  how: z.literal('filing-year'),
  ...triggerShape,
  filing: dayInputSchema,
  period: periodSchema,
  onTimeYears: z.number().int().min(0).max(5),
  neverFiledYears: z.number().int().min(0).max(10),
});

export const keepSchema = z.discriminatedUnion('how', [
  z.strictObject({ how: z.literal('permanent') }),
  z.strictObject({ how: z.literal('none') }),
  z.strictObject({ how: z.literal('owner-decides') }),
  z.strictObject({
    how: z.literal('open'),
    because: sentence,
    /** The answer that would take this rule out of the way, and what that answer would be. */
    answer: z.strictObject({ input: inputNameSchema, assuming: sentence }).optional(),
  }),
  periodKeepSchema,
  returnWindowSchema,
  lateRestartSchema,
  filingStartSchema,
  changeOverSchema,
  filingYearSchema,
]);
export type Keep = z.infer<typeof keepSchema>;
export type PeriodKeep = z.infer<typeof periodKeepSchema>;
export type ReturnWindowKeep = z.infer<typeof returnWindowSchema>;
export type LateRestartKeep = z.infer<typeof lateRestartSchema>;
export type FilingStartKeep = z.infer<typeof filingStartSchema>;
export type ChangeOverKeep = z.infer<typeof changeOverSchema>;
export type FilingYearKeep = z.infer<typeof filingYearSchema>;

const advisedSchema = z.strictObject({
  trigger: z.array(momentSchema).min(1),
  /** An input whose known answer makes the advice needless. */
  unless: inputNameSchema.optional(),
  roles: z.array(caseRoleSchema).min(1).optional(),
  classes: z.array(classIdSchema).min(1).optional(),
  /** Years counted from the later of filing and due day instead of the trigger. */
  fromFiling: z.boolean().default(false),
  period: periodSchema,
  shift: z.enum(holidayCalendars).optional(),
  because: sentence,
});

export const ruleSchema = z.strictObject({
  id: z
    .string()
    .regex(/^[a-z]{2,6}(\.[a-z0-9-]+)+$/, 'Write the id like gb.income-tax.individual.'),
  title: sentence.describe('What the rule is about, as people read it'),
  classes: z.array(classIdSchema).min(1).describe('Kinds of paper it is for'),
  roles: z.array(caseRoleSchema).min(1).optional().describe('Whose papers; all when absent'),
  /** What happens while the role is not known: counted (the default), or counted only with these inputs. */
  ifRoleUnknown: z.strictObject({ onlyWith: inputNameSchema }).optional(),
  regions: z.array(z.string()).min(1).optional(),
  exceptRegions: z.array(z.string()).min(1).optional(),
  ifRegionUnknown: z.enum(['count', 'skip']).default('count'),
  documentKind: kindConditionSchema.optional(),
  recordKind: kindConditionSchema.optional(),
  when: z
    .partialRecord(inputNameSchema, z.enum(conditionValues))
    .optional()
    .describe('Answers that let the rule apply'),
  /**
   * An addition (a practice's own rule) is asked beside all others and takes none's place: it can only make the
   * time longer.
   */
  addition: z.boolean().default(false).describe('Asked beside all other rules; only lengthens'),
  keep: keepSchema,
  disposal: z.enum(disposals).optional(),
  original: z.enum(originals).default('scan-is-enough'),
  originalCondition: sentence.optional(),
  /** Classes of the rule for which it is otherwise. */
  originalFor: z.partialRecord(classIdSchema, z.enum(originals)).optional(),
  cautions: z.array(sentence).default([]),
  advised: z.array(advisedSchema).default([]),
  basis: basisSchema,
  source: ruleSourceSchema,
  /** The law in force on the trigger decides: first and last trigger day for which the rule holds. */
  validFrom: isoDateSchema.optional().describe('First trigger day for which it holds'),
  validTo: isoDateSchema.optional().describe('Last trigger day for which it holds'),
  reviewBy: isoDateSchema.optional().describe('By when its source is to be checked again'),
  note: sentence.optional().describe('Where sources disagree, and which one counts'),
});
export type Rule = z.infer<typeof ruleSchema>;
export type RuleSource = z.infer<typeof ruleSourceSchema>;

const limitationSchema = z.strictObject({
  /** Where the region is known and not listed. */
  usual: periodSchema,
  /** While the region is not known: the longest. */
  unknownRegion: periodSchema,
  regions: z.record(z.string(), periodSchema).default({}),
  /** The clock starts at the end of the calendar year. */
  fromYearEnd: z.boolean().default(false),
});
export type Limitation = z.infer<typeof limitationSchema>;

export const ruleTableSchema = z.strictObject({
  country: z.string().regex(/^([A-Z]{2}|common)$/, 'Give two capital letters, or "common".'),
  name: z.string().min(2),
  reviewBy: isoDateSchema,
  authorities: z.array(z.string().min(2)).min(1),
  regions: z.array(z.string()).default([]),
  limitation: z
    .strictObject({ contract: limitationSchema, deed: limitationSchema, injury: limitationSchema })
    .optional(),
  /** Classes for which no rule of this country is known: they stay open. */
  noRule: z.array(classIdSchema).default([]),
  rules: z.array(ruleSchema),
});
export type RuleTable = z.infer<typeof ruleTableSchema>;

/** What a class needs on its way out, the same in every country (`rules/handling.yaml`). */
export const handlingSchema = z.strictObject({
  classes: z.partialRecord(
    classIdSchema,
    z.strictObject({
      level: securityLevelSchema.nullable(),
      disposal: z.enum(disposals),
      caution: sentence.optional(),
    }),
  ),
});
export type Handling = z.infer<typeof handlingSchema>;
