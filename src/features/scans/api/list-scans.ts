import { queryOptions, useQuery } from '@tanstack/react-query';
import { scanEndpoints } from '../../../../server/contract/scans.ts';
import { callApi } from '../../../lib/api-client.ts';

const whileReadingMs = 1000;

/** The scans of a box; asked for again every second while one is being read. */
export function scansQuery(boxId: string) {
  return queryOptions({
    queryKey: ['boxes', boxId, 'scans'],
    queryFn: ({ signal }) => callApi(scanEndpoints.listScans, { params: { id: boxId }, signal }),
    refetchInterval: ({ state }) =>
      state.data?.items.some((scan) => scan.status === 'waiting' || scan.status === 'reading')
        ? whileReadingMs
        : false,
  });
}

export function useScans(boxId: string) {
  return useQuery(scansQuery(boxId));
}
