import { queryOptions, useQuery } from '@tanstack/react-query';
import { sessionEndpoints } from '../../server/contract/sessions.ts';
import type { Session } from '../../server/contract/sessions.ts';
import { callApi, setCsrfToken } from './api-client.ts';

/** Who is signed in; also learns the CSRF token on the way. */
export const sessionQuery = queryOptions({
  queryKey: ['session'],
  queryFn: async ({ signal }): Promise<Session> => {
    const session = await callApi(sessionEndpoints.getSession, { signal });
    setCsrfToken(session.csrfToken);
    return session;
  },
  staleTime: 5 * 60_000,
});

/** The session, or undefined until it is known. */
export function useSession(): Session | undefined {
  return useQuery(sessionQuery).data;
}
