import type { CaseInputs } from '../../../server/contract/cases.ts';
import type { ClassId } from '../../../server/contract/document-classes.ts';

/** A day: the last on which it is kept. `from` a day: it may go from then. */
export type Expected = `${number}-${number}-${number}` | 'open' | 'permanent' | `from ${string}`;

/** A case worked out by hand from what is published: why, class, inputs, answer, the day asked about. */
export type HandCase = readonly [
  words: string,
  classId: ClassId,
  inputs: CaseInputs,
  expected: Expected,
  on?: string,
];

export interface HandCases {
  readonly country: string;
  readonly source: string;
  readonly cases: readonly HandCase[];
}
