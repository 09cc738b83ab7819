import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { boxEndpoints } from '../../../../server/contract/boxes.ts';
import type { createBoxSchema } from '../../../../server/contract/boxes.ts';
import { callApi } from '../../../lib/api-client.ts';

export function useCreateBox(householdId: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof createBoxSchema>) =>
      callApi(boxEndpoints.createBox, { params: { id: householdId }, body }),
    onSuccess: () => queryClient.invalidateQueries({ queryKey: ['households', householdId] }),
  });
}
