import { shredListEndpoints, type ShredList } from '../../../../server/contract/shred-lists.ts';
import { callApi } from '../../../lib/api-client.ts';
import { useChangeShredList } from './change-shred-list.ts';

/** Gives a list up; its papers go back to where they were. */
export function useVoidShredList(list: ShredList) {
  return useChangeShredList(list, (reason: string) =>
    callApi(shredListEndpoints.voidShredList, {
      params: { id: list.id },
      body: { reason },
      ifMatch: list.version,
    }),
  );
}
