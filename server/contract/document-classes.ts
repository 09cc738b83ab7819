/**
 * The kinds of paper that come out of a household's boxes, in the order screens list them.
 * Ids are stable: rule tables, vocabulary, database and API all use them. How long a class is kept is
 * the business of the rule tables.
 */
import { z } from 'zod';

export const classGroups = [
  'identity',
  'tax',
  'work',
  'banking',
  'saving',
  'home',
  'vehicle',
  'insurance',
  'bills',
  'purchases',
  'health',
  'education',
  'legal',
  'business',
  'personal',
  'discard',
  'finds',
  'none',
] as const;
export type ClassGroup = (typeof classGroups)[number];

export const classGroupLabels: Record<ClassGroup, string> = {
  identity: 'Identity',
  tax: 'Tax',
  work: 'Work',
  banking: 'Banking',
  saving: 'Saving',
  home: 'Home',
  vehicle: 'Vehicle',
  insurance: 'Insurance',
  bills: 'Bills',
  purchases: 'Purchases',
  health: 'Health',
  education: 'Education',
  legal: 'Legal',
  business: 'Business',
  personal: 'Personal',
  discard: 'Discard',
  finds: 'Finds',
  none: 'Not recognised',
};

export interface DocumentClass {
  id: string;
  group: ClassGroup;
  /** What screens call it. */
  label: string;
  /** One line for the person who chooses it. */
  covers: string;
}

