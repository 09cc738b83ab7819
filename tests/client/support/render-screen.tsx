import type { ReactElement } from 'react';
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import type { Session } from '../../../server/contract/sessions.ts';
import { setCsrfToken } from '../../../src/lib/api-client.ts';
import { sessionQuery } from '../../../src/lib/session.ts';
import { ownerSession } from './people.ts';

/** Shows an element with what every screen stands on: router, store, somebody signed in. */
export function renderScreen(element: ReactElement, session: Session = ownerSession) {
  const queryClient = new QueryClient({
    defaultOptions: { queries: { retry: false, staleTime: Infinity }, mutations: { retry: false } },
  });
  queryClient.setQueryData(sessionQuery.queryKey, session);
  setCsrfToken(session.csrfToken);
  const router = createMemoryRouter([{ path: '*', element }]);
  const view = render(
    <QueryClientProvider client={queryClient}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
  return { ...view, queryClient, router, user: userEvent.setup() };
}
