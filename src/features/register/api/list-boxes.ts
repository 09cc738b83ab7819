import { useQuery } from '@tanstack/react-query';
import { boxEndpoints } from '../../../../server/contract/boxes.ts';
import { callApi } from '../../../lib/api-client.ts';

/** The boxes to choose from in the filter. */
export function useBoxChoices(householdId: string, isAllowed: boolean) {
  return useQuery({
    queryKey: ['households', householdId, 'boxes'],
    queryFn: ({ signal }) =>
      callApi(boxEndpoints.listBoxes, {
        params: { id: householdId },
        query: { pageSize: 200 },
        signal,
      }),
    enabled: isAllowed,
  });
}
