import { Router } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import { showOutflow } from '../use-cases/papers/show-outflow.ts';
import { dayOf } from './day-of.ts';
import { mountForHousehold } from './mount.ts';

export function outflowRoutes(deps: Deps): Router {
  const router = Router();
  mountForHousehold(router, endpoints.getOutflow, async ({ access }) =>
    showOutflow(access, (await dayOf(access, deps)).today),
  );
  return router;
}
