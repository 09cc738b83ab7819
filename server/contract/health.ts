import { z } from 'zod';
import { defineEndpoint } from './endpoint.ts';

const part = z.enum(['up', 'down']);
export const healthSchema = z.object({
  status: part,
  database: part,
  queue: part,
  storage: part,
});

export const healthEndpoints = {
  getHealth: defineEndpoint({
    method: 'get',
    path: '/api/health',
    tag: 'service',
    summary: 'State of database, queue and storage; 503 when one is down',
    access: 'public',
    status: 200,
    response: healthSchema,
  }),
  getOpenApi: defineEndpoint({
    method: 'get',
    path: '/api/openapi.json',
    tag: 'service',
    summary: 'This description',
    access: 'public',
    status: 200,
    response: z.record(z.string(), z.unknown()),
  }),
};