export const documentClasses = [
  {
    id: 'passport',
    group: 'identity',
    label: 'Passport',
    covers: 'the photo page, or any page of a passport or passport card',
  },
  {
    id: 'driving-licence',
    group: 'identity',
    label: 'Driving licence',
    covers: "a driving licence or driver's license, card or paper",
  },
  {
    id: 'birth-certificate',
    group: 'identity',
    label: 'Birth certificate',
    covers: 'birth or adoption certificate',
  },
  {
    id: 'marriage-certificate',
    group: 'identity',
    label: 'Marriage certificate',
    covers: 'marriage or civil partnership certificate',
  },
  {
    id: 'death-certificate',
    group: 'identity',
    label: 'Death certificate',
    covers: 'death certificate',
  },
  {
    id: 'immigration-paper',
    group: 'identity',
    label: 'Visa, permit or citizenship paper',
    covers: 'visa, residence permit, naturalisation or citizenship certificate',
  },
  {
    id: 'national-id-number',
    group: 'identity',
    label: 'Tax or social security number letter',
    covers:
      'social security card, National Insurance number letter, tax file number notice and the like',
  },
  {
    id: 'tax-return',
    group: 'tax',
    label: 'Tax return',
    covers: 'a personal or business income tax return, filed copy or draft',
  },
  {
    id: 'tax-assessment',
    group: 'tax',
    label: 'Notice from the tax office',
    covers: "the authority's notice: assessment, calculation, refund, code notice",
  },
  {
    id: 'annual-pay-statement',
    group: 'tax',
    label: 'Year-end pay statement',
    covers: "the year's pay and tax from an employer (P60, P45, W-2, T4, payment summary)",
  },
  {
    id: 'investment-income-statement',
    group: 'tax',
    label: 'Interest or dividend statement',
    covers:
      "the year's interest or dividends (1099-INT, 1099-DIV, T5, dividend voucher, interest certificate)",
  },
  {
    id: 'donation-receipt',
    group: 'tax',
    label: 'Donation receipt',
    covers: 'gift receipt from a charity',
  },
  {
    id: 'sales-tax-return',
    group: 'tax',
    label: 'VAT or sales tax return',
    covers: 'VAT, GST or sales tax return',
  },
  { id: 'payslip', group: 'work', label: 'Pay slip', covers: 'pay slip, pay stub' },
  {
    id: 'employment-contract',
    group: 'work',
    label: 'Employment contract',
    covers: 'contract, offer letter, change of terms, reference',
  },
  {
    id: 'bank-statement',
    group: 'banking',
    label: 'Bank statement',
    covers: 'current, checking or savings account statement',
  },
  {
    id: 'card-statement',
    group: 'banking',
    label: 'Card statement',
    covers: 'credit or charge card statement',
  },
  {
    id: 'loan-agreement',
    group: 'banking',
    label: 'Loan agreement',
    covers: 'loan, finance, hire purchase agreement',
  },
  {
    id: 'loan-settlement',
    group: 'banking',
    label: 'Loan paid-off letter',
    covers: 'paid-in-full letter, discharge, release of lien',
  },
  {
    id: 'mortgage-statement',
    group: 'banking',
    label: 'Mortgage statement',
    covers: 'mortgage statement or offer',
  },
  {
    id: 'pension-statement',
    group: 'saving',
    label: 'Pension statement',
    covers: 'pension or retirement account statement or forecast',
  },
  {
    id: 'investment-statement',
    group: 'saving',
    label: 'Investment statement',
    covers: 'portfolio, brokerage or fund statement',
  },
  {
    id: 'trade-note',
    group: 'saving',
    label: 'Share or fund trade note',
    covers: 'contract note or confirmation of a purchase or sale of shares or funds',
  },
  {
    id: 'property-deed',
    group: 'home',
    label: 'Property deed',
    covers: 'deed, title, transfer, land registry document, completion statement',
  },
  {
    id: 'tenancy-agreement',
    group: 'home',
    label: 'Tenancy agreement',
    covers: 'lease, tenancy agreement, inventory, deposit certificate',
  },
  {
    id: 'home-improvement-invoice',
    group: 'home',
    label: 'Home improvement invoice',
    covers: 'invoice for work that improves a property',
  },
  {
    id: 'property-tax-bill',
    group: 'home',
    label: 'Property or council tax bill',
    covers: 'council tax, rates, property tax bill',
  },
  {
    id: 'building-certificate',
    group: 'home',
    label: 'Building or safety certificate',
    covers: 'planning or building approval, gas, electrical, energy or window certificate',
  },
  {
    id: 'property-survey',
    group: 'home',
    label: 'Property survey or valuation',
    covers: 'survey, valuation, appraisal',
  },
  {
    id: 'vehicle-registration',
    group: 'vehicle',
    label: 'Vehicle registration',
    covers: 'registration document, title, proof of ownership',
  },
  {
    id: 'vehicle-service',
    group: 'vehicle',
    label: 'Vehicle test or service',
    covers: 'inspection or roadworthiness certificate, service or repair invoice',
  },
  {
    id: 'penalty-notice',
    group: 'vehicle',
    label: 'Parking or traffic penalty',
    covers: 'parking or traffic penalty',
  },
  {
    id: 'insurance-policy',
    group: 'insurance',
    label: 'Insurance policy',
    covers: 'schedule, certificate, renewal of any insurance',
  },
  {
    id: 'insurance-claim',
    group: 'insurance',
    label: 'Insurance claim',
    covers: 'claim form, loss report, settlement letter',
  },
  {
    id: 'utility-bill',
    group: 'bills',
    label: 'Utility bill',
    covers: 'electricity, gas, oil, water bill',
  },
  {
    id: 'telecom-bill',
    group: 'bills',
    label: 'Phone or broadband bill',
    covers: 'phone, mobile, broadband, television bill',
  },
  {
    id: 'membership',
    group: 'bills',
    label: 'Membership or subscription',
    covers: 'club, gym, union, magazine or streaming subscription',
  },
  {
    id: 'purchase-receipt',
    group: 'purchases',
    label: 'Purchase receipt',
    covers: 'till receipt, order confirmation, delivery note for a household purchase',
  },
  {
    id: 'warranty',
    group: 'purchases',
    label: 'Warranty',
    covers: 'guarantee, warranty, extended cover',
  },
  {
    id: 'user-manual',
    group: 'purchases',
    label: 'User manual',
    covers: 'instructions, manual, parts list',
  },
  {
    id: 'medical-record',
    group: 'health',
    label: 'Medical letter or result',
    covers: 'letter from a doctor or hospital, test result, prescription',
  },
  {
    id: 'medical-bill',
    group: 'health',
    label: 'Medical bill',
    covers: 'medical, dental, optical bill or benefits explanation',
  },
  {
    id: 'vaccination-record',
    group: 'health',
    label: 'Vaccination record',
    covers: 'immunisation record',
  },
  {
    id: 'education-certificate',
    group: 'education',
    label: 'Education certificate',
    covers: 'diploma, degree, exam certificate, transcript, licence to practise',
  },
  {
    id: 'school-report',
    group: 'education',
    label: 'School report',
    covers: 'school report, report card, school letter',
  },
  { id: 'will', group: 'legal', label: 'Will', covers: 'will, codicil, letter of wishes' },
  {
    id: 'power-of-attorney',
    group: 'legal',
    label: 'Power of attorney',
    covers: 'power of attorney, health care directive',
  },
  {
    id: 'court-document',
    group: 'legal',
    label: 'Court document',
    covers: 'court order, divorce order, judgment, claim form',
  },
  {
    id: 'estate-paper',
    group: 'legal',
    label: 'Estate paper',
    covers: 'probate or letters of administration, estate account, inheritance paper',
  },
  {
    id: 'benefit-award',
    group: 'legal',
    label: 'Benefit or state pension award',
    covers: 'state benefit, state pension or allowance award',
  },
  {
    id: 'service-contract',
    group: 'legal',
    label: 'Service contract',
    covers: 'contract for a service that is not employment, tenancy, loan or insurance',
  },
  {
    id: 'sales-invoice',
    group: 'business',
    label: 'Invoice sent (sales)',
    covers: "an invoice that the household's own business issued",
  },
  {
    id: 'supplier-invoice',
    group: 'business',
    label: 'Invoice received (business)',
    covers: "an invoice or bill addressed to the household's own business",
  },
  {
    id: 'business-accounts',
    group: 'business',
    label: 'Business accounts',
    covers: 'accounts, ledger, cash book, trial balance, stock list',
  },
  {
    id: 'payroll-record',
    group: 'business',
    label: 'Payroll record',
    covers: "payroll run, employer's tax payment, employee record",
  },
  {
    id: 'company-record',
    group: 'business',
    label: 'Company record',
    covers: 'incorporation certificate, minutes, share certificate, register',
  },
  {
    id: 'personal-letter',
    group: 'personal',
    label: 'Personal letter or card',
    covers: 'private letter, greeting card, postcard',
  },
  {
    id: 'keepsake',
    group: 'personal',
    label: 'Keepsake',
    covers: "child's drawing, programme, ticket, clipping kept for memory",
  },
  {
    id: 'circular',
    group: 'discard',
    label: 'Advertising or newsletter',
    covers: 'advertising mail, catalogue, flyer, menu, newsletter',
  },
  {
    id: 'envelope',
    group: 'discard',
    label: 'Envelope or cover sheet',
    covers: 'an envelope, a cover sheet, a compliments slip',
  },
  {
    id: 'bearer-paper',
    group: 'finds',
    label: 'Share certificate, bond or uncashed cheque',
    covers:
      'share or bond certificate, savings certificate, uncashed cheque: worth money as a piece of paper',
  },
  {
    id: 'secret-note',
    group: 'finds',
    label: 'Note of passwords or PINs',
    covers: 'passwords, PINs, recovery codes, safe combinations',
  },
  {
    id: 'payment-card',
    group: 'finds',
    label: 'Bank card or cheque book',
    covers: 'a bank or credit card, a cheque book',
  },
  {
    id: 'name-change',
    group: 'identity',
    label: 'Change of name deed',
    covers: 'deed poll, change of name',
  },
  {
    id: 'service-record',
    group: 'identity',
    label: 'Military or public service record',
    covers: 'military or public service record, medal certificate',
  },
  {
    id: 'trust-deed',
    group: 'legal',
    label: 'Trust deed or deed of gift',
    covers: 'trust deed, deed of gift',
  },
  {
    id: 'care-plan',
    group: 'health',
    label: 'Care or funeral plan',
    covers: 'care assessment, care contract, funeral plan',
  },
  { id: 'photograph', group: 'personal', label: 'Photograph', covers: 'photographs and albums' },
  {
    id: 'unrecognised',
    group: 'none',
    label: 'Not recognised yet',
    covers: 'the reader cannot tell: a person decides',
  },
] as const satisfies readonly DocumentClass[];

export type ClassId = (typeof documentClasses)[number]['id'];
export const classIds = documentClasses.map((c) => c.id) as [ClassId, ...ClassId[]];
export const classIdSchema = z.enum(classIds, {
  error: (issue) => `There is no kind of paper "${String(issue.input)}".`,
});

const byId = new Map<string, DocumentClass>(documentClasses.map((c) => [c.id, c]));

/** The class with this id; throws RangeError when there is none. */
export function requireClass(id: string): DocumentClass {
  const found = byId.get(id);
  if (!found) throw new RangeError(`There is no document class "${id}".`);
  return found;
}

/** What screens call a class; an unknown id is shown as it is. */
export function classLabel(id: string): string {
  return byId.get(id)?.label ?? id;
}
