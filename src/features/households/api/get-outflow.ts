import { queryOptions, useQuery } from '@tanstack/react-query';
import { householdEndpoints } from '../../../../server/contract/households.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Year by year, how much paper is still to leave and what stays. */
export function outflowQuery(householdId: string) {
  return queryOptions({
    queryKey: ['households', householdId, 'outflow'],
    queryFn: ({ signal }) =>
      callApi(householdEndpoints.getOutflow, { params: { id: householdId }, signal }),
  });
}

export function useOutflow(householdId: string) {
  return useQuery(outflowQuery(householdId));
}
