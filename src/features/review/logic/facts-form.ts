/** The form that corrects facts: texts in, a patch of what was changed out. */
import { factsPatchSchema, type UpdatePaper } from '../../../../server/contract/papers.ts';
import { dateRoles, type DateRole, type Facts } from '../../../../server/contract/readings.ts';

export interface FactsForm {
  dates: Record<DateRole, string>;
  taxYear: string;
  reference: string;
  issuer: string;
  addressee: string;
}

type FactsPatch = NonNullable<UpdatePaper['facts']>;
const textNames = ['taxYear', 'reference', 'issuer', 'addressee'] as const;

/** The form filled with what is known; empty text for nothing. */
export function fillFactsForm(facts: Facts): FactsForm {
  return {
    dates: {
      issued: facts.dates.issued?.value ?? '',
      due: facts.dates.due?.value ?? '',
      periodStart: facts.dates.periodStart?.value ?? '',
      periodEnd: facts.dates.periodEnd?.value ?? '',
      expiry: facts.dates.expiry?.value ?? '',
      eventDate: facts.dates.eventDate?.value ?? '',
    },
    taxYear: facts.taxYear ?? '',
    reference: facts.reference?.value ?? '',
    issuer: facts.issuer?.value ?? '',
    addressee: facts.addressee?.value ?? '',
  };
}

/** "2024/25", "2024–2025" and the like as the contract writes it: `2024-25`. */
export function normaliseTaxYear(text: string): string {
  const match = /^\s*(\d{4})\s*[-/–—]\s*(?:\d{2})?(\d{2})\s*$/.exec(text);
  return match ? `${match[1]}-${match[2]}` : text.trim();
}

export interface FieldFault {
  /** `taxYear` or `dates.issued`. */
  field: string;
  message: string;
}

/** What was changed, as a patch; an emptied field says that the paper shows none. Faults instead of a patch when it is not sound. */
export function buildFactsPatch(
  before: FactsForm,
  form: FactsForm,
): { patch: FactsPatch | null; faults: FieldFault[] } {
  const changed: Record<string, unknown> = {};
  const dates: Record<string, string | null> = {};
  for (const role of dateRoles) {
    if (form.dates[role] !== before.dates[role]) dates[role] = form.dates[role] || null;
  }
  if (Object.keys(dates).length > 0) changed.dates = dates;
  for (const name of textNames) {
    const value = name === 'taxYear' ? normaliseTaxYear(form[name]) : form[name].trim();
    if (value !== before[name]) changed[name] = value || null;
  }
  if (form.dates.periodStart && form.dates.periodEnd) {
    if (form.dates.periodStart > form.dates.periodEnd) {
      const message = 'The period cannot end before it begins.';
      return { patch: null, faults: [{ field: 'dates.periodEnd', message }] };
    }
  }
  if (Object.keys(changed).length === 0) return { patch: null, faults: [] };
  const parsed = factsPatchSchema.safeParse(changed);
  if (parsed.success) return { patch: parsed.data, faults: [] };
  return {
    patch: null,
    faults: parsed.error.issues.map((issue) => ({
      field: issue.path.join('.'),
      message: issue.message,
    })),
  };
}
