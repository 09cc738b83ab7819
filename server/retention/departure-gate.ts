/**
 * The gate: the one function that says whether a paper may leave its household. Every departure passes it
 * (shredding, recycling, giving back, passing on), when it is planned, approved and carried out.
 */
import type { Assessment } from '../contract/assessments.ts';
import type { IsoDate } from '../contract/dates.ts';
import type { ClassId } from '../contract/document-classes.ts';
import type { PaperStatus, Pile } from '../contract/papers.ts';
import { wordDay } from './dates.ts';
import type { EarlySheetRecord } from './sheet-clock.ts';
import { findSheetClocks } from './sheet-clock.ts';

export type DepartureKind = 'shred' | 'recycle' | 'give-back' | 'pass-on';
export const departureKinds = ['shred', 'recycle', 'give-back', 'pass-on'] as const;

export interface GateReason {
  code: GateCode;
  /** One sentence that says what stands in the way and what to do. */
  sentence: string;
}
export type GateCode =
  | 'left'
  | 'not-reviewed'
  | 'held'
  | 'permanent'
  | 'open'
  | 'no-date'
  | 'original'
  | 'unrecognised'
  | 'not-yet'
  | 'advised'
  | 'pile'
  | 'recycling'
  | 'future';

/** What the gate must know of a paper. */
export interface GatePaper {
  class: ClassId;
  status: PaperStatus;
  pile: Pile | null;
  /** Whether a person decided it. */
  isReviewed: boolean;
  /** Whether somebody with the right stepped down from "advised until". */
  isSteppedDown: boolean;
}

export interface GateQuestion {
  paper: GatePaper;
  /** What the rules say on the day of leaving. */
  assessment: Assessment;
  /** Holds in force on the paper or its household, with their reasons. */
  holds: readonly { reason: string }[];
  how: DepartureKind;
  /** The day on which it leaves. */
  on: IsoDate;
  /** What is on record about letting its sheet go before its date; absent where nothing is. */
  early?: EarlySheetRecord | null;
  /** Today; null while a departure is only planned and may lie ahead. */
  today: IsoDate | null;
}

/** The only classes that may be recycled unshredded. */
export const recyclableClasses: readonly ClassId[] = ['circular', 'envelope', 'user-manual'];

const pileWords: Record<DepartureKind, string> = {
  shred: 'Shred',
  recycle: 'Recycle',
  'give-back': 'Give back',
  'pass-on': 'Pass on',
};

/** Why a paper may not leave in this way on this day; empty when it may. */
export function mayLeave(question: GateQuestion): GateReason[] {
  return [
    ...checkDecision(question),
    ...checkHolds(question),
    ...checkDates(question),
    ...checkWay(question),
  ];
}

function checkDecision({ paper, how }: GateQuestion): GateReason[] {
  if (paper.status === 'left') return [{ code: 'left', sentence: 'It has left already.' }];
  const reasons: GateReason[] = [];
  if (!paper.isReviewed || paper.status === 'to-review') {
    reasons.push({
      code: 'not-reviewed',
      sentence: 'Nobody has looked at it yet: decide it on the review desk first.',
    });
  }
  if (paper.pile !== how || paper.status !== 'leaving') {
    reasons.push({
      code: 'pile',
      sentence: `It was not decided to leave this way: choose ${pileWords[how]} for it on the review desk.`,
    });
  }
  if (paper.class === 'unrecognised') {
    reasons.push({
      code: 'unrecognised',
      sentence: 'Nobody has said what kind of paper it is: choose its kind first.',
    });
  }
  return reasons;
}

function checkHolds({ assessment, holds }: GateQuestion): GateReason[] {
  const reason = holds[0]?.reason ?? assessment.heldBy[0]?.reason ?? null;
  if (holds.length === 0 && assessment.heldBy.length === 0) return [];
  return [
    {
      code: 'held',
      sentence: `It must not be destroyed yet${reason ? `: ${endSentence(reason)}` : '.'} The hold has to be lifted first.`,
    },
  ];
}

/** Whether the sheet may be shredded on the day although its date has not come: its scan stays. */
function mayGoEarly({ assessment, how, on, early }: GateQuestion): boolean {
  if (how !== 'shred' || !early) return false;
  const { isEarly, sheetFrom } = findSheetClocks(assessment, early, on);
  return isEarly && sheetFrom !== null && sheetFrom <= on;
}

function checkDates(question: GateQuestion): GateReason[] {
  const { paper, assessment, on } = question;
  if (assessment.permanent) {
    return [{ code: 'permanent', sentence: 'It is kept for good.' }, ...checkOriginal(assessment)];
  }
  const reasons = checkOriginal(assessment);
  if (assessment.open) {
    // A held paper is open because of the hold, which has its own sentence.
    if (assessment.heldBy.length === 0) {
      reasons.push({
        code: 'open',
        sentence: `It has no date yet: ${endSentence(assessment.openBecause ?? 'what starts its time is not known')}`,
      });
    }
    return reasons;
  }
  if (assessment.shredFrom === null) {
    return [
      ...reasons,
      { code: 'no-date', sentence: 'No day is known from which it may go: ask the adviser.' },
    ];
  }
  if (mayGoEarly(question)) return reasons;
  if (assessment.shredFrom > on) {
    reasons.push({
      code: 'not-yet',
      sentence: `Its time is not up: it may go from ${wordDay(assessment.shredFrom)}.`,
    });
  } else if (
    assessment.advisedUntil !== null &&
    assessment.advisedUntil >= on &&
    !paper.isSteppedDown
  ) {
    reasons.push({
      code: 'advised',
      sentence: `It is advised to keep it until ${wordDay(assessment.advisedUntil)}: step down to the shorter date with a reason, or wait.`,
    });
  }
  return reasons;
}

function checkOriginal(assessment: Assessment): GateReason[] {
  if (assessment.original !== 'required') return [];
  return [{ code: 'original', sentence: 'Its original is required: it stays.' }];
}

function checkWay({ paper, assessment, how, on, today }: GateQuestion): GateReason[] {
  const reasons: GateReason[] = [];
  const isRecyclable = recyclableClasses.includes(paper.class) && assessment.disposal === 'recycle';
  if (how === 'recycle' && !isRecyclable) {
    reasons.push({
      code: 'recycling',
      sentence:
        'Only circulars, envelopes and manuals may be recycled without shredding: choose Shred.',
    });
  }
  if (today !== null && on > today) {
    reasons.push({
      code: 'future',
      sentence: `${wordDay(on)} has not come yet: give the day on which it really left.`,
    });
  }
  return reasons;
}

function endSentence(text: string): string {
  const trimmed = text.trim();
  return /[.!?]$/.test(trimmed) ? trimmed : `${trimmed}.`;
}
