import { QueryClientProvider } from '@tanstack/react-query';
import { useState } from 'react';
import { RouterProvider } from 'react-router-dom';
import { createQueryClient } from '../api/query-client';
import { ToastProvider } from '../components/toast';
import { createRouter } from './router';

/** The whole client: data, messages, pages. */
export function App() {
  const [queryClient] = useState(createQueryClient);
  const [router] = useState(() => createRouter(queryClient));
  return (
    <QueryClientProvider client={queryClient}>
      <ToastProvider>
        <RouterProvider router={router} />
      </ToastProvider>
    </QueryClientProvider>
  );
}
