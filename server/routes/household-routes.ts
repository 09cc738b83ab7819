import { Router } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import {
  createHousehold,
  getHousehold,
  listHouseholds,
  updateHousehold,
} from '../use-cases/households/households.ts';
import { listHouseholdMembers } from '../use-cases/households/members.ts';
import { mountForHousehold, mountForPractice, mountForSignedIn } from './mount.ts';

export function householdRoutes(deps: Deps): Router {
  const router = Router();
  mountForSignedIn(router, endpoints.listHouseholds, ({ caller, query }) =>
    listHouseholds({ userId: caller.user.id, memberships: caller.memberships }, query, deps.clock),
  );
  mountForPractice(router, endpoints.createHousehold, ({ body, caller, membership }) =>
    createHousehold(body, { userId: caller.user.id, practiceId: membership.practiceId }, deps),
  );
  mountForHousehold(router, endpoints.getHousehold, ({ access }) =>
    getHousehold(
      access.householdId,
      { userId: access.user.id, seeReach: access.seeReach },
      deps.clock,
    ),
  );
  mountForHousehold(router, endpoints.updateHousehold, ({ access, version, body }) =>
    updateHousehold(
      access.householdId,
      version,
      body,
      { userId: access.user.id, practiceId: access.practiceId, seeReach: access.seeReach },
      deps,
    ),
  );
  mountForHousehold(router, endpoints.listMembers, ({ access }) =>
    listHouseholdMembers(access, deps.clock),
  );
  return router;
}
