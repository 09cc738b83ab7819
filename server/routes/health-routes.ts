import { Router } from 'express';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import { checkHealth } from '../use-cases/check-health.ts';
import { mountPublic } from './mount.ts';
import { createOpenApiDocument } from './openapi.ts';

export function healthRoutes(deps: Deps): Router {
  const router = Router();
  mountPublic(router, endpoints.getHealth, async ({ response }) => {
    const health = await checkHealth(deps);
    if (health.status === 'down') response.status(503).json(health);
    return health;
  });
  const document = createOpenApiDocument();
  mountPublic(router, endpoints.getOpenApi, () => document);
  return router;
}
