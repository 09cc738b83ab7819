import { queryOptions } from '@tanstack/react-query';
import { shredListEndpoints } from '../../../../server/contract/shred-lists.ts';
import { callApi } from '../../../lib/api-client.ts';

/** The shred lists of a household, newest first. */
export function shredListsQuery(householdId: string) {
  return queryOptions({
    queryKey: ['households', householdId, 'shred-lists'],
    queryFn: ({ signal }) =>
      callApi(shredListEndpoints.listShredLists, { params: { id: householdId }, signal }),
  });
}
