import { Suspense, useEffect, useRef, type JSX } from 'react';
import { Outlet, ScrollRestoration, useLocation, useNavigation } from 'react-router-dom';

import { OfflineBanner } from '#client/app/offline-banner.tsx';
import { Splash } from '#client/app/splash.tsx';

/** Moves the reading position to the new page, as a full page load would. */
function useFocusOnNewPage(): void {
  const { pathname } = useLocation();
  const previous = useRef(pathname);
  useEffect(() => {
    if (previous.current !== pathname) {
      previous.current = pathname;
      document.getElementById('main')?.focus({ preventScroll: true });
    }
  }, [pathname]);
}

function NavigationBar(): JSX.Element | null {
  const isLoading = useNavigation().state === 'loading';
  return isLoading ? (
    <div
      role="progressbar"
      aria-label="Opening the page"
      className="animate-sheen fixed inset-x-0 top-0 z-50 h-0.5 bg-ink"
    />
  ) : null;
}

/** What is around every page, signed in or not. */
export function RootLayout(): JSX.Element {
  useFocusOnNewPage();
  return (
    <>
      <a
        href="#main"
        className="sr-only z-50 rounded-control bg-ink px-3 py-2 text-paper focus:not-sr-only focus:fixed focus:top-2 focus:left-2"
      >
        Skip to the page
      </a>
      <NavigationBar />
      <OfflineBanner />
      <Suspense fallback={<Splash />}>
        <Outlet />
      </Suspense>
      <ScrollRestoration />
    </>
  );
}
