/** Invented shred lists to print. */
import type { ShredList, ShredRow } from '../../server/contract/shred-lists.ts';

/** The `n`th of a row of ids. */
export function idOf(n: number): string {
  return `00000000-0000-4000-8000-${String(n).padStart(12, '0')}`;
}

export function makeRow(n: number, changes: Partial<ShredRow> = {}): ShredRow {
  return {
    paper: idOf(n),
    position: n,
    boxCode: 'B-03',
    paperNumber: 100 + n,
    class: 'bank-statement',
    title: null,
    issuer: 'Harbour & Vale Bank',
    paperOn: '2017-03-31',
    rule: 'gb.bank-statement.self-employed',
    ruleBasis: 'law',
    sourceNote: null,
    keepUntil: '2023-01-31',
    securityLevel: 'P-4',
    sheets: 3,
    firstPageId: null,
    keptBack: false,
    keptBackReason: null,
    outcome: null,
    blocked: [],
    ...changes,
  };
}

export function makeList(changes: Partial<ShredList> = {}): ShredList {
  const rows = changes.rows ?? [makeRow(1), makeRow(2)];
  const sheets = rows.reduce((sum, row) => sum + row.sheets, 0);
  return {
    id: idOf(900),
    householdId: idOf(901),
    householdName: 'Marlow household',
    number: 7,
    status: 'draft',
    version: 3,
    on: '2026-12-01',
    rows,
    leftOut: [],
    sheets,
    weightGrams: sheets * 5,
    securityLevel: 'P-4',
    cautions: [],
    createdAt: '2026-12-01T09:00:00Z',
    sentAt: null,
    approval: null,
    destruction: null,
    can: { send: true, approve: false, carryOut: false, void: true },
    ...changes,
  };
}

export const approval: NonNullable<ShredList['approval']> = {
  at: '2026-12-02T10:00:00Z',
  on: '2026-12-02',
  byName: 'Ada Marlow',
  version: 3,
  instruction: null,
  waitDays: 7,
  notBefore: '2026-12-09',
  lapsesOn: '2027-01-31',
};

export const destruction: NonNullable<ShredList['destruction']> = {
  on: '2026-12-10',
  place: 'Kitchen table, 4 Quay Street',
  method: 'Cross-cut shredder of the practice',
  level: 'P-4',
  witness: 'Ada Marlow',
  clientPresent: true,
  recordedByName: 'Robin Teal',
  recordedAt: '2026-12-10T16:00:00Z',
};
