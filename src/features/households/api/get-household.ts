import { queryOptions, useQuery } from '@tanstack/react-query';
import { householdEndpoints } from '../../../../server/contract/households.ts';
import { callApi } from '../../../lib/api-client.ts';

/** One household. Everything kept about it has a key that begins with this one. */
export function householdQuery(householdId: string) {
  return queryOptions({
    queryKey: ['households', householdId],
    queryFn: ({ signal }) =>
      callApi(householdEndpoints.getHousehold, { params: { id: householdId }, signal }),
  });
}

export function useHousehold(householdId: string) {
  return useQuery(householdQuery(householdId));
}
