import { shredListEndpoints, type ShredList } from '../../../../server/contract/shred-lists.ts';
import { callApi } from '../../../lib/api-client.ts';
import { useChangeShredList } from './change-shred-list.ts';

/** Sends the list to the client for approval. */
export function useSendShredList(list: ShredList) {
  return useChangeShredList(list, () =>
    callApi(shredListEndpoints.sendShredList, { params: { id: list.id }, ifMatch: list.version }),
  );
}
