import { useState } from 'react';
import type { ShredList } from '../../../../server/contract/shred-lists.ts';
import { parseOutcomes, type Outcomes } from './outcomes.ts';

/** The outcomes ticked so far; they survive a reload of the page at the shredder. */
export function useOutcomes(list: ShredList): [Outcomes, (next: Outcomes) => void, () => void] {
  const storageKey = `slackwater.outcomes.${list.id}`;
  const [outcomes, setOutcomes] = useState<Outcomes>(() =>
    parseOutcomes(window.sessionStorage.getItem(storageKey), list.rows),
  );
  const change = (next: Outcomes) => {
    setOutcomes(next);
    window.sessionStorage.setItem(storageKey, JSON.stringify(next));
  };
  const forget = () => window.sessionStorage.removeItem(storageKey);
  return [outcomes, change, forget];
}
