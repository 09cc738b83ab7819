import { useQuery } from '@tanstack/react-query';
import { boxEndpoints } from '../../../../server/contract/boxes.ts';
import { callApi } from '../../../lib/api-client.ts';

/** The areas of a household: rooms, a desk, a shed. */
export function useAreas(householdId: string) {
  return useQuery({
    queryKey: ['households', householdId, 'areas'],
    queryFn: ({ signal }) =>
      callApi(boxEndpoints.listAreas, { params: { id: householdId }, signal }),
  });
}
