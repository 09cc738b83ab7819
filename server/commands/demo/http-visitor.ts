/** Speaks to the application through its own door, as a browser would. */
import type { z } from 'zod';
import type { BodyInputOf, Endpoint, ResponseOf } from '../../contract/endpoint.ts';
import type { sessionSchema } from '../../contract/sessions.ts';

export interface HttpVisitor {
  /** Calls an endpoint of the contract; throws an Error with the answer's text when it is refused. */
  call<T extends Endpoint>(
    endpoint: T,
    options?: {
      params?: Record<string, string>;
      query?: Record<string, string>;
      body?: BodyInputOf<T>;
      version?: number;
    },
  ): Promise<ResponseOf<T>>;
  /** Sends files to a box; answers the ids of their scans in the same order. */
  upload(
    boxId: string,
    files: { name: string; bytes: Uint8Array<ArrayBuffer> }[],
  ): Promise<string[]>;
}

/** Signs in at `address` and keeps the session. */
export async function signInOverHttp(
  address: string,
  credentials: { email: string; password: string },
): Promise<HttpVisitor> {
  let cookie = '';
  let csrfToken = '';
  const send = async (path: string, init: RequestInit = {}) => {
    const response = await fetch(`${address}${path}`, {
      ...init,
      headers: { ...init.headers, cookie, 'x-csrf-token': csrfToken },
    });
    const set = response.headers.getSetCookie()[0];
    if (set) cookie = set.split(';')[0] ?? '';
    if (!response.ok) throw new Error(`${init.method ?? 'GET'} ${path}: ${await response.text()}`);
    return response;
  };
  type Session = z.infer<typeof sessionSchema>;
  csrfToken = ((await (await send('/api/session')).json()) as Session).csrfToken;
  const signedIn = await send('/api/session', {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(credentials),
  });
  csrfToken = ((await signedIn.json()) as Session).csrfToken;

  return {
    async call(endpoint, { params = {}, query = {}, body, version } = {}) {
      const path = endpoint.path.replace(/:(\w+)/g, (_, name: string) => params[name] ?? '');
      const search = new URLSearchParams(query).toString();
      const response = await send(search ? `${path}?${search}` : path, {
        method: endpoint.method.toUpperCase(),
        headers: {
          ...(body === undefined ? {} : { 'content-type': 'application/json' }),
          ...(version === undefined ? {} : { 'if-match': `"${version}"` }),
        },
        ...(body === undefined ? {} : { body: JSON.stringify(body) }),
      });
      return (endpoint.response ? await response.json() : undefined) as never;
    },
    async upload(boxId, files) {
      const form = new FormData();
      for (const file of files) form.append('files', new Blob([file.bytes]), file.name);
      const response = await send(`/api/boxes/${boxId}/scans`, { method: 'POST', body: form });
      const { items } = (await response.json()) as { items: { scan: { id: string } | null }[] };
      return items.map((item) => item.scan?.id ?? '');
    },
  };
}
