import { queryOptions, useQuery } from '@tanstack/react-query';
import { holdEndpoints } from '../../../../server/contract/holds.ts';
import { callApi } from '../../../lib/api-client.ts';

export function holdsQuery(householdId: string) {
  return queryOptions({
    queryKey: ['households', householdId, 'holds'],
    queryFn: ({ signal }) =>
      callApi(holdEndpoints.listHolds, { params: { id: householdId }, signal }),
  });
}

export function useHolds(householdId: string) {
  return useQuery(holdsQuery(householdId));
}
