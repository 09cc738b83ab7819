import { Router } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import {
  createArea,
  createBox,
  getBox,
  listAreas,
  listBoxes,
  printLabelOf,
} from '../use-cases/boxes/boxes.ts';
import type { Access } from './caller.ts';
import { mountForHousehold } from './mount.ts';
import { sendPdf } from './send-file.ts';

export function boxRoutes(deps: Deps): Router {
  const router = Router();
  const by = (access: Access) => ({
    userId: access.user.id,
    practiceId: access.practiceId,
    householdId: access.householdId,
  });
  mountForHousehold(router, endpoints.listAreas, ({ access }) => listAreas(access.householdId));
  mountForHousehold(router, endpoints.createArea, ({ access, body }) =>
    createArea(body.name, by(access), deps),
  );
  mountForHousehold(router, endpoints.listBoxes, ({ access, query }) =>
    listBoxes(access.householdId, query),
  );
  mountForHousehold(router, endpoints.createBox, ({ access, body }) =>
    createBox(body, by(access), deps),
  );
  mountForHousehold(router, endpoints.getBox, ({ params }) => getBox(params.id));
  mountForHousehold(router, endpoints.getBoxLabel, async ({ params, response }) => {
    sendPdf(response, await printLabelOf(params.id, deps.config.publicUrl), 'box-label.pdf');
  });
  return router;
}
