import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { householdEndpoints } from '../../../../server/contract/households.ts';
import type { updateHouseholdSchema } from '../../../../server/contract/households.ts';
import { callApi } from '../../../lib/api-client.ts';
import { householdQuery } from './get-household.ts';

/** Changes a household against the version that was seen; its papers are assessed anew. */
export function useUpdateHousehold(householdId: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (call: { version: number; body: z.input<typeof updateHouseholdSchema> }) =>
      callApi(householdEndpoints.updateHousehold, {
        params: { id: householdId },
        ifMatch: call.version,
        body: call.body,
      }),
    onSuccess: (household) => {
      queryClient.setQueryData(householdQuery(householdId).queryKey, household);
      return queryClient.invalidateQueries({ queryKey: ['households'] });
    },
  });
}
