/**
 * Moments: days from which a clock can start. Most are inputs of the case; some are worked out from others
 * when they are not given, and say so.
 */
import type { CaseInputs } from '../contract/cases.ts';
import { ownerInputsSchema } from '../contract/cases.ts';
import type { IsoDate } from '../contract/dates.ts';
import {
  addMonths,
  addYears,
  endOfMonth,
  endOfYearEnding,
  findLatest,
  isEndOfMonth,
  laterOf,
  makeDay,
  wordDay,
} from './dates.ts';

export type InputName = keyof Omit<CaseInputs, 'owners'>;
/** Every input a rule may name, taken from the contract so that none can be misspelt. */
export const inputNames = Object.keys(ownerInputsSchema.shape) as [InputName, ...InputName[]];

/** Inputs that are days. */
export const dayInputs = [
  'documentDate',
  'invoiceDate',
  'writtenOn',
  'receivedOn',
  'signedOn',
  'supersededOn',
  'drawnUpOn',
  'meetingDate',
  'effectiveDate',
  'transactionDate',
  'transactionCompletedOn',
  'obtainedOn',
  'supplyDate',
  'paidOn',
  'taxYearEnd',
  'incomeYearEnd',
  'financialYearEnd',
  'quarterEnd',
  'payReferencePeriodEnd',
  'nextPayReferencePeriodEnd',
  'filedOn',
  'lodgedOn',
  'returnDeliveredOn',
  'returnReceivedOn',
  'dueOn',
  'nominalDueOn',
  'statutoryDueOn',
  'extendedDueOn',
  'noticeToFileOn',
  'amendedOn',
  'amendedReturnReceivedOn',
  'taxDueOn',
  'taxPaidOn',
  'noticeOfAssessmentOn',
  'acquiredOn',
  'startedOn',
  'endedOn',
  'disposedOn',
  'acceptedOn',
  'deliveredOn',
  'warrantyEndsOn',
  'hiredOn',
  'finalOn',
  'valuationDate',
  'clearanceCertificateOn',
  'socialSecurityBenefitsBeganOn',
  'birthDate',
  'eventDate',
] as const satisfies readonly InputName[];
export type DayInput = (typeof dayInputs)[number];

/** Moments that are worked out: tax years, the date of the paper, the end of the next pay period. */
const derivedMoments = [
  'paperDate',
  'gbTaxYear',
  'auIncomeYear',
  'calendarTaxYear',
  'claimYearEnd',
  'irishTransactionYear',
  'nextPayPeriod',
  'employmentTaxDue',
  'companyYear',
  'councilYear',
] as const;
export type DerivedMoment = (typeof derivedMoments)[number];
export const momentNames = [...dayInputs, ...derivedMoments] as const;
export type Moment = DayInput | DerivedMoment;

/** A resolved moment: `day` null with `isNever` true when the case says that it has not happened. */
export interface ResolvedMoment {
  readonly day: IsoDate | null;
  readonly isNever: boolean;
  /** What the day is, for a step: "tax year ending". */
  readonly label: string;
  /** How it was worked out, when it was not given. */
  readonly derivedBy: string | null;
}

const labels: Record<Moment, string> = {
  documentDate: 'the date on the paper',
  invoiceDate: 'the date of the invoice',
  writtenOn: 'the day it was written',
  receivedOn: 'the day it was received',
  signedOn: 'the day it was signed',
  supersededOn: 'the day it was replaced',
  drawnUpOn: 'the day it was drawn up',
  meetingDate: 'the day of the meeting',
  effectiveDate: 'the effective date',
  transactionDate: 'the day of the transaction',
  transactionCompletedOn: 'the day the transaction was completed',
  obtainedOn: 'the day the record was prepared or obtained',
  supplyDate: 'the day of supply',
  paidOn: 'the day of payment',
  taxYearEnd: 'the end of the tax year',
  incomeYearEnd: 'the end of the income year',
  financialYearEnd: 'the end of the financial year',
  quarterEnd: 'the end of the quarter',
  payReferencePeriodEnd: 'the end of the pay reference period',
  nextPayReferencePeriodEnd: 'the end of the pay reference period after it',
  filedOn: 'the day the return was filed',
  lodgedOn: 'the day the return was lodged',
  returnDeliveredOn: 'the day the return was delivered',
  returnReceivedOn: 'the day the return was received',
  dueOn: 'the due day',
  nominalDueOn: 'the due day before any shift',
  statutoryDueOn: 'the due day in the statute',
  extendedDueOn: 'the extended due day',
  noticeToFileOn: 'the day of the notice to file',
  amendedOn: 'the day the return was amended',
  amendedReturnReceivedOn: 'the day the amended return was received',
  taxDueOn: 'the day the tax was due',
  taxPaidOn: 'the day the tax was paid',
  noticeOfAssessmentOn: 'the day of the notice of assessment',
  acquiredOn: 'the day it was bought',
  startedOn: 'the day it began',
  endedOn: 'the day it ended',
  disposedOn: 'the day it was sold or given up',
  acceptedOn: 'the day the work was accepted',
  deliveredOn: 'the day of delivery',
  warrantyEndsOn: 'the day the warranty ends',
  hiredOn: 'the day of hiring',
  finalOn: 'the day the order or judgment became final',
  valuationDate: 'the valuation date',
  clearanceCertificateOn: 'the day the clearance certificate was received',
  socialSecurityBenefitsBeganOn: 'the day Social Security benefits began',
  birthDate: 'the date of birth',
  eventDate: 'the day of the event',
  paperDate: 'the date of the paper',
  gbTaxYear: 'the end of the tax year',
  auIncomeYear: 'the end of the income year',
  calendarTaxYear: 'the end of the tax year',
  claimYearEnd: 'the end of the year claimed for',
  irishTransactionYear: 'the end of the tax year of the transaction',
  nextPayPeriod: 'the end of the pay reference period after it',
  employmentTaxDue: 'the day the tax was due',
  companyYear: 'the end of the financial year',
  councilYear: 'the end of the council-tax year',
};

