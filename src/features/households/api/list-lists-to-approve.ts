import { useQuery } from '@tanstack/react-query';
import { shredListEndpoints } from '../../../../server/contract/shred-lists.ts';
import { callApi } from '../../../lib/api-client.ts';

/** The shred lists of a household that wait for a yes. */
export function useListsToApprove(householdId: string, enabled: boolean) {
  return useQuery({
    queryKey: ['households', householdId, 'lists-to-approve'],
    queryFn: async ({ signal }) => {
      const { items } = await callApi(shredListEndpoints.listShredLists, {
        params: { id: householdId },
        signal,
      });
      return items.filter((list) => list.status === 'sent');
    },
    enabled,
  });
}
