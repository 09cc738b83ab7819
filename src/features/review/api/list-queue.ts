import { queryOptions } from '@tanstack/react-query';
import { pageSizeLimit } from '../../../../server/contract/endpoint.ts';
import { paperEndpoints } from '../../../../server/contract/papers.ts';
import { callApi } from '../../../lib/api-client.ts';
import type { Round } from '../logic/queue.ts';

const statusOfRound: Record<Round, string> = { first: 'to-review', second: 'undecided' };

/** The papers of a round, lowest number first, as many as one answer holds. */
export function queueQuery(householdId: string, round: Round) {
  return queryOptions({
    queryKey: ['households', householdId, 'papers', 'queue', round],
    queryFn: ({ signal }) =>
      callApi(paperEndpoints.listPapers, {
        params: { id: householdId },
        query: { status: statusOfRound[round], sort: 'number', pageSize: pageSizeLimit },
        signal,
      }),
    // What is decided here is left out at once; new papers come in while piles are being scanned.
    staleTime: 30_000,
    refetchInterval: 60_000,
  });
}
