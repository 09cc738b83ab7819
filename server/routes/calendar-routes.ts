import { Router } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import { readCalendar } from '../use-cases/reminders/calendar.ts';
import { mountPublic } from './mount.ts';
import { sendCalendar } from './send-file.ts';

/** Asked by calendar programs without a session: the token in the address is the key. */
export function calendarRoutes(deps: Deps): Router {
  const router = Router();
  mountPublic(router, endpoints.getCalendar, async ({ params, query, response }) => {
    sendCalendar(response, await readCalendar(params.id, query.token, deps));
  });
  return router;
}
