import { Router } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import { listPaperChanges, undoPaper, updatePaper } from '../use-cases/papers/change-paper.ts';
import { copyPaper, copyPapers } from '../use-cases/papers/copy-papers.ts';
import { departPaper, stepDown } from '../use-cases/papers/depart-paper.ts';
import { enterPaper } from '../use-cases/papers/enter-paper.ts';
import { exportPapers, listPapers } from '../use-cases/papers/list-papers.ts';
import { joinPaper, splitPaper } from '../use-cases/papers/rearrange-papers.ts';
import { getPaper } from '../use-cases/papers/view-paper.ts';
import { showReadingQuality } from '../use-cases/reading/show-reading-quality.ts';
import { dayOf } from './day-of.ts';
import { mountForHousehold, mountForPractice } from './mount.ts';
import { sendPdf } from './send-file.ts';

export function paperRoutes(deps: Deps): Router {
  const router = Router();
  mountForHousehold(router, endpoints.exportPapers, async ({ access, query, response }) => {
    const csv = await exportPapers(query, access);
    response
      .status(200)
      .type('text/csv')
      .set('Content-Disposition', 'attachment; filename="papers.csv"')
      .send(csv);
  });
  mountForHousehold(router, endpoints.copyPapers, async ({ access, query, response }) => {
    sendPdf(response, await copyPapers(query, access, deps), 'papers.pdf');
  });
  // Before the paper itself: ":id" alone would take "….pdf" for an id.
  mountForHousehold(router, endpoints.copyPaper, async ({ access, params, response }) => {
    sendPdf(response, await copyPaper(params.id, access, deps), 'paper.pdf');
  });
  mountForHousehold(router, endpoints.listPapers, ({ access, query }) => listPapers(query, access));
  mountForHousehold(router, endpoints.enterPaper, async ({ access, body }) =>
    enterPaper(body, access, await dayOf(access, deps)),
  );
  mountForHousehold(router, endpoints.getPaper, async ({ access, params }) =>
    getPaper(params.id, access, await dayOf(access, deps)),
  );
  mountForHousehold(router, endpoints.updatePaper, async ({ access, params, version, body }) =>
    updatePaper({ id: params.id, version }, body, access, await dayOf(access, deps)),
  );
  mountForHousehold(router, endpoints.undoPaper, async ({ access, params, version }) =>
    undoPaper({ id: params.id, version }, access, await dayOf(access, deps)),
  );
  mountForHousehold(router, endpoints.splitPaper, async ({ access, params, version, body }) =>
    splitPaper({ id: params.id, version }, body.beforePage, access, await dayOf(access, deps)),
  );
  mountForHousehold(router, endpoints.joinPaper, async ({ access, params, version, body }) =>
    joinPaper({ id: params.id, version }, body.with, access, await dayOf(access, deps)),
  );
  mountForHousehold(router, endpoints.stepDown, async ({ access, params, version, body }) =>
    stepDown({ id: params.id, version }, body.reason, access, await dayOf(access, deps)),
  );
  mountForHousehold(router, endpoints.departPaper, async ({ access, params, version, body }) =>
    departPaper({ id: params.id, version }, body, access, await dayOf(access, deps)),
  );
  mountForHousehold(router, endpoints.listPaperChanges, ({ access, params }) =>
    listPaperChanges(params.id, access),
  );
  mountForPractice(router, endpoints.getReadingQuality, ({ membership }) =>
    showReadingQuality(membership.practiceId),
  );
  return router;
}
