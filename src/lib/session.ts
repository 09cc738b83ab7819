import { queryOptions, useQuery } from '@tanstack/react-query';
import type { Session } from '../../server/contract/sessions.ts';
import { fetchSession } from './api-client.ts';

/** Who is signed in; also learns the CSRF token on the way. */
export const sessionQuery = queryOptions({
  queryKey: ['session'],
  queryFn: ({ signal }) => fetchSession(signal),
  staleTime: 5 * 60_000,
});

/** The session, or undefined until it is known. */
export function useSession(): Session | undefined {
  return useQuery(sessionQuery).data;
}
