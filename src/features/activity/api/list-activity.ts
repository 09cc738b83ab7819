import { keepPreviousData, queryOptions, useQuery } from '@tanstack/react-query';
import { activityEndpoints } from '../../../../server/contract/activity.ts';
import { callApi } from '../../../lib/api-client.ts';

export const activityPageSize = 50;

export function activityQuery(householdId: string, page: number) {
  return queryOptions({
    queryKey: ['households', householdId, 'activity', page],
    queryFn: ({ signal }) =>
      callApi(activityEndpoints.listActivity, {
        params: { id: householdId },
        query: { page, pageSize: activityPageSize },
        signal,
      }),
    placeholderData: keepPreviousData,
  });
}

export function useActivity(householdId: string, page: number) {
  return useQuery(activityQuery(householdId, page));
}
