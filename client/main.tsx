import { QueryClientProvider } from '@tanstack/react-query';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { RouterProvider } from 'react-router/dom';
import { config } from 'zod';
import { createQueryClient } from './app/query-client.ts';
import { followSystemTheme } from './app/theme.ts';
import { createRouter } from './router.tsx';
import './styles.css';

// The content security policy forbids code made from text, which the schemas would try for speed.
config({ jitless: true });
followSystemTheme();

const root = document.getElementById('root');
if (!root) throw new Error('index.html has no element with the id "root".');

const queryClient = createQueryClient();
createRoot(root).render(
  <StrictMode>
    <QueryClientProvider client={queryClient}>
      <RouterProvider router={createRouter(queryClient)} />
    </QueryClientProvider>
  </StrictMode>,
);
