import { Router } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import { listActivity } from '../use-cases/list-activity.ts';
import { mountForHousehold } from './mount.ts';

export function activityRoutes(_deps: Deps): Router {
  const router = Router();
  mountForHousehold(router, endpoints.listActivity, ({ access, query }) =>
    listActivity(access, query),
  );
  return router;
}
