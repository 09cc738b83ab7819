import { Router } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import { createSubject, listSubjects, updateSubject } from '../use-cases/subjects/subjects.ts';
import { dayOf } from './day-of.ts';
import { mountForHousehold } from './mount.ts';

export function subjectRoutes(deps: Deps): Router {
  const router = Router();
  mountForHousehold(router, endpoints.listSubjects, ({ access }) => listSubjects(access));
  mountForHousehold(router, endpoints.createSubject, async ({ access, body }) =>
    createSubject(body, access, await dayOf(access, deps)),
  );
  mountForHousehold(router, endpoints.updateSubject, async ({ access, params, version, body }) =>
    updateSubject({ id: params.id, version }, body, access, await dayOf(access, deps)),
  );
  return router;
}
