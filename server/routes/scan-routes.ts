import { Router, type Response } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import { createUploadReceiver } from '../storage/upload-receiver.ts';
import { showPicture } from '../use-cases/scans/show-picture.ts';
import { listScans, retryScan, uploadScans } from '../use-cases/scans/upload-scans.ts';
import { type HouseholdCall, mountForHousehold } from './mount.ts';

export function scanRoutes(deps: Deps): Router {
  const router = Router();
  const receive = createUploadReceiver(deps.config.uploadsDir, deps.config.limits);

  mountForHousehold(
    router,
    endpoints.uploadScans,
    async ({ access, params, request, response }) => {
      // Bytes are received only after the access check has passed.
      await new Promise<void>((resolve, reject) => {
        receive(request, response, (error: unknown) =>
          error ? reject(error instanceof Error ? error : new Error('upload failed')) : resolve(),
        );
      });
      const items = await uploadScans(
        request.receivedFiles ?? [],
        {
          userId: access.user.id,
          practiceId: access.practiceId,
          householdId: access.householdId,
          boxId: params.id,
        },
        deps,
      );
      return { items };
    },
  );
  mountForHousehold(router, endpoints.listScans, ({ access, params }) =>
    listScans(params.id, access),
  );
  mountForHousehold(router, endpoints.retryScan, ({ access, params }) =>
    retryScan(params.id, access, deps),
  );

  const sendPicture =
    (kind: 'image' | 'thumbnail') =>
    async ({
      access,
      params,
      response,
    }: Pick<HouseholdCall<typeof endpoints.getPageImage>, 'access' | 'params' | 'response'>) => {
      const viewer = { userId: access.user.id, seeReach: access.seeReach };
      sendJpeg(response, await showPicture(params.id, kind, viewer, deps));
    };
  mountForHousehold(router, endpoints.getPageImage, sendPicture('image'));
  mountForHousehold(router, endpoints.getPageThumbnail, sendPicture('thumbnail'));
  return router;
}

function sendJpeg(response: Response, bytes: Buffer): void {
  // Pictures never change, but who may see them can: the browser asks each time it starts.
  response.status(200).type('image/jpeg').set('Cache-Control', 'private, max-age=3600').send(bytes);
}
