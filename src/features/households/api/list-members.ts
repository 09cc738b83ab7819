import { queryOptions, useQuery } from '@tanstack/react-query';
import { householdEndpoints } from '../../../../server/contract/households.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Who belongs to a household. */
export function memberListQuery(householdId: string) {
  return queryOptions({
    queryKey: ['households', householdId, 'members'],
    queryFn: ({ signal }) =>
      callApi(householdEndpoints.listMembers, { params: { id: householdId }, signal }),
  });
}

export function useMembers(householdId: string) {
  return useQuery(memberListQuery(householdId));
}
