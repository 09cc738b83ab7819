/** Asks the rules about stored papers and keeps the answer beside them. */
import type { AppliedRule, Assessment } from '../contract/assessments.ts';
import type { IsoDate } from '../contract/dates.ts';
import { requireClass } from '../contract/document-classes.ts';
import { type FilingRow, listFilings } from '../db/repositories/filing-repository.ts';
import { type HoldRow, listHolds } from '../db/repositories/hold-repository.ts';
import { findHousehold } from '../db/repositories/household-repository.ts';
import {
  type AssessedColumns,
  lockPapersToAssess,
  saveAssessments,
} from '../db/repositories/paper-repository.ts';
import { listSubjects, type SubjectRow } from '../db/repositories/subject-repository.ts';
import type { Transaction } from '../db/transaction.ts';
import { assess } from '../retention/assess.ts';
import type { RuleSet } from '../retention/rule-set.ts';
import { type AssessablePaper, buildCase, type CaseHousehold } from './papers/build-case.ts';
import { combineAssessments } from './papers/combine-assessments.ts';

/** Everything about a household that the sums of its papers depend on. */
export interface AssessContext {
  household: CaseHousehold;
  filings: FilingRow[];
  subjects: Map<string, SubjectRow>;
  /** Of the whole household and of single papers, lifted ones included. */
  holds: HoldRow[];
  ruleSet: RuleSet;
  today: IsoDate;
}

export interface AssessDay {
  today: IsoDate;
  ruleSet: RuleSet;
}

/** @throws Error when there is no such household */
export async function loadAssessContext(
  householdId: string,
  { today, ruleSet }: AssessDay,
  transaction?: Transaction,
): Promise<AssessContext> {
  const household = await findHousehold(householdId, transaction);
  if (!household) throw new Error(`No household ${householdId}.`);
  const filings = await listFilings(householdId, transaction);
  const subjects = await listSubjects(householdId, transaction);
  const holds = await listHolds(householdId, transaction);
  return {
    household,
    filings,
    subjects: new Map(subjects.map((subject) => [subject.id, subject])),
    holds,
    ruleSet,
    today,
  };
}

/** Holds that cover a paper, lifted ones included. */
export function holdsOfPaper(paperId: string | null, context: AssessContext): HoldRow[] {
  return context.holds.filter((hold) => hold.paperId === null || hold.paperId === paperId);
}

/** What the rules say of a paper on a day: of its own country, and of the household's where that differs. */
export function assessOn(paper: AssessablePaper, context: AssessContext, on: IsoDate): Assessment {
  const parts = {
    household: context.household,
    filings: context.filings,
    subject: paper.subjectId ? (context.subjects.get(paper.subjectId) ?? null) : null,
    holds: holdsOfPaper(paper.id, context),
  };
  const ask = (country: string): Assessment => {
    const { retentionCase, ...options } = buildCase(paper, parts, country, on);
    return assess(retentionCase, context.ruleSet, options);
  };
  const own = ask(paper.country);
  if (paper.country === context.household.country) return own;
  return combineAssessments(own, ask(context.household.country));
}

/** The assessment of a paper today with the columns that the register sorts and filters by. Pure. */
export function assessPaper(paper: AssessablePaper, context: AssessContext): AssessedColumns {
  const assessment = assessOn(paper, context, context.today);
  const { facts } = paper;
  return {
    assessment,
    keepUntil: assessment.keepUntil,
    shredFrom: assessment.shredFrom,
    advisedUntil: assessment.advisedUntil,
    permanent: assessment.permanent,
    open: assessment.open,
    held: assessment.heldBy.length > 0,
    rule: findDecidingRule(assessment)?.id ?? null,
    securityLevel: assessment.securityLevel,
    ruleSetVersion: context.ruleSet.version,
    assessedOn: context.today,
    steppedDown: isStillSteppedDown(paper, assessment) ? paper.steppedDown : null,
    classGroup: requireClass(paper.class).group,
    issuer: facts.issuer?.value ?? null,
    addressee: facts.addressee?.value ?? null,
    reference: facts.reference?.value ?? null,
    paperOn:
      facts.dates.issued?.value ??
      facts.dates.eventDate?.value ??
      facts.dates.periodEnd?.value ??
      null,
    keyDate: facts.keyDate,
    expiresOn: facts.dates.expiry?.value ?? null,
    taxYear: facts.taxYear,
  };
}

/** Somebody stepped down from the advice as it was; a longer advice is a new question. */
function isStillSteppedDown(paper: AssessablePaper, assessment: Assessment): boolean {
  if (!paper.steppedDown) return false;
  return (
    assessment.advisedUntil === null || assessment.advisedUntil <= paper.steppedDown.advisedUntil
  );
}

/** The rule whose date is the answer's; the first that applied when there is no date. */
export function findDecidingRule(assessment: Assessment): AppliedRule | null {
  const until = assessment.keepUntil ?? assessment.scheduledUntil;
  const dated = until === null ? undefined : assessment.rules.find((r) => r.keepUntil === until);
  const undated = until === null ? assessment.rules.find((r) => r.keepUntil === null) : undefined;
  return dated ?? undated ?? assessment.rules[0] ?? null;
}

/** Assesses all papers of a household that have not left anew. Answers how many there were. */
export function reassessHousehold(
  householdId: string,
  day: AssessDay,
  transaction: Transaction,
): Promise<number> {
  return reassess({ householdId }, day, transaction);
}

/** Assesses some papers of a household anew: those of a subject, or those with these ids. */
export function reassessPapers(
  scope: { householdId: string; subjectId?: string; ids?: string[] },
  day: AssessDay,
  transaction: Transaction,
): Promise<number> {
  return reassess(scope, day, transaction);
}

async function reassess(
  scope: { householdId: string; subjectId?: string; ids?: string[] },
  day: AssessDay,
  transaction: Transaction,
): Promise<number> {
  const papers = await lockPapersToAssess(scope, transaction);
  if (papers.length === 0) return 0;
  const context = await loadAssessContext(scope.householdId, day, transaction);
  await saveAssessments(
    papers.map((paper) => ({ id: paper.id, ...assessPaper(paper, context) })),
    transaction,
  );
  return papers.length;
}
