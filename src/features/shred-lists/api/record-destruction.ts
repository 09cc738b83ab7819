import type { z } from 'zod';
import {
  shredListEndpoints,
  type destructionSchema,
  type ShredList,
} from '../../../../server/contract/shred-lists.ts';
import { callApi } from '../../../lib/api-client.ts';
import { useChangeShredList } from './change-shred-list.ts';

export type Destruction = z.input<typeof destructionSchema>;

/** Records what was shredded, paper by paper. */
export function useRecordDestruction(list: ShredList) {
  return useChangeShredList(list, (body: Destruction) =>
    callApi(shredListEndpoints.recordDestruction, { params: { id: list.id }, body }),
  );
}
