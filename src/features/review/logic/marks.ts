import { dateRoles, type Box, type Facts } from '../../../../server/contract/readings.ts';
import { dateRoleLabels } from './words.ts';

/** A fact's place on the page. `key` ties the outline to its line beside the page. */
export interface Mark {
  key: string;
  label: string;
  page: number;
  box: Box;
}

/** The facts of a paper that were seen somewhere, in the order in which they are listed beside it. */
export function listMarks(facts: Facts): Mark[] {
  const marks: Mark[] = [];
  const add = (
    key: string,
    label: string,
    fact: { seenAt: { page: number; box: Box } | null } | null | undefined,
  ) => {
    if (fact?.seenAt) marks.push({ key, label, page: fact.seenAt.page, box: fact.seenAt.box });
  };
  for (const role of dateRoles) add(role, dateRoleLabels[role], facts.dates[role]);
  add('issuer', 'From', facts.issuer);
  add('addressee', 'To', facts.addressee);
  add('reference', 'Reference', facts.reference);
  facts.amounts.forEach((amount, index) => {
    add(`amount-${index}`, amount.name, amount);
  });
  return marks;
}

/** An outline a little wider than the words, and never outside the page (shares of 0 to 1). */
export function padBox(box: Box, by = 0.004): Box {
  const x = Math.max(0, box.x - by);
  const y = Math.max(0, box.y - by);
  return {
    x,
    y,
    w: Math.min(1, box.x + box.w + by) - x,
    h: Math.min(1, box.y + box.h + by) - y,
  };
}
