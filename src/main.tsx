import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { RouterProvider } from 'react-router-dom';
import { Providers } from './app/providers.tsx';
import { createRouter } from './app/router.tsx';
import { startTheme } from './app/theme.ts';
import { createQueryClient } from './lib/query-client.ts';
import './styles.css';

startTheme();
const queryClient = createQueryClient();
const router = createRouter(queryClient);
const root = document.getElementById('root');
if (root === null) throw new Error('index.html has no #root');

createRoot(root).render(
  <StrictMode>
    <Providers queryClient={queryClient}>
      <RouterProvider router={router} />
    </Providers>
  </StrictMode>,
);
