import type { z } from 'zod';
import type {
  BodyInputOf,
  Endpoint,
  ParamsOf,
  QueryInputOf,
  ResponseOf,
} from '../../server/contract/endpoint.ts';
import type { Problem } from '../../server/contract/problems.ts';
import type { Session } from '../../server/contract/sessions.ts';
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
    const body: unknown = JSON.parse(text);
    // Not checked by its schema: the sign-in screen is to load without the schemas.
    if (typeof body === 'object' && body !== null && 'detail' in body && 'title' in body) {
      return { ...(body as Problem), status };
    }
  } catch {
    // A proxy's page in place of an answer of ours: the status is all there is to go by.
  }
  return describeStatus(status);
}

/** Asks who is signed in, and remembers the CSRF token that comes with the answer. */
export async function fetchSession(signal?: AbortSignal): Promise<Session> {
  // By address rather than from the contract's table, which would bring every schema along with it.
  const session = (await sendRequest('get', '/api/session', {
    ...(signal ? { signal } : {}),
  })) as Session;
  csrfToken = session.csrfToken;
  return session;
}

/** The CSRF token, asked for first when this tab does not know it yet. */
export async function requireCsrfToken(): Promise<string> {
  return csrfToken ?? (await fetchSession()).csrfToken;
}

async function send(url: string, init: RequestInit): Promise<Response> {
  try {
    return await fetch(url, init);
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw new NetworkError();
  }
}

interface RequestParts {
  body?: unknown;
  ifMatch?: number;
  signal?: AbortSignal;
}

/** Sends a request and gives the JSON of its answer, undefined when it has none. Errors as `callApi`. */
export async function sendRequest(
  method: Endpoint['method'],
  url: string,
  { body, ifMatch, signal }: RequestParts = {},
): Promise<unknown> {
  const headers = new Headers({ Accept: 'application/json' });
  if (method !== 'get') headers.set('X-CSRF-Token', await requireCsrfToken());
  if (body !== undefined) headers.set('Content-Type', 'application/json');
  if (ifMatch !== undefined) headers.set('If-Match', `"${ifMatch}"`);
  const response = await send(url, {
    method: method.toUpperCase(),
    headers,
    credentials: 'same-origin',
    body: body === undefined ? null : JSON.stringify(body),
    signal: signal ?? null,
  });
  if (!response.ok) throw new ApiError(parseProblem(response.status, await response.text()));
  if (response.status === 204) return undefined;
  return response.json();
}

/**
 * Makes one call of the API and gives its answer, typed by the endpoint.
 * Throws ApiError when the server refuses and NetworkError when it cannot be reached.
 */
export async function callApi<T extends Endpoint>(
  endpoint: T,
  call: CallOf<T>,
): Promise<ResponseOf<T>> {
  const { body, ifMatch, signal } = call as RequestParts;
  return (await sendRequest(endpoint.method, buildApiUrl(endpoint, call), {
    body,
    ...(ifMatch === undefined ? {} : { ifMatch }),
    ...(signal ? { signal } : {}),
  })) as ResponseOf<T>;
}
