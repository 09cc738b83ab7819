import { beforeEach, describe, expect, it, vi } from 'vitest';
import { householdEndpoints } from '../../../server/contract/households.ts';
import { paperEndpoints } from '../../../server/contract/papers.ts';
import { sessionEndpoints } from '../../../server/contract/sessions.ts';
import {
  ApiError,
  buildApiUrl,
  callApi,
  NetworkError,
  setCsrfToken,
} from '../../../src/lib/api-client.ts';
import { buildHousehold, householdId, ownerSession } from '../support/people.ts';
import { problem, stubApi } from '../support/stub-api.ts';

const address = `/api/households/${householdId}`;

beforeEach(() => {
  setCsrfToken(null);
  vi.unstubAllGlobals();
});

describe('the way to the server', () => {
  it('fills the address and leaves out what was not asked', () => {
    expect(
      buildApiUrl(paperEndpoints.listPapers, {
        params: { id: householdId },
        query: { q: 'water & gas', page: 2, pile: '', box: undefined },
      }),
    ).toBe(`${address}/papers?q=water+%26+gas&page=2`);
  });

  it('asks for the token before the first change, and sends it with the version', async () => {
    const calls = stubApi({
      'GET /api/session': () => ({ body: ownerSession }),
      [`PATCH ${address}`]: () => ({ body: buildHousehold({ version: 5 }) }),
    });
    const saved = await callApi(householdEndpoints.updateHousehold, {
      params: { id: householdId },
      body: { name: 'Pennelow' },
      ifMatch: 4,
    });
    expect(saved.version).toBe(5);
    expect(calls.map((call) => call.method)).toEqual(['GET', 'PATCH']);
    expect(calls[1]?.headers.get('X-CSRF-Token')).toBe(ownerSession.csrfToken);
    expect(calls[1]?.headers.get('If-Match')).toBe('"4"');
  });

  it('turns problem details into an error with its fields', async () => {
    stubApi({
      [`GET ${address}`]: () =>
        problem(422, 'Look at the fields.', { fields: [{ field: 'name', message: 'Enter one.' }] }),
    });
    const error: unknown = await callApi(householdEndpoints.getHousehold, {
      params: { id: householdId },
    }).catch((caught: unknown) => caught);
    expect(error).toBeInstanceOf(ApiError);
    expect((error as ApiError).problem.fields).toEqual([{ field: 'name', message: 'Enter one.' }]);
    expect((error as ApiError).message).toBe('Look at the fields.');
  });

  it('speaks plainly when a proxy answers with a page instead', async () => {
    vi.stubGlobal('fetch', () => Promise.resolve(new Response('<h1>502</h1>', { status: 502 })));
    await expect(
      callApi(householdEndpoints.getHousehold, { params: { id: householdId } }),
    ).rejects.toThrow('Wait a moment and try again.');
  });

  it('says that the connection is gone', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('Failed to fetch')));
    await expect(
      callApi(householdEndpoints.getHousehold, { params: { id: householdId } }),
    ).rejects.toBeInstanceOf(NetworkError);
  });

  it('asks for the session at the address of the contract', async () => {
    const { method, path } = sessionEndpoints.getSession;
    stubApi({ [`${method.toUpperCase()} ${path}`]: () => ({ body: ownerSession }) });
    const { fetchSession } = await import('../../../src/lib/api-client.ts');
    expect((await fetchSession()).csrfToken).toBe(ownerSession.csrfToken);
  });
});
