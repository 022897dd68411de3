import { QueryClientProvider } from '@tanstack/react-query';
import { render } from '@testing-library/react';
import userEvent, { type UserEvent } from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';

import { routes } from '#client/app/router.tsx';
import { ToastProvider } from '#client/components/toast.tsx';
import { createQueryClient } from '#client/lib/query-client.ts';

interface RenderedApp {
  user: UserEvent;
  /** Path and query the address bar would show. */
  address: () => string;
}

/** Renders the whole product at an address, with its real routes and store. */
export function renderAt(path: string): RenderedApp {
  const router = createMemoryRouter(routes, { initialEntries: [path] });
  const client = createQueryClient();
  client.setDefaultOptions({ queries: { retry: false } });
  render(
    <QueryClientProvider client={client}>
      <ToastProvider>
        <RouterProvider router={router} />
      </ToastProvider>
    </QueryClientProvider>,
  );
  return {
    user: userEvent.setup(),
    address: () => `${router.state.location.pathname}${router.state.location.search}`,
  };
}
