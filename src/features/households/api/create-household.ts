import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { householdEndpoints } from '../../../../server/contract/households.ts';
import type { createHouseholdSchema } from '../../../../server/contract/households.ts';
import { callApi } from '../../../lib/api-client.ts';

export function useCreateHousehold() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof createHouseholdSchema>) =>
      callApi(householdEndpoints.createHousehold, { body }),
    onSuccess: () => queryClient.invalidateQueries({ queryKey: ['households', 'list'] }),
  });
}
