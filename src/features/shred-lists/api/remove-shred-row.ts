import { shredListEndpoints, type ShredList } from '../../../../server/contract/shred-lists.ts';
import { callApi } from '../../../lib/api-client.ts';
import { useChangeShredList } from './change-shred-list.ts';

/** Takes one paper off a list that is not approved yet. */
export function useRemoveShredRow(list: ShredList) {
  return useChangeShredList(list, (paper: string) =>
    callApi(shredListEndpoints.removeShredRow, {
      params: { id: list.id, paper },
      ifMatch: list.version,
    }),
  );
}
