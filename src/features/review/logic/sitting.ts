/**
 * What one person does at the desk of one household for as long as the window lives: decisions on their
 * way, the steps that can be taken back, the pages seen. It outlives the screen, so that nothing is lost
 * by going to another one and back.
 */
import { sendPatch } from '../api/update-paper.ts';
import { createOutbox, type Outbox, type OutboxDeps, type OutboxEntry } from './outbox.ts';

export interface Step {
  paperId: string;
  /** The outbox entry that carries it; null for what went to the server directly. */
  entryId: string | null;
}

export interface SittingMemory {
  /** Oldest first. */
  steps: readonly Step[];
  /** Pages that were on the screen at full size. */
  shownPageIds: ReadonlySet<string>;
  /** Papers left undecided in the second round: not asked about a third time by themselves. */
  passedIds: ReadonlySet<string>;
  /** Places given, latest first. */
  places: readonly string[];
}

const mostPlaces = 12;

/** Makes a sitting around an outbox. */
export function createSitting(deps: OutboxDeps) {
  const outbox: Outbox = createOutbox(deps);
  const listeners = new Set<() => void>();
  let memory: SittingMemory = {
    steps: [],
    shownPageIds: new Set(),
    passedIds: new Set(),
    places: [],
  };
  function change(next: Partial<SittingMemory>) {
    memory = { ...memory, ...next };
    for (const listener of listeners) listener();
  }
  return {
    outbox,
    subscribe: (listener: () => void): (() => void) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    getSnapshot: (): SittingMemory => memory,
    /** A step that an entry on its way took up is one step with it. */
    addStep: (step: Step): void => {
      const others = memory.steps.filter(
        ({ entryId }) => entryId === null || entryId !== step.entryId,
      );
      change({ steps: [...others, step] });
    },
    /** Takes the latest step off; null when there is none. */
    takeStep: (): Step | null => {
      const step = memory.steps.at(-1);
      if (!step) return null;
      change({ steps: memory.steps.slice(0, -1) });
      return step;
    },
    notePageShown: (pageId: string): void => {
      if (memory.shownPageIds.has(pageId)) return;
      change({ shownPageIds: new Set([...memory.shownPageIds, pageId]) });
    },
    pass: (paperId: string): void => {
      change({ passedIds: new Set([...memory.passedIds, paperId]) });
    },
    unpass: (paperId: string): void => {
      change({ passedIds: new Set([...memory.passedIds].filter((id) => id !== paperId)) });
    },
    forgetPassed: (): void => {
      change({ passedIds: new Set() });
    },
    notePlace: (place: string): void => {
      const others = memory.places.filter((known) => known !== place);
      change({ places: [place, ...others].slice(0, mostPlaces) });
    },
  };
}
export type Sitting = ReturnType<typeof createSitting>;

/** Whether an entry decides its paper, so that it counts as done while it is on its way. */
export function isDecision(entry: Pick<OutboxEntry, 'patch' | 'state'>): boolean {
  return entry.patch.pile !== undefined && entry.state !== 'refused';
}

const sittings = new Map<string, Sitting>();

/** The sitting of a person in a household; one per window. */
export function sittingOf(userId: string, householdId: string): Sitting {
  const storageKey = `slackwater.unsent.${userId}.${householdId}`;
  const known = sittings.get(storageKey);
  if (known) return known;
  const sitting = createSitting({ storage: window.sessionStorage, storageKey, send: sendPatch });
  sittings.set(storageKey, sitting);
  window.addEventListener('online', () => void sitting.outbox.flush());
  return sitting;
}
