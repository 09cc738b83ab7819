import { z } from 'zod';
import { instantSchema } from './dates.ts';
import { defineEndpoint, idParams, listOf, listQuery } from './endpoint.ts';

export const activitySchema = z.object({
  id: z.string(),
  at: instantSchema,
  byName: z.string(),
  action: z.string(),
  /** Plain sentence for the screen. */
  sentence: z.string(),
  paperId: z.uuid().nullable(),
  shredListId: z.uuid().nullable(),
});
export type Activity = z.infer<typeof activitySchema>;

export const activityEndpoints = {
  listActivity: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/activity',
    tag: 'activity',
    summary: 'Who did what when, newest first; never changed afterwards',
    access: 'activity:read',
    params: idParams,
    query: listQuery,
    status: 200,
    response: listOf(activitySchema),
  }),
};
