import { paperEndpoints, type Paper } from '../../../../server/contract/papers.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Takes back the last change of a paper. */
export function undoPaper(paperId: string, version: number): Promise<Paper> {
  return callApi(paperEndpoints.undoPaper, { params: { id: paperId }, ifMatch: version });
}
