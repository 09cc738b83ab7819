/** From what was read on a paper to the inputs of the retention sum. Pure: no day, no database. */
import type { CaseInputs } from '../contract/cases.ts';
import type { ClassId } from '../contract/document-classes.ts';
import type { DateRole, Facts } from '../contract/readings.ts';

type InputName = keyof CaseInputs;
type Dates = Partial<Record<DateRole, string>>;

/** Which date of the paper answers which question of the sum: the first role that was read is taken. */
type Mapping = Partial<Record<InputName, readonly DateRole[]>>;

const paperDate = ['issued', 'eventDate', 'periodEnd'] as const;
const bill: Mapping = { documentDate: paperDate };
const invoice: Mapping = {
  documentDate: paperDate,
  invoiceDate: ['issued', 'eventDate', 'periodEnd'],
  supplyDate: ['eventDate'],
};
/** Documents that are of no use after the day printed on them. */
const expiring: Mapping = { documentDate: ['issued', 'periodStart'], endedOn: ['expiry'] };

/**
 * Dates that a class has beyond the date of the paper. A printed end of a tenancy, employment, loan or
 * service is not taken as its end: such contracts often run on, and what is not known keeps longer.
 */
const mappings: Partial<Record<ClassId, Mapping>> = {
  passport: expiring,
  'driving-licence': expiring,
  'immigration-paper': expiring,
  payslip: { documentDate: ['issued', 'eventDate', 'periodEnd'] },
  'payroll-record': { documentDate: paperDate, payReferencePeriodEnd: ['periodEnd'] },
  'business-accounts': {
    documentDate: ['periodEnd', 'issued'],
    financialYearEnd: ['periodEnd'],
    drawnUpOn: ['issued'],
  },
  'sales-tax-return': { documentDate: ['issued', 'periodEnd'], quarterEnd: ['periodEnd'] },
  'property-tax-bill': { documentDate: ['issued', 'periodStart'], endedOn: ['periodEnd'] },
  'trade-note': { documentDate: ['issued', 'eventDate'], transactionDate: ['eventDate', 'issued'] },
  'property-deed': {
    documentDate: ['issued', 'eventDate'],
    effectiveDate: ['eventDate', 'issued'],
  },
  'property-survey': {
    documentDate: ['issued', 'eventDate'],
    valuationDate: ['eventDate', 'issued'],
  },
  'estate-paper': { documentDate: ['issued', 'eventDate'] },
  'company-record': { documentDate: ['issued', 'eventDate'], meetingDate: ['eventDate', 'issued'] },
  'court-document': { documentDate: ['issued', 'eventDate'], finalOn: ['eventDate'] },
  'tenancy-agreement': { documentDate: ['issued', 'eventDate'], startedOn: ['periodStart'] },
  'employment-contract': {
    documentDate: ['issued'],
    startedOn: ['eventDate', 'periodStart'],
  },
  'service-contract': { documentDate: ['issued', 'eventDate'], startedOn: ['periodStart'] },
  'loan-agreement': { documentDate: ['issued', 'eventDate'], startedOn: ['periodStart'] },
  'loan-settlement': { documentDate: ['issued'], endedOn: ['eventDate', 'issued'] },
  'insurance-policy': {
    documentDate: ['issued', 'periodStart'],
    startedOn: ['periodStart'],
    endedOn: ['expiry', 'periodEnd'],
  },
  'insurance-claim': { documentDate: ['issued', 'eventDate'], eventDate: ['eventDate'] },
  membership: {
    documentDate: ['issued', 'periodStart'],
    startedOn: ['periodStart'],
    endedOn: ['expiry', 'periodEnd'],
  },
  warranty: {
    documentDate: ['issued', 'eventDate'],
    deliveredOn: ['eventDate', 'periodStart', 'issued'],
    warrantyEndsOn: ['expiry', 'periodEnd'],
  },
  'purchase-receipt': {
    documentDate: ['issued', 'eventDate'],
    deliveredOn: ['eventDate', 'issued'],
  },
  'home-improvement-invoice': invoice,
  'sales-invoice': { ...invoice, transactionDate: ['eventDate', 'issued'] },
  'supplier-invoice': { ...invoice, transactionDate: ['eventDate', 'issued'] },
  'vehicle-service': invoice,
  'medical-record': { documentDate: ['issued', 'eventDate'], eventDate: ['eventDate'] },
  'medical-bill': { documentDate: ['issued', 'periodEnd', 'eventDate'] },
  will: { documentDate: ['issued', 'eventDate'], signedOn: ['eventDate', 'issued'] },
  'power-of-attorney': { documentDate: ['issued', 'eventDate'], signedOn: ['eventDate', 'issued'] },
  'personal-letter': { documentDate: ['issued'], writtenOn: ['issued'] },
};

/**
 * The inputs that the paper's own dates answer, in the names of the retention sum. What the paper does
 * not say stays absent, that is: not known. `extra` comes from elsewhere (circumstances, subject, holds,
 * answers of a person) and has the last word; its `undefined` values leave the paper's answer in place.
 */
export function caseInputsFromFacts(
  classId: ClassId,
  country: string,
  facts: Facts,
  extra: CaseInputs = {},
): CaseInputs {
  const dates = collectDates(facts);
  const inputs: CaseInputs = {};
  const mapping = mappings[classId] ?? bill;
  for (const [name, roles] of Object.entries(mapping) as [InputName, readonly DateRole[]][]) {
    const role = roles.find((candidate) => dates[candidate] !== undefined);
    if (role) Object.assign(inputs, { [name]: dates[role] });
  }
  Object.assign(inputs, nameTaxYear(country, facts.taxYear));
  for (const [name, value] of Object.entries(extra)) {
    if (value !== undefined) Object.assign(inputs, { [name]: value });
  }
  return inputs;
}

function collectDates(facts: Facts): Dates {
  const dates: Dates = {};
  for (const [role, fact] of Object.entries(facts.dates) as [
    DateRole,
    { value: string } | null,
  ][]) {
    if (fact) dates[role] = fact.value;
  }
  return dates;
}

/**
 * The tax year in the country's own input. GB years end on 5 April (ITA 2007 s.4), AU income years on
 * 30 June (ITAA 1997 s.4-10); US, CA and IE years carry the calendar year's number.
 */
function nameTaxYear(country: string, taxYear: string | null): CaseInputs {
  const first = Number(/^(\d{4})/.exec(taxYear ?? '')?.[1]);
  if (!Number.isInteger(first) || first < 1800) return {};
  const last = /^\d{4}[-/]\d{2,4}$/.test(taxYear ?? '') ? first + 1 : first;
  if (country === 'GB') return { taxYearEnd: `${last}-04-05` };
  if (country === 'AU') return { incomeYearEnd: `${last}-06-30` };
  if (country === 'US' || country === 'CA' || country === 'IE') return { taxYear: first };
  return {};
}
