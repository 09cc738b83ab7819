/**
 * One call of the HTTP API: the server validates with it, the client is typed by it, and the OpenAPI
 * document is generated from it.
 */
import { z } from 'zod';
import type { Permission } from './permissions.ts';

export interface Endpoint {
  method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  /** Express style, for example `/api/papers/:id`. */
  path: string;
  summary: string;
  tag: string;
  /** `public`, any signed-in person, or the permission that the caller's membership must grant. */
  access: 'public' | 'signed-in' | Permission;
  params?: z.ZodObject;
  query?: z.ZodObject;
  body?: z.ZodType;
  /** Multipart upload instead of a JSON body. */
  multipart?: boolean;
  /** The call edits a record that carries `version`: `If-Match` is required, a stale one answers 412. */
  ifMatch?: boolean;
  status: number;
  /** JSON answer; absent for files and empty answers. */
  response?: z.ZodType;
  /** Media type of an answer that is not JSON. */
  mediaType?: string;
}

/** Keeps the exact type of an endpoint's schemas. */
export function defineEndpoint<const T extends Endpoint>(endpoint: T): T {
  return endpoint;
}

export type ParamsOf<T extends Endpoint> = T['params'] extends z.ZodType
  ? z.infer<T['params']>
  : undefined;
export type QueryOf<T extends Endpoint> = T['query'] extends z.ZodType
  ? z.infer<T['query']>
  : undefined;
/** What a caller may leave out of the query. */
export type QueryInputOf<T extends Endpoint> = T['query'] extends z.ZodType
  ? z.input<T['query']>
  : undefined;
export type BodyOf<T extends Endpoint> = T['body'] extends z.ZodType
  ? z.infer<T['body']>
  : undefined;
export type BodyInputOf<T extends Endpoint> = T['body'] extends z.ZodType
  ? z.input<T['body']>
  : undefined;
export type ResponseOf<T extends Endpoint> = T['response'] extends z.ZodType
  ? z.infer<T['response']>
  : undefined;

export const idParams = z.object({ id: z.uuid() });

export const pageSizeLimit = 200;
/** `page` from 1, `pageSize` up to 200, `sort=field` or `-field`. */
export const listQueryShape = {
  page: z.coerce.number().int().min(1).default(1),
  pageSize: z.coerce.number().int().min(1).max(pageSizeLimit).default(50),
  sort: z
    .string()
    .regex(/^-?[a-zA-Z]{1,40}$/)
    .optional(),
};
export const listQuery = z.object(listQueryShape);

/** A page of a list. */
export function listOf<T extends z.ZodType>(item: T) {
  return z.object({ items: z.array(item), total: z.number().int() });
}
