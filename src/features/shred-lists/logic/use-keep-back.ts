import { useState } from 'react';
import type { ShredList } from '../../../../server/contract/shred-lists.ts';
import { parseKeepBack } from './keep-back.ts';

export interface KeepBack {
  papers: ReadonlySet<string>;
  toggle: (paper: string) => void;
  addAll: (papers: readonly string[]) => void;
  forget: () => void;
}

/** The papers a person keeps back before consenting; they survive a reload and a lost connection. */
export function useKeepBack(list: ShredList): KeepBack {
  const storageKey = `slackwater.keep-back.${list.id}`;
  const [papers, setPapers] = useState<ReadonlySet<string>>(() =>
    parseKeepBack(window.sessionStorage.getItem(storageKey)),
  );
  const change = (next: ReadonlySet<string>) => {
    setPapers(next);
    window.sessionStorage.setItem(storageKey, JSON.stringify([...next]));
  };
  return {
    papers,
    toggle: (paper) => {
      const next = new Set(papers);
      if (!next.delete(paper)) next.add(paper);
      change(next);
    },
    addAll: (more) => change(new Set([...papers, ...more])),
    forget: () => {
      setPapers(new Set());
      window.sessionStorage.removeItem(storageKey);
    },
  };
}
