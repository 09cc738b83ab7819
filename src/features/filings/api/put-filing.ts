import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { householdEndpoints } from '../../../../server/contract/households.ts';
import type { putFilingSchema } from '../../../../server/contract/households.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Says when a return was sent; the papers of that year are assessed anew. */
export function usePutFiling(householdId: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof putFilingSchema>) =>
      callApi(householdEndpoints.putFiling, { params: { id: householdId }, body }),
    onSuccess: () => queryClient.invalidateQueries({ queryKey: ['households', householdId] }),
  });
}
