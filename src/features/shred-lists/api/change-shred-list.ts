import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { ShredList } from '../../../../server/contract/shred-lists.ts';
import { ApiError } from '../../../lib/api-error.ts';
import { shredListQuery } from './get-shred-list.ts';

/**
 * A change of one list: its answer is the list as it stands, everything of the household is asked for
 * anew, and after a refusal so is the list, which somebody else may have changed.
 */
export function useChangeShredList<T>(
  list: Pick<ShredList, 'id' | 'householdId'>,
  change: (input: T) => Promise<ShredList>,
) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: change,
    onSuccess: (changed) => {
      queryClient.setQueryData(shredListQuery(list.id).queryKey, changed);
      void queryClient.invalidateQueries({ queryKey: ['papers'] });
      return queryClient.invalidateQueries({ queryKey: ['households', list.householdId] });
    },
    onError: (error) => {
      if (error instanceof ApiError) {
        void queryClient.invalidateQueries({ queryKey: shredListQuery(list.id).queryKey });
      }
    },
  });
}
