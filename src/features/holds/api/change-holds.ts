import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { holdEndpoints, type placeHoldSchema } from '../../../../server/contract/holds.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Places a hold; every paper it covers is worked out anew. */
export function usePlaceHold(householdId: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof placeHoldSchema>) =>
      callApi(holdEndpoints.placeHold, { params: { id: householdId }, body }),
    onSuccess: () => queryClient.invalidateQueries({ queryKey: ['households', householdId] }),
  });
}

/** Lifts a hold, with a reason. */
export function useLiftHold(householdId: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: ({ holdId, reason }: { holdId: string; reason: string }) =>
      callApi(holdEndpoints.liftHold, { params: { id: holdId }, body: { reason } }),
    onSuccess: () => queryClient.invalidateQueries({ queryKey: ['households', householdId] }),
  });
}
