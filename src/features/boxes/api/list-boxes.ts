import { queryOptions, useQuery } from '@tanstack/react-query';
import { boxEndpoints } from '../../../../server/contract/boxes.ts';
import { callApi } from '../../../lib/api-client.ts';

/** The boxes of a household. */
export function boxListQuery(householdId: string) {
  return queryOptions({
    queryKey: ['households', householdId, 'boxes'],
    queryFn: ({ signal }) =>
      callApi(boxEndpoints.listBoxes, {
        params: { id: householdId },
        query: { pageSize: 200 },
        signal,
      }),
  });
}

/** The boxes; asked anew every few seconds while something in them is being read. */
export function useBoxes(householdId: string) {
  return useQuery({
    ...boxListQuery(householdId),
    refetchInterval: ({ state }) =>
      state.data?.items.some((box) => box.counts.reading > 0) ? 4000 : false,
  });
}
