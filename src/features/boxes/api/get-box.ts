import { queryOptions, useQuery } from '@tanstack/react-query';
import { boxEndpoints } from '../../../../server/contract/boxes.ts';
import { callApi } from '../../../lib/api-client.ts';

export function boxQuery(boxId: string) {
  return queryOptions({
    queryKey: ['boxes', boxId],
    queryFn: ({ signal }) => callApi(boxEndpoints.getBox, { params: { id: boxId }, signal }),
  });
}

const whileReadingMs = 2000;

/** One box; its counts are asked for again while something in it is being read. */
export function useBox(boxId: string) {
  return useQuery({
    ...boxQuery(boxId),
    refetchInterval: ({ state }) =>
      (state.data?.counts.reading ?? 0) > 0 ? whileReadingMs : false,
  });
}
