import { paperEndpoints, type Paper } from '../../../../server/contract/papers.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Splits a paper before one of its pages (from 2). */
export function splitPaper(
  paperId: string,
  beforePage: number,
  version: number,
): Promise<{ first: Paper; second: Paper }> {
  return callApi(paperEndpoints.splitPaper, {
    params: { id: paperId },
    body: { beforePage },
    ifMatch: version,
  });
}
