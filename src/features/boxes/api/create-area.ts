import { useMutation, useQueryClient } from '@tanstack/react-query';
import { boxEndpoints } from '../../../../server/contract/boxes.ts';
import { callApi } from '../../../lib/api-client.ts';

export function useCreateArea(householdId: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (name: string) =>
      callApi(boxEndpoints.createArea, { params: { id: householdId }, body: { name } }),
    onSuccess: () =>
      queryClient.invalidateQueries({ queryKey: ['households', householdId, 'areas'] }),
  });
}
