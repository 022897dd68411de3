import { createBrowserRouter, type RouteObject } from 'react-router-dom';

import { Home } from '#client/app/home.tsx';
import { lazyPage } from '#client/app/lazy-page.ts';
import { RootLayout } from '#client/app/root-layout.tsx';
import { RootError, RouteError } from '#client/app/route-error.tsx';
import { SignedInLayout } from '#client/app/signed-in-layout.tsx';
import { Splash } from '#client/app/splash.tsx';
import { WorkspaceLayout } from '#client/app/workspace-layout.tsx';

/** Pages of a workspace; each is fetched when it is first opened and has its own error boundary. */
const workspacePages: RouteObject[] = [
  { index: true, lazy: lazyPage(() => import('#client/routes/shelf.tsx')) },
  { path: 'new', lazy: lazyPage(() => import('#client/routes/new-lattice.tsx')) },
  { path: 'lattices/:lattice', lazy: lazyPage(() => import('#client/routes/lattice.tsx')) },
  { path: 'lattices/:lattice/report', lazy: lazyPage(() => import('#client/routes/report.tsx')) },
  { path: 'members', lazy: lazyPage(() => import('#client/routes/members.tsx')) },
  { path: 'data', lazy: lazyPage(() => import('#client/routes/data-values.tsx')) },
  { path: 'settings', lazy: lazyPage(() => import('#client/routes/settings.tsx')) },
  { path: 'audit', lazy: lazyPage(() => import('#client/routes/audit.tsx')) },
];

const publicPages: RouteObject[] = [
  { path: 'sign-in', lazy: lazyPage(() => import('#client/routes/sign-in.tsx')) },
  { path: 'setup', lazy: lazyPage(() => import('#client/routes/setup.tsx')) },
  {
    path: 'accept-invite/:token',
    lazy: lazyPage(() => import('#client/routes/accept-invite.tsx')),
  },
  { path: 'methods', lazy: lazyPage(() => import('#client/routes/methods.tsx')) },
  { path: 's/:token', lazy: lazyPage(() => import('#client/routes/shared-revision.tsx')) },
];

const guarded = (pages: RouteObject[], ErrorBoundary = RouteError): RouteObject[] =>
  pages.map((page) => ({ ...page, ErrorBoundary }));

/** Every address of the product. */
export const routes: RouteObject[] = [
  {
    Component: RootLayout,
    ErrorBoundary: RootError,
    HydrateFallback: Splash,
    children: [
      ...guarded(publicPages, RootError),
      {
        Component: SignedInLayout,
        ErrorBoundary: RootError,
        children: [
          { index: true, Component: Home },
          ...guarded([{ path: 'me', lazy: lazyPage(() => import('#client/routes/me.tsx')) }]),
          { path: 'w/:workspace', Component: WorkspaceLayout, children: guarded(workspacePages) },
        ],
      },
      ...guarded(
        [{ path: '*', lazy: lazyPage(() => import('#client/routes/not-found.tsx')) }],
        RootError,
      ),
    ],
  },
];

/** The router of the browser's address bar. */
export function createRouter(): ReturnType<typeof createBrowserRouter> {
  return createBrowserRouter(routes);
}
