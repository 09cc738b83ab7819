import { useMutation, useQueryClient } from '@tanstack/react-query';
import { shredListEndpoints, type ShredList } from '../../../../server/contract/shred-lists.ts';
import { callApi } from '../../../lib/api-client.ts';
import { shredListQuery } from './get-shred-list.ts';

/** Gathers every paper that is decided for shredding and may go on a day. */
export function useCreateShredList(householdId: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (on: string): Promise<ShredList> =>
      callApi(shredListEndpoints.createShredList, { params: { id: householdId }, body: { on } }),
    onSuccess: (list) => {
      queryClient.setQueryData(shredListQuery(list.id).queryKey, list);
      return queryClient.invalidateQueries({ queryKey: ['households', householdId] });
    },
  });
}
