import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyInputOf } from '../../../../server/contract/endpoint.ts';
import type { Session, sessionEndpoints } from '../../../../server/contract/sessions.ts';
import { sendRequest, setCsrfToken } from '../../../lib/api-client.ts';
import { sessionQuery } from '../../../lib/session.ts';

type Credentials = BodyInputOf<typeof sessionEndpoints.signIn>;

/** Signs in. What the tab knew of somebody else is forgotten first. */
export function useSignIn() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: async (body: Credentials) =>
      (await sendRequest('post', '/api/session', { body })) as Session,
    onSuccess: (session) => {
      setCsrfToken(session.csrfToken);
      queryClient.clear();
      queryClient.setQueryData(sessionQuery.queryKey, session);
    },
  });
}
