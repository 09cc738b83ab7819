import { Router } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import { listFilings, putFiling } from '../use-cases/filings/filings.ts';
import { dayOf } from './day-of.ts';
import { mountForHousehold } from './mount.ts';

export function filingRoutes(deps: Deps): Router {
  const router = Router();
  mountForHousehold(router, endpoints.listFilings, async ({ access }) =>
    listFilings(access, await dayOf(access, deps)),
  );
  mountForHousehold(router, endpoints.putFiling, async ({ access, body }) =>
    putFiling(body, access, await dayOf(access, deps)),
  );
  return router;
}
