import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { type enterPaperSchema, paperEndpoints } from '../../../../server/contract/papers.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Enters a paper or a bundle without a scan. */
export function useEnterPaper(householdId: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof enterPaperSchema>) =>
      callApi(paperEndpoints.enterPaper, { params: { id: householdId }, body }),
    onSuccess: () => queryClient.invalidateQueries({ queryKey: ['households', householdId] }),
  });
}
