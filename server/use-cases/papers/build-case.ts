/**
 * Puts the case of a paper together: its facts, its subject, the household's circumstances, the answers about
 * tax returns, the holds, and what a person answered. What nobody said stays absent, that is: not known.
 */
import { type CaseInputs, type CaseRole, type RetentionCase, roles } from '../../contract/cases.ts';
import type { IsoDate } from '../../contract/dates.ts';
import type { CircumstanceName, Circumstances } from '../../contract/households.ts';
import type { DateFact, Facts } from '../../contract/readings.ts';
import type { FilingRow } from '../../db/repositories/filing-repository.ts';
import type { HoldRow } from '../../db/repositories/hold-repository.ts';
import type { StoredPaper } from '../../db/repositories/paper-repository.ts';
import type { SubjectRow } from '../../db/repositories/subject-repository.ts';
import { addYears } from '../../retention/dates.ts';
import { caseInputsFromFacts } from '../case-from-facts.ts';
import { answerOfFiling, findFiling } from './filing-answers.ts';

/** What of a paper the sum depends on. */
export type AssessablePaper = Pick<
  StoredPaper,
  'class' | 'country' | 'facts' | 'answers' | 'subjectId' | 'bundle' | 'bundleFrom' | 'bundleTo'
> & { id: string | null; steppedDown: StoredPaper['steppedDown'] };

export interface CaseHousehold {
  country: string;
  region: string | null;
  circumstances: Circumstances;
  people: { name: string }[];
}

export interface CaseParts {
  household: CaseHousehold;
  subject: SubjectRow | null;
  filings: FilingRow[];
  /** Holds of the paper and of its household, lifted ones included. */
  holds: HoldRow[];
}

export interface BuiltCase {
  retentionCase: RetentionCase;
  /** Roles that the household's circumstances allow; absent when all are possible. */
  possibleRoles?: CaseRole[];
}

/** The case of a paper under the rules of one country, asked about on a day. */
export function buildCase(
  paper: AssessablePaper,
  parts: CaseParts,
  country: string,
  on: IsoDate,
): BuiltCase {
  const facts = paper.bundle ? factsOfBundle(paper) : paper.facts;
  const circumstances = readCircumstances(parts.household.circumstances, facts.keyDate);
  const extra: CaseInputs = {
    ...regionInput(parts.household, country),
    ...circumstances.inputs,
    ...filingInputs(parts, facts, country),
    ...subjectInputs(parts.subject),
    ...paper.answers,
  };
  const holds = parts.holds.map((hold) => ({
    reason: hold.reason,
    placedOn: hold.placedOn,
    releasedOn: hold.liftedOn,
  }));
  const inputs = caseInputsFromFacts(paper.class, country, facts, extra);
  return {
    retentionCase: {
      country,
      class: paper.class,
      on,
      inputs: holds.length > 0 ? { ...inputs, holds } : inputs,
    },
    ...(circumstances.possibleRoles ? { possibleRoles: circumstances.possibleRoles } : {}),
  };
}

/**
 * A bundle counts from its last paper. While nobody gave the last date, no date counts: the bundle stays open.
 */
function factsOfBundle(paper: AssessablePaper): Facts {
  const { facts, bundleTo } = paper;
  if (bundleTo === null) {
    return { ...facts, dates: { ...facts.dates, issued: null, eventDate: null }, keyDate: null };
  }
  const last: DateFact = { value: bundleTo, confidence: 1, seenAt: null, printed: null };
  const later = (fact: DateFact | null) => (fact && fact.value > bundleTo ? fact : last);
  return {
    ...facts,
    dates: {
      ...facts.dates,
      issued: later(facts.dates.issued),
      periodEnd: later(facts.dates.periodEnd),
      eventDate: facts.dates.eventDate && later(facts.dates.eventDate),
    },
    keyDate: bundleTo,
    // One tax year cannot stand for papers of several.
    taxYear: null,
  };
}

function regionInput(household: CaseHousehold, country: string): CaseInputs {
  return household.region && household.country === country ? { region: household.region } : {};
}

/** The role that each circumstance switches on. */
const roleOfCircumstance: Partial<Record<CircumstanceName, CaseRole>> = {
  selfEmployed: 'self-employed',
  landlord: 'landlord',
  company: 'company',
  employer: 'employer',
};
/**
 * A paper from well before a circumstance began, or well after it ended, does not belong to it: costs before a
 * trade opens count for up to seven years (GB: ITTOIA 2005 s.57, from memory), and a last return follows a year
 * after the end. In doubt it belongs.
 */
const yearsBefore = 7;
const yearsAfter = 2;

/** Yes counts, not asked counts as yes (nothing is told to the rules), no takes the role away. */
function readCircumstances(
  circumstances: Circumstances,
  paperOn: IsoDate | null,
): { inputs: CaseInputs; possibleRoles?: CaseRole[] } {
  const answer = (name: CircumstanceName): boolean | undefined => {
    const given = circumstances[name];
    if (!given || given.answer === 'not-asked') return undefined;
    if (given.answer === 'no') return false;
    if (paperOn && given.from && paperOn < addYears(given.from, -yearsBefore)) return false;
    if (paperOn && given.to && paperOn > addYears(given.to, yearsAfter)) return false;
    return true;
  };
  const inputs: CaseInputs = {};
  for (const name of ['vatRegistered', 'employer'] as const) {
    const given = answer(name);
    if (given !== undefined) inputs[name] = given;
  }
  const names = Object.keys(roleOfCircumstance) as CircumstanceName[];
  const excluded = names.filter((name) => answer(name) === false);
  if (excluded.length === 0) return { inputs };
  const excludedRoles = excluded.map((name) => roleOfCircumstance[name]);
  return { inputs, possibleRoles: roles.filter((role) => !excludedRoles.includes(role)) };
}

function filingInputs(
  { household, filings }: CaseParts,
  facts: Facts,
  country: string,
): CaseInputs {
  const filing = findFiling(filings, { country, facts, people: household.people });
  if (filing) return answerOfFiling(filing);
  // Whoever files no return has sent none and was asked for none.
  if (household.circumstances.filesReturn?.answer === 'no') {
    return { filedOn: null, lodgedOn: null, noticeToFileOn: null };
  }
  return {};
}

/** Kinds of subjects that are sold or given up rather than ended. */
const disposable: readonly SubjectRow['kind'][] = ['property', 'vehicle', 'business', 'other'];

/** When it began and ended; `null` for an end says that it still runs. */
function subjectInputs(subject: SubjectRow | null): CaseInputs {
  if (!subject) return {};
  const inputs: CaseInputs = {};
  if (subject.startedOn) {
    inputs.startedOn = subject.startedOn;
    if (disposable.includes(subject.kind)) inputs.acquiredOn = subject.startedOn;
  }
  if (!subject.endedOn && !subject.endKnown) return inputs;
  inputs.endedOn = subject.endedOn;
  if (disposable.includes(subject.kind)) inputs.disposedOn = subject.endedOn;
  return inputs;
}