/** What a moment is called in a sentence. */
export function momentLabel(moment: Moment): string {
  return labels[moment];
}

const paperDates = [
  'documentDate',
  'invoiceDate',
  'writtenOn',
  'drawnUpOn',
  'signedOn',
  'transactionDate',
  'supplyDate',
  'obtainedOn',
  'receivedOn',
  'paidOn',
] as const satisfies readonly DayInput[];

/** The date of the paper: the first of its dates that is given. */
export function findPaperDate(inputs: CaseInputs): IsoDate | null {
  for (const name of paperDates) {
    const day = inputs[name];
    if (day) return day;
  }
  return null;
}

/** A day inside the year to which a paper belongs, when the year itself is not given. */
function findDayInYear(inputs: CaseInputs): IsoDate | null {
  return (
    inputs.payReferencePeriodEnd ??
    inputs.quarterEnd ??
    inputs.transactionDate ??
    findPaperDate(inputs)
  );
}

const found = (moment: Moment, day: IsoDate, derivedBy: string | null = null): ResolvedMoment => ({
  day,
  isNever: false,
  label: labels[moment],
  derivedBy,
});
const missing = (moment: Moment, isNever = false): ResolvedMoment => ({
  day: null,
  isNever,
  label: labels[moment],
  derivedBy: null,
});

/** Inputs that name a period or a paper's own date: `null` there means no more than "not given". */
const notEvents = new Set<Moment>([
  ...paperDates.filter((name) => name !== 'paidOn'),
  'effectiveDate',
  'meetingDate',
  'taxYearEnd',
  'incomeYearEnd',
  'financialYearEnd',
  'quarterEnd',
  'payReferencePeriodEnd',
  'nextPayReferencePeriodEnd',
]);

/**
 * A paper used for a disposal, or for a transaction over several years, counts from the year of the disposal or
 * of the completion, never from an earlier one.
 */
function resolveYear(
  moment: Moment,
  inputs: CaseInputs,
  given: IsoDate | null,
  endOf: (day: IsoDate) => IsoDate,
  waitsFor: DayInput | null,
): ResolvedMoment {
  const disposal = waitsFor ? inputs[waitsFor] : null;
  // The disposal decides the year of its papers; without one the day of the paper does.
  const day = disposal ?? findDayInYear(inputs);
  const last = findLatest([given === null || disposal ? day : null, inputs.transactionCompletedOn]);
  const end = last ? endOf(last) : null;
  if (given !== null) return found(moment, end ? laterOf(given, end) : given);
  if (!last || !end) return missing(moment);
  return found(moment, end, `${wordDay(last)} falls in the year that ends on ${wordDay(end)}.`);
}

const endOfGbTaxYear = (day: IsoDate): IsoDate => endOfYearEnding(day, '04-05');
const endOfAuIncomeYear = (day: IsoDate): IsoDate => endOfYearEnding(day, '06-30');
const endOfYear = (day: IsoDate): IsoDate => endOfYearEnding(day, '12-31');

/** The company year given, moved on in whole years until it holds a later disposal or completion. */
function resolveCompanyYear(inputs: CaseInputs, waitsFor: DayInput | null): ResolvedMoment {
  const given = inputs.financialYearEnd;
  if (!given) return missing('companyYear');
  const event = findLatest([waitsFor ? inputs[waitsFor] : null, inputs.transactionCompletedOn]);
  if (!event || event <= given) return found('companyYear', given);
  let end = given;
  for (let years = 1; end < event && years <= 600; years += 1) {
    const moved = addYears(given, years);
    end = isEndOfMonth(given) ? endOfMonth(moved) : moved;
  }
  return found(
    'companyYear',
    end,
    `${wordDay(event)} falls in the year that ends on ${wordDay(end)}.`,
  );
}

