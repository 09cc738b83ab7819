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
  printSeparatorOf,
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
    listBoxes(access.householdId, access, query),
  );
  mountForHousehold(router, endpoints.createBox, ({ access, body }) =>
    createBox(body, by(access), deps),
  );
  mountForHousehold(router, endpoints.getBox, ({ access, params }) => getBox(params.id, access));
  mountForHousehold(router, endpoints.getBoxLabel, async ({ access, params, response }) => {
    const bytes = await printLabelOf(params.id, access, deps.config.publicUrl);
    sendPdf(response, bytes, 'box-label.pdf');
  });
  mountForHousehold(router, endpoints.getSeparatorSheet, async ({ access, query, response }) => {
    sendPdf(response, await printSeparatorOf(access.householdId, query.paper), 'separator.pdf');
  });
  return router;
}
