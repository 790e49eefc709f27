import { QueryClientProvider } from '@tanstack/react-query';
import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { RouterProvider } from 'react-router-dom';
import { NoticeProvider } from './components/Notices.tsx';
import { sessionQuery } from './features/session/api/session.ts';
import { onUnauthenticated } from './lib/apiClient.ts';
import { createQueryClient } from './lib/queryClient.ts';
import { applyTheme } from './lib/theme.ts';
import { createRouter } from './router.tsx';
import './styles/base.css';

applyTheme();

const queryClient = createQueryClient();
// A session that ended under an open page: the page gives way to sign-in, which leads back to it.
onUnauthenticated(() => queryClient.setQueryData(sessionQuery().queryKey, null));

const root = document.getElementById('root');
if (!root) throw new Error('index.html has no element with the id "root"');

createRoot(root).render(
  <StrictMode>
    <QueryClientProvider client={queryClient}>
      <NoticeProvider>
        <RouterProvider router={createRouter()} />
      </NoticeProvider>
    </QueryClientProvider>
  </StrictMode>,
);
