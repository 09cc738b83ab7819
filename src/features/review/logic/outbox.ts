/**
 * Decisions on their way to the server. They are kept in memory and in the window's session storage
 * until the server has them, are sent one after another, and wait while the line is down.
 */
import type { Paper, UpdatePaper } from '../../../../server/contract/papers.ts';
import { listDifferences, type EditableValues } from './conflict.ts';
import { mergePatches } from './decision.ts';

export interface OutboxEntry {
  id: string;
  paperId: string;
  /** Words for messages: "Bank statement, no. 12: Shred". */
  label: string;
  /** The version on which the person decided; sent as If-Match. */
  version: number;
  /** What the person saw when deciding. */
  base: EditableValues;
  patch: UpdatePaper;
  /** `conflict`: somebody else was there first. `refused`: the server will not take it. */
  state: 'waiting' | 'sending' | 'conflict' | 'refused';
  /** Why it was refused. */
  reason: string | null;
  /** With a conflict: the paper as it stands now. */
  current: Paper | null;
}

/** What the line made of an entry. */
export type SendResult =
  | { kind: 'saved'; paper: Paper }
  | { kind: 'offline' }
  | { kind: 'conflict'; current: Paper }
  | { kind: 'refused'; reason: string };

export interface OutboxDeps {
  storage: Pick<Storage, 'getItem' | 'setItem' | 'removeItem'>;
  /** Key in the storage; names person and household, so that nobody sends another's decisions. */
  storageKey: string;
  send: (entry: OutboxEntry) => Promise<SendResult>;
  /** Calls back after a while; replaced in tests. */
  wait?: (callback: () => void, delayMs: number) => void;
  newId?: () => string;
}

/** `stuck`: the entry needs a person, because of a conflict or a refusal. */
export type OutboxEvent =
  { kind: 'saved'; paper: Paper; entry: OutboxEntry } | { kind: 'stuck'; entry: OutboxEntry };

export interface OutboxSnapshot {
  entries: readonly OutboxEntry[];
  isOffline: boolean;
}

export type NewEntry = Pick<OutboxEntry, 'paperId' | 'label' | 'version' | 'base' | 'patch'>;

const firstRetryMs = 2_000;
const longestRetryMs = 30_000;

/** Makes the outbox of one person in one household, with what a reload left in the storage. */
export function createOutbox(deps: OutboxDeps) {
  const wait = deps.wait ?? ((callback, delayMs) => void setTimeout(callback, delayMs));
  const newId = deps.newId ?? (() => crypto.randomUUID());
  const listeners = new Set<() => void>();
  const hearers = new Set<(event: OutboxEvent) => void>();
  let snapshot: OutboxSnapshot = { entries: readStored(deps), isOffline: false };
  let running: Promise<void> | null = null;
  let retryMs = firstRetryMs;
  let isRetryPlanned = false;

  function publish(next: Partial<OutboxSnapshot>) {
    snapshot = { ...snapshot, ...next };
    writeStored(deps, snapshot.entries);
    for (const listener of listeners) listener();
  }

  function tell(event: OutboxEvent) {
    for (const hearer of hearers) hearer(event);
  }

  function change(id: string, fields: Partial<OutboxEntry>) {
    publish({
      entries: snapshot.entries.map((entry) => (entry.id === id ? { ...entry, ...fields } : entry)),
    });
  }

  function remove(id: string) {
    publish({ entries: snapshot.entries.filter((entry) => entry.id !== id) });
  }

  /** Adds a decision; one that has not been sent yet for the same paper takes it up. */
  function add(entry: NewEntry): string {
    const waiting = snapshot.entries.find(
      (other) => other.paperId === entry.paperId && other.state === 'waiting',
    );
    if (waiting) {
      change(waiting.id, { patch: mergePatches(waiting.patch, entry.patch), label: entry.label });
      void flush();
      return waiting.id;
    }
    const id = newId();
    publish({
      entries: [
        ...snapshot.entries,
        { ...entry, id, state: 'waiting', reason: null, current: null },
      ],
    });
    void flush();
    return id;
  }

  /** Sends again what a person has settled: a conflict with its new patch and version. */
  function resend(id: string, patch: UpdatePaper, version: number) {
    change(id, { patch, version, state: 'waiting', current: null, reason: null });
    void flush();
  }

  function flush(): Promise<void> {
    running ??= sendAll().finally(() => {
      running = null;
    });
    return running;
  }

  async function sendAll() {
    for (;;) {
      const entry = snapshot.entries.find(({ state }) => state === 'waiting');
      if (!entry) return;
      change(entry.id, { state: 'sending' });
      const result = await deps.send(entry);
      if (result.kind === 'offline') {
        change(entry.id, { state: 'waiting' });
        publish({ isOffline: true });
        planRetry();
        return;
      }
      retryMs = firstRetryMs;
      if (snapshot.isOffline) publish({ isOffline: false });
      settle(entry, result);
    }
  }

  function settle(entry: OutboxEntry, result: Exclude<SendResult, { kind: 'offline' }>) {
    if (result.kind === 'saved') return settleSaved(entry, result.paper);
    if (result.kind === 'conflict') {
      // An answer that got lost on the way: what I wanted is already there.
      if (!entry.patch.answers && !listDifferences(entry.patch, {}, result.current).length) {
        return settleSaved(entry, result.current);
      }
      change(entry.id, { state: 'conflict', current: result.current });
    } else {
      change(entry.id, { state: 'refused', reason: result.reason });
    }
    const stuck = snapshot.entries.find(({ id }) => id === entry.id);
    if (stuck) tell({ kind: 'stuck', entry: stuck });
  }

  function settleSaved(entry: OutboxEntry, paper: Paper) {
    publish({
      entries: snapshot.entries
        .filter(({ id }) => id !== entry.id)
        // What was decided meanwhile rests on my own change, not on somebody else's.
        .map((other) =>
          other.paperId === entry.paperId && other.version === entry.version
            ? { ...other, version: paper.version }
            : other,
        ),
    });
    tell({ kind: 'saved', paper, entry });
  }

  function planRetry() {
    if (isRetryPlanned) return;
    isRetryPlanned = true;
    wait(() => {
      isRetryPlanned = false;
      void flush();
    }, retryMs);
    retryMs = Math.min(retryMs * 2, longestRetryMs);
  }

  return {
    subscribe: (listener: () => void): (() => void) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    /** Calls back with what became of each entry; returns how to stop listening. */
    hear: (hearer: (event: OutboxEvent) => void): (() => void) => {
      hearers.add(hearer);
      return () => hearers.delete(hearer);
    },
    getSnapshot: (): OutboxSnapshot => snapshot,
    add,
    remove,
    resend,
    flush,
  };
}
export type Outbox = ReturnType<typeof createOutbox>;

function readStored({ storage, storageKey }: OutboxDeps): OutboxEntry[] {
  try {
    const stored: unknown = JSON.parse(storage.getItem(storageKey) ?? '[]');
    if (!Array.isArray(stored)) return [];
    return (stored as OutboxEntry[]).map((entry) =>
      entry.state === 'sending' ? { ...entry, state: 'waiting' as const } : entry,
    );
  } catch {
    return [];
  }
}

function writeStored({ storage, storageKey }: OutboxDeps, entries: readonly OutboxEntry[]): void {
  try {
    if (entries.length === 0) storage.removeItem(storageKey);
    else storage.setItem(storageKey, JSON.stringify(entries));
  } catch {
    // Storage full or switched off: the page's memory still has them.
  }
}
