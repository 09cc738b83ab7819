/** A person's corrections of facts, laid over what was read. Pure. */
import type { z } from 'zod';
import type { ClassId } from '../../contract/document-classes.ts';
import type { factsPatchSchema } from '../../contract/papers.ts';
import { type DateFact, dateRoles, type Facts, type TextFact } from '../../contract/readings.ts';
import { keyDateFor } from '../../reading/facts/key-date.ts';

export type FactsPatch = z.infer<typeof factsPatchSchema>;

/** The facts with the corrections in; the key date is worked out anew for the class. */
export function patchFacts(
  facts: Facts,
  patch: FactsPatch,
  classId: ClassId,
  country: string,
): Facts {
  const dates = { ...facts.dates };
  for (const role of dateRoles) {
    const given = patch.dates?.[role];
    if (given !== undefined) dates[role] = correctDate(facts.dates[role], given);
  }
  return withKeyDate(
    {
      ...facts,
      dates,
      taxYear: patch.taxYear === undefined ? facts.taxYear : patch.taxYear,
      reference: correctText(facts.reference, patch.reference),
      issuer: correctText(facts.issuer, patch.issuer),
      addressee: correctText(facts.addressee, patch.addressee),
    },
    classId,
    country,
  );
}

/** The facts with the key date that belongs to the class. */
export function withKeyDate(facts: Facts, classId: ClassId, country: string): Facts {
  return { ...facts, keyDate: keyDateFor(classId, facts, country) };
}

/** A date that a person gave is certain; its place stays when it is the date that was read there. */
function correctDate(before: DateFact | null, value: string | null): DateFact | null {
  if (value === null) return null;
  if (before?.value === value) return { ...before, confidence: 1 };
  return { value, confidence: 1, seenAt: null, printed: null };
}

function correctText(before: TextFact | null, value: string | null | undefined): TextFact | null {
  if (value === undefined) return before;
  if (value === null || value === '') return null;
  if (before?.value === value) return { ...before, confidence: 1 };
  return { value, confidence: 1, seenAt: null };
}
