/** A fault of a rule table, and where a rule stands. */
import type { Rule } from './rule-schema.ts';

export interface TableFault {
  /** Which table, by its place in the list that was checked. */
  readonly table: number;
  readonly path: readonly (string | number)[];
  readonly message: string;
}

/** A rule with its place among the tables that are checked. */
export interface Place {
  readonly table: number;
  readonly index: number;
  readonly rule: Rule;
}
