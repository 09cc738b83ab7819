/** Two people changed one paper: what differs, and what is left of my change when they have chosen. */
import { classLabel } from '../../../../server/contract/document-classes.ts';
import { pileLabels, type Paper, type UpdatePaper } from '../../../../server/contract/papers.ts';
import { dateRoles } from '../../../../server/contract/readings.ts';
import { dateRoleLabels, keptBecauseLabels } from './words.ts';

/** Values of a paper that people edit, each as text, by a key such as `class` or `facts.dates.issued`. */
export type EditableValues = Record<string, string | null>;

const statusWords: Record<Paper['status'], string> = {
  'to-review': 'To look at',
  undecided: 'Undecided',
  kept: 'Kept',
  leaving: 'Leaving',
  left: 'Left',
};

const labels: Record<string, string> = {
  class: 'Kind of paper',
  country: 'Country',
  pile: 'Pile',
  status: 'State',
  keptBecause: 'Kept because',
  place: 'Place',
  note: 'Note',
  practiceNote: 'Practice-only note',
  title: 'Title',
  sheets: 'Sheets',
  subjectId: 'What it is about',
  'facts.taxYear': 'Tax year',
  'facts.reference': 'Reference',
  'facts.issuer': 'From',
  'facts.addressee': 'To',
  ...Object.fromEntries(dateRoles.map((role) => [`facts.dates.${role}`, dateRoleLabels[role]])),
};

/** The editable values of a paper as they stand. */
export function listValues(paper: Paper): EditableValues {
  return {
    class: paper.class,
    country: paper.country,
    pile: paper.pile,
    status: paper.status,
    keptBecause: paper.keptBecause,
    place: paper.place,
    note: paper.note,
    practiceNote: paper.practiceNote,
    title: paper.title,
    sheets: String(paper.sheets),
    subjectId: paper.subjectId,
    'facts.taxYear': paper.facts.taxYear,
    'facts.reference': paper.facts.reference?.value ?? null,
    'facts.issuer': paper.facts.issuer?.value ?? null,
    'facts.addressee': paper.facts.addressee?.value ?? null,
    ...Object.fromEntries(
      dateRoles.map((role) => [`facts.dates.${role}`, paper.facts.dates[role]?.value ?? null]),
    ),
  };
}

/** The values that a patch sets. Answers to the rules' questions are not compared singly. */
export function listPatchValues(patch: UpdatePaper): EditableValues {
  const { facts, answers: _answers, ...plain } = patch;
  const values: EditableValues = {};
  for (const [key, value] of Object.entries(plain)) {
    if (value !== undefined) values[key] = value === null ? null : String(value);
  }
  const { dates, ...texts } = facts ?? {};
  for (const [key, value] of Object.entries(texts)) {
    if (value !== undefined) values[`facts.${key}`] = value;
  }
  for (const [role, value] of Object.entries(dates ?? {})) {
    values[`facts.dates.${role}`] = value ?? null;
  }
  return values;
}

export interface Difference {
  key: string;
  label: string;
  /** My value; undefined when I did not touch it and only the other person did. */
  mine: string | null | undefined;
  theirs: string | null;
}

/** Where my patch and the paper as it stands now differ, and what else was changed meanwhile. */
export function listDifferences(
  patch: UpdatePaper,
  base: EditableValues,
  current: Paper,
): Difference[] {
  const mine = listPatchValues(patch);
  const theirs = listValues(current);
  return Object.keys(labels).flatMap((key) => {
    const now = theirs[key] ?? null;
    const touched = key in mine;
    if (touched && mine[key] !== now) {
      return [{ key, label: labels[key] ?? key, mine: mine[key], theirs: now }];
    }
    // The state follows from the pile: saying both would be saying it twice.
    if (!touched && key !== 'status' && key in base && base[key] !== now) {
      return [{ key, label: labels[key] ?? key, mine: undefined, theirs: now }];
    }
    return [];
  });
}

/** My patch without the fields for which the other person's value was chosen. */
export function dropFields(patch: UpdatePaper, dropped: ReadonlySet<string>): UpdatePaper {
  const { facts, ...plain } = patch;
  const kept = Object.fromEntries(Object.entries(plain).filter(([key]) => !dropped.has(key)));
  const result: UpdatePaper = kept;
  if (facts) {
    const { dates, ...texts } = facts;
    const keptFacts: NonNullable<UpdatePaper['facts']> = Object.fromEntries(
      Object.entries(texts).filter(([key]) => !dropped.has(`facts.${key}`)),
    );
    const keptDates = Object.fromEntries(
      Object.entries(dates ?? {}).filter(([role]) => !dropped.has(`facts.dates.${role}`)),
    );
    if (Object.keys(keptDates).length > 0) keptFacts.dates = keptDates;
    if (Object.keys(keptFacts).length > 0) result.facts = keptFacts;
  }
  return result;
}

/** A value in words; `formatDay` turns an ISO day into text. */
export function describeValue(
  key: string,
  value: string | null,
  formatDay: (day: string) => string,
): string {
  if (value === null || value === '') return 'nothing';
  if (key === 'class') return classLabel(value);
  if (key === 'pile') return pileLabels[value as keyof typeof pileLabels] ?? value;
  if (key === 'status') return statusWords[value as Paper['status']] ?? value;
  if (key === 'keptBecause') {
    return keptBecauseLabels[value as keyof typeof keptBecauseLabels] ?? value;
  }
  if (key === 'subjectId') return 'another choice';
  return key.startsWith('facts.dates.') ? formatDay(value) : value;
}
