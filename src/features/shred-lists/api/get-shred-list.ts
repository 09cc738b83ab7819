import { queryOptions } from '@tanstack/react-query';
import { shredListEndpoints } from '../../../../server/contract/shred-lists.ts';
import { buildApiUrl, callApi } from '../../../lib/api-client.ts';

/** One shred list. */
export function shredListQuery(listId: string) {
  return queryOptions({
    queryKey: ['shred-lists', listId],
    queryFn: ({ signal }) =>
      callApi(shredListEndpoints.getShredList, { params: { id: listId }, signal }),
  });
}

/** Where the list to print is. */
export function shredListPdfUrl(listId: string): string {
  return buildApiUrl(shredListEndpoints.getShredListPdf, { params: { id: listId } });
}

/** Where the record of what was shredded is. */
export function recordPdfUrl(listId: string): string {
  return buildApiUrl(shredListEndpoints.getDestructionRecordPdf, { params: { id: listId } });
}
