import { render, screen } from '@testing-library/react';
import { createMemoryRouter, RouterProvider } from 'react-router-dom';
import { describe, expect, it } from 'vitest';

import { lazyPage } from '#client/app/lazy-page.ts';
import { RouteError } from '#client/app/route-error.tsx';

function open(load: Parameters<typeof lazyPage>[0]): void {
  const page = { index: true, lazy: lazyPage(load), ErrorBoundary: RouteError };
  const router = createMemoryRouter([
    { HydrateFallback: () => null, ErrorBoundary: RouteError, children: [page] },
  ]);
  render(<RouterProvider router={router} />);
}

describe('a page whose code comes later', () => {
  it('is drawn when it is there', async () => {
    open(() => Promise.resolve({ Component: () => <p>the page</p> }));
    expect(await screen.findByText('the page')).toBeInTheDocument();
  });

  it('says that it could not be fetched, and offers to load it again', async () => {
    open(() => Promise.reject(new TypeError('Failed to fetch dynamically imported module: /x.js')));
    expect(await screen.findByText(/This page could not be fetched/)).toBeInTheDocument();
    expect(screen.getByRole('button', { name: 'Try again' })).toBeInTheDocument();
  });

  it('shows a page that broke while loading as one that stopped working', async () => {
    open(() => Promise.reject(new RangeError('no')));
    expect(await screen.findByText('This page stopped working')).toBeInTheDocument();
  });
});
