import '@fontsource/noto-sans/latin-400.css';
import '@fontsource/noto-sans/latin-600.css';
import '@fontsource/noto-sans/latin-ext-400.css';
import '@fontsource/noto-sans/latin-ext-600.css';
import './app/index.css';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { Providers } from './app/providers.tsx';
import { createAppRouter } from './app/router.tsx';
import { createQueryClient } from './lib/query-client.ts';

const root = document.getElementById('root');
if (!root) throw new Error('The page has no element "root" to show the application in.');

const queryClient = createQueryClient();
createRoot(root).render(
  <StrictMode>
    <Providers queryClient={queryClient} router={createAppRouter(queryClient)} />
  </StrictMode>,
);