/**
 * Bills of a council-tax year are sent out in the weeks before it starts, so one dated in February or March
 * belongs to the year that follows; one dated 31 March is the year's own last day.
 */
function endOfCouncilYear(day: IsoDate): IsoDate {
  const monthDay = day.slice(5);
  const isAhead = monthDay >= '02-01' && monthDay <= '03-30';
  return endOfYearEnding(isAhead ? `${day.slice(0, 4)}-04-01` : day, '03-31');
}

/** The council-tax year: the period on the bill when it is given, else the year of its date. */
function resolveCouncilYear(inputs: CaseInputs): ResolvedMoment {
  const { taxYearEnd } = inputs;
  // The tax year that ends on 5 April is the council-tax year that ended five days before.
  const sameYear = taxYearEnd ? `${taxYearEnd.slice(0, 4)}-03-31` : null;
  const stated = findLatest([inputs.financialYearEnd, inputs.endedOn, sameYear]);
  if (stated) {
    const end = endOfYearEnding(stated, '03-31');
    return found('councilYear', end);
  }
  const day = findPaperDate(inputs);
  if (!day) return missing('councilYear');
  const end = endOfCouncilYear(day);
  return found('councilYear', end, `A bill of ${wordDay(day)} is for the year to ${wordDay(end)}.`);
}

/** The end of the pay reference period after the recorded one; it is never longer than a month. */
function resolveNextPayPeriod(inputs: CaseInputs): ResolvedMoment {
  const given = inputs.nextPayReferencePeriodEnd;
  if (given) return found('nextPayPeriod', given);
  const end = inputs.payReferencePeriodEnd;
  if (!end) return missing('nextPayPeriod');
  const next = isEndOfMonth(end) ? endOfMonth(addMonths(end, 1)) : addMonths(end, 1);
  return found(
    'nextPayPeriod',
    next,
    `The next pay period is counted as a month: it ends on ${wordDay(next)}.`,
  );
}

/** US employment tax of a quarter is due on the last day of the month after it. */
function resolveEmploymentTaxDue(inputs: CaseInputs): ResolvedMoment {
  if (inputs.taxDueOn) return found('employmentTaxDue', inputs.taxDueOn);
  if (!inputs.quarterEnd) return missing('employmentTaxDue');
  const due = endOfMonth(addMonths(inputs.quarterEnd, 1));
  return found('employmentTaxDue', due, `Tax of the quarter was due on ${wordDay(due)}.`);
}

/** Finds the day of a moment in a case. `waitsFor` is the event that decides the year, if any. */
export function resolveMoment(
  moment: Moment,
  inputs: CaseInputs,
  waitsFor: DayInput | null = null,
): ResolvedMoment {
  switch (moment) {
    case 'paperDate': {
      const day = findPaperDate(inputs);
      return day ? found(moment, day) : missing(moment);
    }
    case 'gbTaxYear': {
      const given =
        inputs.taxYearEnd ?? (inputs.taxYear ? makeDay(inputs.taxYear + 1, 4, 5) : null);
      return resolveYear(moment, inputs, given, endOfGbTaxYear, waitsFor);
    }
    case 'auIncomeYear':
      return resolveYear(moment, inputs, inputs.incomeYearEnd ?? null, endOfAuIncomeYear, waitsFor);
    case 'calendarTaxYear': {
      const given = inputs.taxYear ? makeDay(inputs.taxYear, 12, 31) : null;
      return resolveYear(moment, inputs, given, endOfYear, waitsFor);
    }
    case 'claimYearEnd': {
      const year = inputs.claimYear ?? inputs.taxYear ?? null;
      if (year) return found(moment, makeDay(year, 12, 31));
      const day = inputs.paidOn ?? findPaperDate(inputs);
      if (!day) return missing(moment);
      return found(moment, endOfYear(day), `${wordDay(day)} falls in the year ${day.slice(0, 4)}.`);
    }
    case 'irishTransactionYear': {
      // The last year that uses the record counts: the tax year given, or the transaction's own.
      const given = inputs.taxYear ? makeDay(inputs.taxYear, 12, 31) : null;
      const completed = findLatest([inputs.transactionDate, inputs.transactionCompletedOn]);
      const year = completed && given ? laterOf(given, endOfYear(completed)) : given;
      return resolveYear(moment, inputs, year, endOfYear, waitsFor);
    }
    case 'nextPayPeriod':
      return resolveNextPayPeriod(inputs);
    case 'companyYear':
      return resolveCompanyYear(inputs, waitsFor);
    case 'councilYear':
      return resolveCouncilYear(inputs);
    case 'employmentTaxDue':
      return resolveEmploymentTaxDue(inputs);
    default: {
      const day = inputs[moment];
      return day ? found(moment, day) : missing(moment, day === null && !notEvents.has(moment));
    }
  }
}
