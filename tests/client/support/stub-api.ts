import { vi } from 'vitest';

export interface SentCall {
  method: string;
  url: string;
  body: unknown;
  headers: Headers;
}
export interface Answer {
  status?: number;
  body?: unknown;
}
type Handler = (call: SentCall) => Answer | Promise<Answer>;

/**
 * Answers `fetch` by "GET /api/…" lines; a call that is not on the list fails the test by name. Gives the
 * calls that were made.
 */
export function stubApi(handlers: Record<string, Handler>): SentCall[] {
  const calls: SentCall[] = [];
  vi.stubGlobal('fetch', async (url: string, init: RequestInit = {}) => {
    const method = init.method ?? 'GET';
    const call: SentCall = {
      method,
      url,
      body: typeof init.body === 'string' ? (JSON.parse(init.body) as unknown) : undefined,
      headers: new Headers(init.headers),
    };
    calls.push(call);
    const path = url.split('?')[0] ?? url;
    const handler = handlers[`${method} ${path}`];
    if (!handler) throw new Error(`Nobody answers ${method} ${path} in this test.`);
    const { status = 200, body } = await handler(call);
    return new Response(status === 204 ? null : JSON.stringify(body), {
      status,
      headers: { 'Content-Type': 'application/json' },
    });
  });
  return calls;
}

/** Problem details as the server sends them. */
export function problem(status: number, detail: string, more: object = {}): Answer {
  return { status, body: { type: 'about:blank', title: 'Refused', status, detail, ...more } };
}
