import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect, useMemo } from 'react';
import { pageImageUrl, paperQuery } from '../api/get-paper.ts';
import { queueQuery } from '../api/list-queue.ts';
import { countToGo, findNext, listRemaining, type Round } from '../logic/queue.ts';

const shortQueue = 10;

interface QueueOptions {
  householdId: string;
  round: Round;
  /** Papers that the server still lists but that are decided here. */
  hiddenIds: ReadonlySet<string>;
  /** Nothing is on its way to the server. */
  isIdle: boolean;
}

/** The papers still to be decided in a round; asks for more before they run out. */
export function useQueue({ householdId, round, hiddenIds, isIdle }: QueueOptions) {
  const query = useQuery(queueQuery(householdId, round));
  const { data, refetch } = query;
  const items = useMemo(() => data?.items ?? [], [data]);
  const total = data?.total ?? 0;
  const remaining = useMemo(() => listRemaining(items, hiddenIds), [items, hiddenIds]);
  const isShort =
    data !== undefined &&
    ((remaining.length < shortQueue && total > items.length) || remaining.length === 0);

  // Once per decision while the list is short; new papers may have been read meanwhile.
  useEffect(() => {
    if (isShort && isIdle) void refetch();
  }, [isShort, isIdle, remaining.length, refetch]);

  return {
    remaining,
    toGo: countToGo(items, total, hiddenIds),
    isLoading: data === undefined && query.error === null,
    error: data === undefined ? query.error : null,
    refetch,
  };
}

const ahead = 2;

/** Fetches the papers that come next, and the picture of their first page, before they are asked for. */
export function usePrefetch(
  remaining: readonly { id: string; number: number; firstPageId: string | null }[],
  currentNumber: number | null,
): void {
  const queryClient = useQueryClient();
  useEffect(() => {
    if (currentNumber === null) return;
    let number = currentNumber;
    for (let i = 0; i < ahead; i += 1) {
      const next = findNext(remaining, number);
      if (!next || next.number === currentNumber) return;
      void queryClient.prefetchQuery(paperQuery(next.id));
      if (next.firstPageId) new Image().src = pageImageUrl(next.firstPageId);
      number = next.number;
    }
  }, [queryClient, remaining, currentNumber]);
}
