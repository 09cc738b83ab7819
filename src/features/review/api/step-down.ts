import { paperEndpoints, type Paper } from '../../../../server/contract/papers.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Takes the rule's own date instead of the longer advised one, with a reason. */
export function stepDown(paperId: string, reason: string, version: number): Promise<Paper> {
  return callApi(paperEndpoints.stepDown, {
    params: { id: paperId },
    body: { reason },
    ifMatch: version,
  });
}
