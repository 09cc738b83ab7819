import { Router } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import { assessCase, getRuleTable, listRuleTables } from '../use-cases/rule-tables.ts';
import { mountForSignedIn } from './mount.ts';

export function ruleTableRoutes({ ruleSet }: Deps): Router {
  const router = Router();
  mountForSignedIn(router, endpoints.listRuleTables, () => listRuleTables(ruleSet));
  mountForSignedIn(router, endpoints.getRuleTable, ({ params }) =>
    getRuleTable(params.country, ruleSet),
  );
  mountForSignedIn(router, endpoints.assessCase, ({ body }) => assessCase(body, ruleSet));
  return router;
}
