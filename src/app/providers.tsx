import { QueryClientProvider } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import { RouterProvider } from 'react-router-dom';
import type { createAppRouter } from './router.tsx';

interface ProvidersProps {
  queryClient: QueryClient;
  router: ReturnType<typeof createAppRouter>;
}

/** What every screen stands on. */
export function Providers({ queryClient, router }: ProvidersProps) {
  return (
    <QueryClientProvider client={queryClient}>
      <RouterProvider router={router} />
    </QueryClientProvider>
  );
}
