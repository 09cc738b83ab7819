import { paperEndpoints, type Paper } from '../../../../server/contract/papers.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Joins a paper with its neighbour in the same scan. */
export function joinPaper(paperId: string, neighbourId: string, version: number): Promise<Paper> {
  return callApi(paperEndpoints.joinPaper, {
    params: { id: paperId },
    body: { with: neighbourId },
    ifMatch: version,
  });
}
