import { queryOptions } from '@tanstack/react-query';
import { householdEndpoints } from '../../../../server/contract/households.ts';
import { callApi } from '../../../lib/api-client.ts';

/** The household whose papers leave: its name and its day. */
export function householdQuery(householdId: string) {
  return queryOptions({
    queryKey: ['households', householdId],
    queryFn: ({ signal }) =>
      callApi(householdEndpoints.getHousehold, { params: { id: householdId }, signal }),
  });
}
