import { useEffect, useEffectEvent, useSyncExternalStore } from 'react';
import type { Outbox, OutboxEvent, OutboxSnapshot } from '../logic/outbox.ts';

/** What is on its way to the server; sends what a reload left behind, and warns before a window closes on it. */
export function useOutbox(outbox: Outbox, onEvent: (event: OutboxEvent) => void): OutboxSnapshot {
  const snapshot = useSyncExternalStore(outbox.subscribe, outbox.getSnapshot);
  const hear = useEffectEvent(onEvent);
  useEffect(() => {
    const stop = outbox.hear((event) => hear(event));
    void outbox.flush();
    return stop;
  }, [outbox]);
  const isHolding = snapshot.entries.length > 0;
  useEffect(() => {
    if (!isHolding) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', warn);
    return () => window.removeEventListener('beforeunload', warn);
  }, [isHolding]);
  return snapshot;
}
