/** The OpenAPI 3.1 document, generated from the endpoint table. */
import {
  OpenApiGeneratorV31,
  OpenAPIRegistry,
  extendZodWithOpenApi,
} from '@asteasolutions/zod-to-openapi';
import { z } from 'zod';
import type { Endpoint } from '../contract/endpoint.ts';
import { endpoints } from '../contract/endpoints.ts';
import { problemSchema } from '../contract/problems.ts';

extendZodWithOpenApi(z);

const problem = (description: string) => ({
  description,
  content: { 'application/problem+json': { schema: problemSchema } },
});

/** Describes every call of the endpoint table. */
export function createOpenApiDocument(): Record<string, unknown> {
  const registry = new OpenAPIRegistry();
  registry.registerComponent('securitySchemes', 'session', {
    type: 'apiKey',
    in: 'cookie',
    name: 'slackwater',
  });
  for (const [operationId, endpoint] of Object.entries(endpoints) as [string, Endpoint][]) {
    registry.registerPath({
      operationId,
      method: endpoint.method,
      path: endpoint.path.replace(/:(\w+)/g, '{$1}'),
      summary: endpoint.summary,
      tags: [endpoint.tag],
      ...(endpoint.access === 'public' ? {} : { security: [{ session: [] }] }),
      request: describeRequest(endpoint),
      responses: {
        [endpoint.status]: describeAnswer(endpoint),
        ...describeRefusals(endpoint),
      },
    });
  }
  const document = new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: {
      title: 'Slackwater',
      version: '1.0.0',
      description:
        'Cookie session. State-changing calls carry X-CSRF-Token, whose value GET /api/session returns. Errors are RFC 9457 problem details.',
    },
  });
  return JSON.parse(JSON.stringify(document)) as Record<string, unknown>;
}

function describeRequest(endpoint: Endpoint) {
  const headers = z.object({
    ...(changesState(endpoint) ? { 'X-CSRF-Token': z.string() } : {}),
    ...(endpoint.ifMatch ? { 'If-Match': z.string().describe('The version that was seen') } : {}),
  });
  return {
    ...(endpoint.params ? { params: endpoint.params } : {}),
    ...(endpoint.query ? { query: endpoint.query } : {}),
    ...(Object.keys(headers.shape).length > 0 ? { headers } : {}),
    ...(endpoint.body
      ? { body: { content: { 'application/json': { schema: endpoint.body } } } }
      : {}),
    ...(endpoint.multipart
      ? {
          body: {
            content: {
              'multipart/form-data': {
                schema: z.object({ files: z.array(z.string().meta({ format: 'binary' })) }),
              },
            },
          },
        }
      : {}),
  };
}

function describeAnswer(endpoint: Endpoint) {
  if (endpoint.response) {
    return {
      description: endpoint.summary,
      content: { 'application/json': { schema: endpoint.response } },
    };
  }
  if (!endpoint.mediaType) return { description: 'Done; nothing to return' };
  return {
    description: endpoint.summary,
    content: { [endpoint.mediaType]: { schema: z.string().meta({ format: 'binary' }) } },
  };
}

function describeRefusals(endpoint: Endpoint) {
  return {
    ...(endpoint.access === 'public' ? {} : { 401: problem('Nobody is signed in') }),
    ...(changesState(endpoint) || endpoint.access !== 'public'
      ? { 403: problem('Not allowed') }
      : {}),
    ...(endpoint.params ? { 404: problem('Not there, or not for the caller to know of') } : {}),
    ...(endpoint.ifMatch
      ? {
          412: problem('Changed meanwhile; `current` is the record as it stands'),
          428: problem('If-Match is missing'),
        }
      : {}),
    ...(endpoint.body || endpoint.query
      ? { 422: problem('Some of the input does not fit; each field is named') }
      : {}),
  };
}

function changesState(endpoint: Endpoint): boolean {
  return endpoint.method !== 'get';
}
