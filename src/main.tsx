// Starts the page.
import { QueryClientProvider } from '@tanstack/react-query';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { RouterProvider } from 'react-router-dom';
import { createQueryClient } from './http/query-client';
import { createRouter } from './router';
import './styles/index.css';
import { followSystemTheme } from './ui/theme';

followSystemTheme();

const root = document.getElementById('root');
if (!root) throw new Error('index.html has no #root');

const queryClient = createQueryClient();
const router = createRouter();

createRoot(root).render(
  <StrictMode>
    <QueryClientProvider client={queryClient}>
      <RouterProvider router={router} />
    </QueryClientProvider>
  </StrictMode>,
);
