import type { z } from 'zod';
import {
  shredListEndpoints,
  type approveShredListSchema,
  type ShredList,
} from '../../../../server/contract/shred-lists.ts';
import { callApi } from '../../../lib/api-client.ts';
import { useChangeShredList } from './change-shred-list.ts';

export type Approval = z.input<typeof approveShredListSchema>;

/** Approves the version of the list that the person has in front of them. */
export function useApproveShredList(list: ShredList) {
  return useChangeShredList(list, (body: Approval) =>
    callApi(shredListEndpoints.approveShredList, { params: { id: list.id }, body }),
  );
}
