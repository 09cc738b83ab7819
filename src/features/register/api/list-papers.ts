import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { type listPapersQuery, paperEndpoints } from '../../../../server/contract/papers.ts';
import { callApi } from '../../../lib/api-client.ts';

export type RegisterQuery = z.input<typeof listPapersQuery>;

export function papersQuery(householdId: string, query: RegisterQuery) {
  return queryOptions({
    queryKey: ['households', householdId, 'papers', query],
    queryFn: ({ signal }) =>
      callApi(paperEndpoints.listPapers, { params: { id: householdId }, query, signal }),
    // The page before stays in view until the next is there: nothing jumps.
    placeholderData: keepPreviousData,
  });
}

export function usePapers(householdId: string, query: RegisterQuery) {
  return useQuery(papersQuery(householdId, query));
}
