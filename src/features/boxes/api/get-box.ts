import { queryOptions, useQuery } from '@tanstack/react-query';
import { boxEndpoints } from '../../../../server/contract/boxes.ts';
import { callApi } from '../../../lib/api-client.ts';

/** One box. */
export function boxQuery(boxId: string) {
  return queryOptions({
    queryKey: ['boxes', boxId],
    queryFn: ({ signal }) => callApi(boxEndpoints.getBox, { params: { id: boxId }, signal }),
  });
}

/** One box; asked anew every few seconds while something in it is being read. */
export function useBox(boxId: string) {
  return useQuery({
    ...boxQuery(boxId),
    refetchInterval: ({ state }) => ((state.data?.counts.reading ?? 0) > 0 ? 3000 : false),
  });
}
