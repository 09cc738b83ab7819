import { Router } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import { readCalendar } from '../use-cases/reminders/calendar.ts';
import { mountPublic } from './mount.ts';

/** Asked by calendar programs without a session: the token in the address is the key. */
export function calendarRoutes(deps: Deps): Router {
  const router = Router();
  mountPublic(router, endpoints.getCalendar, async ({ params, query, response }) => {
    const text = await readCalendar(params.id, query.token, deps);
    response
      .status(200)
      .set('Content-Type', 'text/calendar; charset=utf-8')
      .set('Content-Disposition', 'inline; filename="papers.ics"')
      .send(text);
  });
  return router;
}
