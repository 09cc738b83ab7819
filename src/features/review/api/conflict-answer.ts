import { paperEndpoints, paperSchema, type Paper } from '../../../../server/contract/papers.ts';
import { callApi } from '../../../lib/api-client.ts';
import type { ApiError } from '../../../lib/api-error.ts';

/** The paper as it stands now: from the 412 answer itself, else asked for; null when neither is to be had. */
export async function paperFromConflict(error: ApiError, paperId: string): Promise<Paper | null> {
  const parsed = paperSchema.safeParse(error.problem.current);
  if (parsed.success) return parsed.data;
  try {
    return await callApi(paperEndpoints.getPaper, { params: { id: paperId } });
  } catch {
    return null;
  }
}
