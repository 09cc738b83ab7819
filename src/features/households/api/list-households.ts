import { queryOptions, useQuery } from '@tanstack/react-query';
import { householdEndpoints } from '../../../../server/contract/households.ts';
import { callApi } from '../../../lib/api-client.ts';

/** The households one may see, by name. */
export function householdListQuery(page = 1) {
  return queryOptions({
    queryKey: ['households', 'list', page],
    queryFn: ({ signal }) =>
      callApi(householdEndpoints.listHouseholds, {
        query: { page, pageSize: 50, sort: 'name' },
        signal,
      }),
  });
}

export function useHouseholds(page = 1) {
  return useQuery(householdListQuery(page));
}
