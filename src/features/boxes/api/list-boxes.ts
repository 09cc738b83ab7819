import { queryOptions, useQuery } from '@tanstack/react-query';
import { boxEndpoints } from '../../../../server/contract/boxes.ts';
import { callApi } from '../../../lib/api-client.ts';

/** A household has few boxes: one page shows them all. */
const allBoxes = { pageSize: 200 };

export function boxesQuery(householdId: string) {
  return queryOptions({
    queryKey: ['households', householdId, 'boxes'],
    queryFn: ({ signal }) =>
      callApi(boxEndpoints.listBoxes, { params: { id: householdId }, query: allBoxes, signal }),
    // Counts change while scans are read.
    refetchInterval: ({ state }) =>
      state.data?.items.some((box) => box.counts.reading > 0) ? 2000 : false,
  });
}

export function useBoxes(householdId: string) {
  return useQuery(boxesQuery(householdId));
}
