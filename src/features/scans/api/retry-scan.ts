import { useMutation, useQueryClient } from '@tanstack/react-query';
import { scanEndpoints } from '../../../../server/contract/scans.ts';
import { callApi } from '../../../lib/api-client.ts';
import { scansQuery } from './list-scans.ts';

export function useRetryScan(boxId: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (scanId: string) => callApi(scanEndpoints.retryScan, { params: { id: scanId } }),
    onSettled: () => queryClient.invalidateQueries({ queryKey: scansQuery(boxId).queryKey }),
  });
}
