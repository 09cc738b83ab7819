import { queryOptions, useQuery } from '@tanstack/react-query';
import { boxEndpoints } from '../../../../server/contract/boxes.ts';
import { callApi } from '../../../lib/api-client.ts';

export function areasQuery(householdId: string) {
  return queryOptions({
    queryKey: ['households', householdId, 'areas'],
    queryFn: ({ signal }) =>
      callApi(boxEndpoints.listAreas, { params: { id: householdId }, signal }),
  });
}

export function useAreas(householdId: string) {
  return useQuery(areasQuery(householdId));
}
