import { Router } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import { recordDestruction } from '../use-cases/shred-lists/carry-out.ts';
import {
  approveShredList,
  removeFromList,
  sendShredList,
  voidShredList,
} from '../use-cases/shred-lists/decide-list.ts';
import { createShredList } from '../use-cases/shred-lists/gather.ts';
import { printListOf, printRecordOf } from '../use-cases/shred-lists/print-list.ts';
import { getShredList, listShredLists } from '../use-cases/shred-lists/view-list.ts';
import { dayOf } from './day-of.ts';
import { mountForHousehold } from './mount.ts';
import { sendPdf } from './send-file.ts';

export function shredListRoutes(deps: Deps): Router {
  const router = Router();
  mountForHousehold(router, endpoints.listShredLists, async ({ access }) =>
    listShredLists(access, await dayOf(access, deps)),
  );
  mountForHousehold(router, endpoints.createShredList, async ({ access, body }) =>
    createShredList(body, access, await dayOf(access, deps)),
  );
  // Before the list itself: ":id" alone would take "….pdf" for an id.
  mountForHousehold(router, endpoints.getShredListPdf, async ({ access, params, response }) => {
    const bytes = await printListOf(params.id, access, await dayOf(access, deps), deps);
    sendPdf(response, bytes, 'shred-list.pdf');
  });
  mountForHousehold(
    router,
    endpoints.getDestructionRecordPdf,
    async ({ access, params, response }) => {
      const bytes = await printRecordOf(params.id, access, await dayOf(access, deps));
      sendPdf(response, bytes, 'what-was-shredded.pdf');
    },
  );
  mountForHousehold(router, endpoints.getShredList, async ({ access, params }) =>
    getShredList(params.id, access, await dayOf(access, deps)),
  );
  mountForHousehold(router, endpoints.removeShredRow, async ({ access, params, version }) =>
    removeFromList({ id: params.id, version }, params.paper, access, await dayOf(access, deps)),
  );
  mountForHousehold(router, endpoints.sendShredList, async ({ access, params, version }) =>
    sendShredList({ id: params.id, version }, access, await dayOf(access, deps), deps),
  );
  mountForHousehold(router, endpoints.approveShredList, async ({ access, params, body }) =>
    approveShredList(params.id, body, access, await dayOf(access, deps), deps),
  );
  mountForHousehold(router, endpoints.recordDestruction, async ({ access, params, body }) =>
    recordDestruction(params.id, body, access, await dayOf(access, deps)),
  );
  mountForHousehold(router, endpoints.voidShredList, async ({ access, params, version, body }) =>
    voidShredList({ id: params.id, version }, body.reason, access, await dayOf(access, deps)),
  );
  return router;
}
