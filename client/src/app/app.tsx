import { QueryClientProvider } from '@tanstack/react-query';
import { useState, type JSX } from 'react';
import { RouterProvider } from 'react-router-dom';

import { createRouter } from '#client/app/router.tsx';
import { ToastProvider } from '#client/components/toast.tsx';
import { createQueryClient } from '#client/lib/query-client.ts';

/** The whole product: store of answers, messages, pages. */
export function App(): JSX.Element {
  const [queryClient] = useState(createQueryClient);
  const [router] = useState(createRouter);
  return (
    <QueryClientProvider client={queryClient}>
      <ToastProvider>
        <RouterProvider router={router} />
      </ToastProvider>
    </QueryClientProvider>
  );
}
