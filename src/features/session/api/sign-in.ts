import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { sessionEndpoints } from '../../../../server/contract/sessions.ts';
import type { signInSchema } from '../../../../server/contract/sessions.ts';
import { callApi, setCsrfToken } from '../../../lib/api-client.ts';
import { sessionQuery } from '../../../lib/session.ts';

/** Signs in. What the tab knew of somebody else is forgotten first. */
export function useSignIn() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (body: z.infer<typeof signInSchema>) => callApi(sessionEndpoints.signIn, { body }),
    onSuccess: (session) => {
      setCsrfToken(session.csrfToken);
      queryClient.clear();
      queryClient.setQueryData(sessionQuery.queryKey, session);
    },
  });
}
