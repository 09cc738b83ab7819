import { useCallback, useState } from 'react';

/** Columns in view by id; kept in this browser. */
export type ColumnVisibility = Record<string, boolean>;

const storageKey = 'register-columns';
const usual: ColumnVisibility = {
  addressee: false,
  reference: false,
  taxYear: false,
  subjectName: false,
  keptBecause: false,
  expiresOn: false,
  sheets: false,
  rule: false,
  leftOn: false,
};

export function useColumns() {
  const [visibility, setVisibility] = useState<ColumnVisibility>(readStored);
  const show = useCallback((id: string, isShown: boolean) => {
    setVisibility((before) => {
      const next = { ...before, [id]: isShown };
      try {
        localStorage.setItem(storageKey, JSON.stringify(next));
      } catch {
        // A browser that keeps nothing forgets the choice; the table works all the same.
      }
      return next;
    });
  }, []);
  return { visibility, show };
}

function readStored(): ColumnVisibility {
  try {
    const stored: unknown = JSON.parse(localStorage.getItem(storageKey) ?? 'null');
    if (stored && typeof stored === 'object') {
      const flags: ColumnVisibility = { ...usual };
      for (const [id, isShown] of Object.entries(stored)) {
        if (typeof isShown === 'boolean') flags[id] = isShown;
      }
      return flags;
    }
  } catch {
    // Unreadable: the usual columns.
  }
  return usual;
}
