import type { z } from 'zod';
import {
  holdEndpoints,
  type Hold,
  type placeHoldSchema,
} from '../../../../server/contract/holds.ts';
import { callApi } from '../../../lib/api-client.ts';

export type HoldInput = z.input<typeof placeHoldSchema>;

/** Says that a paper, or everything of the household, must not be destroyed yet. */
export function placeHold(householdId: string, input: HoldInput): Promise<Hold> {
  return callApi(holdEndpoints.placeHold, { params: { id: householdId }, body: input });
}
