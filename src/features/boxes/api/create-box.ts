import { useMutation, useQueryClient } from '@tanstack/react-query';
import { boxEndpoints } from '../../../../server/contract/boxes.ts';
import { callApi } from '../../../lib/api-client.ts';
import { areasQuery } from './list-areas.ts';
import { boxesQuery } from './list-boxes.ts';

export interface NewBox {
  label: string;
  areaId: string | null;
  /** An area that is not there yet. */
  newArea: string;
}

/** Adds a box, and its area when that is new. */
export function useCreateBox(householdId: string) {
  const queryClient = useQueryClient();
  const params = { id: householdId };
  return useMutation({
    mutationFn: async ({ label, areaId, newArea }: NewBox) => {
      const area = newArea
        ? await callApi(boxEndpoints.createArea, { params, body: { name: newArea } })
        : null;
      return callApi(boxEndpoints.createBox, {
        params,
        body: { label, areaId: area?.id ?? areaId },
      });
    },
    onSettled: () =>
      Promise.all([
        queryClient.invalidateQueries({ queryKey: boxesQuery(householdId).queryKey }),
        queryClient.invalidateQueries({ queryKey: areasQuery(householdId).queryKey }),
      ]),
  });
}
