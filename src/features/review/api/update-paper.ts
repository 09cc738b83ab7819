import { paperEndpoints, type Paper } from '../../../../server/contract/papers.ts';
import { ApiError, callApi } from '../../../lib/api-client.ts';
import { isConflict, sentenceOf } from '../../../lib/api-error.ts';
import type { OutboxEntry, SendResult } from '../logic/outbox.ts';
import { paperFromConflict } from './conflict-answer.ts';

/** Sends one decision or correction, and says what became of it. Never throws. */
export async function sendPatch(
  entry: Pick<OutboxEntry, 'paperId' | 'patch' | 'version'>,
): Promise<SendResult> {
  try {
    const paper: Paper = await callApi(paperEndpoints.updatePaper, {
      params: { id: entry.paperId },
      body: entry.patch,
      ifMatch: entry.version,
    });
    return { kind: 'saved', paper };
  } catch (error) {
    if (isConflict(error)) {
      const current = await paperFromConflict(error, entry.paperId);
      return current ? { kind: 'conflict', current } : { kind: 'offline' };
    }
    return isRefusal(error) ? { kind: 'refused', reason: sentenceOf(error) } : { kind: 'offline' };
  }
}

/** A lost sign-in, a busy server or a broken line pass; any other answer is a refusal. */
function isRefusal(error: unknown): boolean {
  if (!(error instanceof ApiError)) return false;
  return ![401, 408, 429].includes(error.status) && error.status < 500;
}
