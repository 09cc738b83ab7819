import { Router } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import {
  endCalendarAddress,
  makeCalendarAddress,
  readPaperCalendar,
} from '../use-cases/reminders/calendar.ts';
import { listPracticeMail, listReminders } from '../use-cases/reminders/list-reminders.ts';
import type { Access } from './caller.ts';
import { mountForHousehold, mountForPractice } from './mount.ts';
import { sendCalendar } from './send-file.ts';

export function reminderRoutes(deps: Deps): Router {
  const router = Router();
  mountForHousehold(router, endpoints.listReminders, ({ access }) =>
    listReminders(access.householdId, access, deps),
  );
  mountForPractice(router, endpoints.listMail, ({ membership, query }) =>
    listPracticeMail(membership.practiceId, query),
  );
  const by = (access: Access) => ({
    householdId: access.householdId,
    practiceId: access.practiceId,
    userId: access.user.id,
  });
  mountForHousehold(router, endpoints.getCalendarAddress, ({ access }) =>
    makeCalendarAddress(by(access), deps),
  );
  mountForHousehold(router, endpoints.endCalendarAddress, ({ access }) =>
    endCalendarAddress(by(access), deps),
  );
  mountForHousehold(router, endpoints.getPaperCalendar, async ({ access, params, response }) => {
    sendCalendar(response, await readPaperCalendar(params.id, access, deps));
  });
  return router;
}
