import { useMutation, useQueryClient } from '@tanstack/react-query';
import { sessionEndpoints } from '../../../../server/contract/sessions.ts';
import { callApi, setCsrfToken } from '../../../lib/api-client.ts';

/** Signs out; nothing of what was seen stays in the tab. */
export function useSignOut() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: () => callApi(sessionEndpoints.signOut, {}),
    onSuccess: () => {
      setCsrfToken(null);
      sessionStorage.clear();
      queryClient.clear();
    },
  });
}
