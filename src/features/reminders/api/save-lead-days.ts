import { useMutation, useQueryClient } from '@tanstack/react-query';
import { type Household, householdEndpoints } from '../../../../server/contract/households.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Changes how many days before an expiry the reminder goes out. */
export function useSaveLeadDays(household: Household) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (leadDays: Record<string, number>) =>
      callApi(householdEndpoints.updateHousehold, {
        params: { id: household.id },
        body: { leadDays },
        ifMatch: household.version,
      }),
    onSettled: () => queryClient.invalidateQueries({ queryKey: ['households', household.id] }),
  });
}
