import { Router } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import { liftHold, listHolds, placeHold } from '../use-cases/holds/holds.ts';
import { dayOf } from './day-of.ts';
import { mountForHousehold } from './mount.ts';

export function holdRoutes(deps: Deps): Router {
  const router = Router();
  mountForHousehold(router, endpoints.listHolds, ({ access }) => listHolds(access));
  mountForHousehold(router, endpoints.placeHold, async ({ access, body }) =>
    placeHold(body, access, await dayOf(access, deps)),
  );
  mountForHousehold(router, endpoints.liftHold, async ({ access, params, body }) =>
    liftHold(params.id, body.reason, access, await dayOf(access, deps)),
  );
  return router;
}
