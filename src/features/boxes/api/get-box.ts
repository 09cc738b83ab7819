import { queryOptions, useQuery } from '@tanstack/react-query';
import { boxEndpoints } from '../../../../server/contract/boxes.ts';
import { callApi } from '../../../lib/api-client.ts';

export function boxQuery(boxId: string) {
  return queryOptions({
    queryKey: ['boxes', boxId],
    queryFn: ({ signal }) => callApi(boxEndpoints.getBox, { params: { id: boxId }, signal }),
  });
}

export function useBox(boxId: string) {
  return useQuery(boxQuery(boxId));
}
