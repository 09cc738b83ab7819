import { useQueryClient } from '@tanstack/react-query';
import { useMemo, useSyncExternalStore } from 'react';
import { toast } from 'sonner';
import type { Paper, UpdatePaper } from '../../../../server/contract/papers.ts';
import { sentenceOf } from '../../../lib/api-error.ts';
import { paperQuery } from '../api/get-paper.ts';
import { queueQuery } from '../api/list-queue.ts';
import { undoPaper } from '../api/undo-paper.ts';
import { listValues } from '../logic/conflict.ts';
import { applyPatch, describePatch, movesDates } from '../logic/decision.ts';
import type { OutboxEvent } from '../logic/outbox.ts';
import { findNext, type Round } from '../logic/queue.ts';
import { isDecision, type Sitting } from '../logic/sitting.ts';
import { useOutbox } from './use-outbox.ts';
import { useQueue } from './use-queue.ts';

interface DeskOptions {
  householdId: string;
  round: Round;
  sitting: Sitting;
  /** Shows a paper; null when none is left. */
  onGo: (paperId: string | null) => void;
}

const toastId = 'decision';
const toastMs = 6_000;

/** The desk's state and the ways to change it: decide, correct, take back. */
export function useDesk({ householdId, round, sitting, onGo }: DeskOptions) {
  const queryClient = useQueryClient();
  const { outbox } = sitting;
  const memory = useSyncExternalStore(sitting.subscribe, sitting.getSnapshot);

  const onEvent = (event: OutboxEvent) => {
    if (event.kind === 'stuck') {
      const { entry } = event;
      if (entry.current) storePaper(entry.current);
      else void queryClient.invalidateQueries({ queryKey: paperQuery(entry.paperId).queryKey });
      return;
    }
    storePaper(event.paper);
    if (event.entry.patch.pile !== undefined) dropFromQueue(event.paper.id);
  };
  const snapshot = useOutbox(outbox, onEvent);
  const hiddenIds = useMemo(() => {
    const ids = new Set(snapshot.entries.filter(isDecision).map(({ paperId }) => paperId));
    if (round === 'second') for (const id of memory.passedIds) ids.add(id);
    return ids;
  }, [snapshot.entries, memory.passedIds, round]);
  const isIdle = snapshot.entries.length === 0;
  const queue = useQueue({ householdId, round, hiddenIds, isIdle });

  function storePaper(paper: Paper) {
    queryClient.setQueryData(paperQuery(paper.id).queryKey, paper);
  }

  /** A saved decision leaves the list at once, without asking for the whole list again. */
  function dropFromQueue(paperId: string) {
    const { queryKey } = queueQuery(householdId, round);
    void queryClient.cancelQueries({ queryKey });
    queryClient.setQueryData(queryKey, (list) => {
      if (!list?.items.some(({ id }) => id === paperId)) return list;
      return { items: list.items.filter(({ id }) => id !== paperId), total: list.total - 1 };
    });
    void queryClient.invalidateQueries({ queryKey: ['households', householdId], exact: true });
  }

  /** Sends a correction; the paper stays in view. */
  function amend(paper: Paper, patch: UpdatePaper) {
    const entryId = outbox.add({
      paperId: paper.id,
      label: describePatch(paper, patch),
      version: paper.version,
      base: listValues(paper),
      patch,
    });
    sitting.addStep({ paperId: paper.id, entryId });
    if (patch.place) sitting.notePlace(patch.place);
  }

  /** Sends a decision and goes on to the next paper at once. */
  function decide(paper: Paper, patch: UpdatePaper) {
    const next = findNext(queue.remaining, paper.number);
    amend(paper, patch);
    if (round === 'second' && patch.pile === 'undecided') sitting.pass(paper.id);
    toast(describePatch(paper, patch), {
      id: toastId,
      duration: toastMs,
      action: { label: 'Undo', onClick: () => void undo() },
    });
    onGo(next?.id ?? null);
  }

  /** Takes the latest step back, else the last change of the paper in view. */
  async function undo(inView?: Paper) {
    const step =
      sitting.takeStep() ?? (inView?.canUndo ? { paperId: inView.id, entryId: null } : null);
    toast.dismiss(toastId);
    if (!step) {
      toast('There is nothing to take back.', { id: toastId, duration: toastMs });
      return;
    }
    const { paperId, entryId } = step;
    let entry = outbox.getSnapshot().entries.find(({ id }) => id === entryId);
    if (entry?.state === 'sending') {
      await outbox.flush();
      entry = outbox.getSnapshot().entries.find(({ id }) => id === entryId);
    }
    if (entry) {
      outbox.remove(entry.id);
    } else {
      try {
        const { queryKey } = paperQuery(paperId);
        const { version } =
          queryClient.getQueryData(queryKey) ?? (await queryClient.fetchQuery(paperQuery(paperId)));
        storePaper(await undoPaper(paperId, version));
        void queryClient.invalidateQueries({ queryKey: ['households', householdId] });
      } catch (error) {
        sitting.addStep(step);
        toast.error(sentenceOf(error), { id: toastId });
        void queryClient.invalidateQueries({ queryKey: paperQuery(paperId).queryKey });
        return;
      }
    }
    sitting.unpass(paperId);
    onGo(paperId);
  }

  /** The paper with what is on its way laid over it. */
  function overlay(paper: Paper): { paper: Paper; isWorking: boolean } {
    const pending = snapshot.entries.filter(
      ({ paperId, state }) => paperId === paper.id && (state === 'waiting' || state === 'sending'),
    );
    return {
      paper: pending.reduce((shown, { patch }) => applyPatch(shown, patch), paper),
      isWorking: pending.some(({ patch }) => movesDates(patch)),
    };
  }

  return { queue, memory, snapshot, outbox, amend, decide, undo, overlay, storePaper };
}
export type Desk = ReturnType<typeof useDesk>;
