import { queryOptions, useQuery } from '@tanstack/react-query';
import { householdEndpoints } from '../../../../server/contract/households.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Returns sent, and the questions whose answers would settle most papers. */
export function filingListQuery(householdId: string) {
  return queryOptions({
    queryKey: ['households', householdId, 'filings'],
    queryFn: ({ signal }) =>
      callApi(householdEndpoints.listFilings, { params: { id: householdId }, signal }),
  });
}

export function useFilings(householdId: string, enabled = true) {
  return useQuery({ ...filingListQuery(householdId), enabled });
}
