import { queryOptions } from '@tanstack/react-query';
import { paperEndpoints } from '../../../../server/contract/papers.ts';
import { scanEndpoints } from '../../../../server/contract/scans.ts';
import { buildApiUrl, callApi } from '../../../lib/api-client.ts';

/** The paper behind a row, for its pages. */
export function paperQuery(paperId: string) {
  return queryOptions({
    queryKey: ['papers', paperId],
    queryFn: ({ signal }) => callApi(paperEndpoints.getPaper, { params: { id: paperId }, signal }),
  });
}

/** Where the upright picture of a page is. */
export function pageImageUrl(pageId: string): string {
  return buildApiUrl(scanEndpoints.getPageImage, { params: { id: pageId } });
}

/** Where the small picture of a page is. */
export function pageThumbnailUrl(pageId: string): string {
  return buildApiUrl(scanEndpoints.getPageThumbnail, { params: { id: pageId } });
}
