import type { z } from 'zod';
import type {
  BodyInputOf,
  Endpoint,
  ParamsOf,
  QueryInputOf,
  ResponseOf,
} from '../../server/contract/endpoint.ts';
import { problemSchema } from '../../server/contract/problems.ts';
import type { Problem } from '../../server/contract/problems.ts';
import { sessionEndpoints } from '../../server/contract/sessions.ts';
import { ApiError, NetworkError } from './api-error.ts';

export { ApiError, NetworkError } from './api-error.ts';

type ParamsPart<T extends Endpoint> = T['params'] extends z.ZodType
  ? { params: ParamsOf<T> }
  : { params?: undefined };
type QueryPart<T extends Endpoint> = T['query'] extends z.ZodType
  ? { query?: QueryInputOf<T> }
  : { query?: undefined };
type BodyPart<T extends Endpoint> = T['body'] extends z.ZodType
  ? { body: BodyInputOf<T> }
  : { body?: undefined };
type IfMatchPart<T extends Endpoint> = T['ifMatch'] extends true
  ? { ifMatch: number }
  : { ifMatch?: undefined };

/** What a call needs, by its endpoint: params, query, body, and the version it was made against. */
export type CallOf<T extends Endpoint> = ParamsPart<T> &
  QueryPart<T> &
  BodyPart<T> &
  IfMatchPart<T> & { signal?: AbortSignal };

interface Address {
  params?: Record<string, unknown> | undefined;
  query?: Record<string, unknown> | undefined;
}

let csrfToken: string | null = null;

/** Remembers the token that state-changing calls carry; it changes at sign-in. */
export function setCsrfToken(token: string | null): void {
  csrfToken = token;
}

/** The address of an endpoint: for pictures, PDFs and downloads as well as for calls. */
export function buildApiUrl(endpoint: Endpoint, { params, query }: Address = {}): string {
  const path = endpoint.path.replace(/:([a-zA-Z]+)/g, (_match, name: string) => {
    const value = params?.[name];
    if (typeof value !== 'string')
      throw new TypeError(`"${name}" is missing for ${endpoint.path}.`);
    return encodeURIComponent(value);
  });
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query ?? {})) {
    if (typeof value === 'string' || typeof value === 'number') {
      if (value !== '') search.set(name, String(value));
    }
  }
  const tail = search.toString();
  return tail ? `${path}?${tail}` : path;
}

/** Turns an answer that is not JSON problem details into one. */
function describeStatus(status: number): Problem {
  const detail =
    status === 413
      ? 'This file is too large. Send it in smaller parts.'
      : status >= 500
        ? 'The server had a fault. Wait a moment and try again.'
        : 'The server refused this. Load the page again and try once more.';
  return { type: 'about:blank', title: 'Refused', status, detail };
}

/** Reads an error answer's body text as problem details. */
export function parseProblem(status: number, text: string): Problem {
  try {
    const parsed = problemSchema.safeParse(JSON.parse(text));
    if (parsed.success) return parsed.data;
  } catch {
    // A proxy's page in place of an answer of ours: the status is all there is to go by.
  }
  return describeStatus(status);
}

/** The CSRF token, asked for first when this tab does not know it yet. */
export async function requireCsrfToken(): Promise<string> {
  if (csrfToken === null) {
    const session = await callApi(sessionEndpoints.getSession, {});
    csrfToken = session.csrfToken;
  }
  return csrfToken;
}

async function send(url: string, init: RequestInit): Promise<Response> {
  try {
    return await fetch(url, init);
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw new NetworkError();
  }
}

/**
 * Makes one call of the API and gives its answer, typed by the endpoint.
 * Throws ApiError when the server refuses and NetworkError when it cannot be reached.
 */
export async function callApi<T extends Endpoint>(
  endpoint: T,
  call: CallOf<T>,
): Promise<ResponseOf<T>> {
  const headers = new Headers({ Accept: 'application/json' });
  if (endpoint.method !== 'get') headers.set('X-CSRF-Token', await requireCsrfToken());
  if (call.body !== undefined) headers.set('Content-Type', 'application/json');
  if (call.ifMatch !== undefined) headers.set('If-Match', `"${call.ifMatch}"`);
  const response = await send(buildApiUrl(endpoint, call), {
    method: endpoint.method.toUpperCase(),
    headers,
    credentials: 'same-origin',
    body: call.body === undefined ? null : JSON.stringify(call.body),
    signal: call.signal ?? null,
  });
  if (!response.ok) throw new ApiError(parseProblem(response.status, await response.text()));
  if (response.status === 204 || !endpoint.response) return undefined as ResponseOf<T>;
  return (await response.json()) as ResponseOf<T>;
}
