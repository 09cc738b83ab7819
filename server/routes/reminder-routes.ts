import { Router } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import { makeCalendarAddress } from '../use-cases/reminders/calendar.ts';
import { listPracticeMail, listReminders } from '../use-cases/reminders/list-reminders.ts';
import { mountForHousehold, mountForPractice } from './mount.ts';

export function reminderRoutes(deps: Deps): Router {
  const router = Router();
  mountForHousehold(router, endpoints.listReminders, ({ access }) =>
    listReminders(access.householdId, { userId: access.user.id, reach: access.reach }, deps),
  );
  mountForPractice(router, endpoints.listMail, ({ membership, query }) =>
    listPracticeMail(membership.practiceId, query),
  );
  mountForHousehold(router, endpoints.getCalendarAddress, ({ access }) =>
    makeCalendarAddress(
      { householdId: access.householdId, practiceId: access.practiceId, userId: access.user.id },
      deps,
    ),
  );
  return router;
}
