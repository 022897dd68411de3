import { Suspense, useRef, type JSX } from 'react';
import { Navigate, Outlet, useLocation } from 'react-router-dom';

import { TopBar } from '#client/app/top-bar.tsx';
import { SkeletonLines } from '#client/components/skeleton.tsx';
import { signInAddress } from '#client/lib/return-address.ts';
import { useSession } from '#client/lib/session.ts';

/** Pages for people who are signed in; others are led to the sign-in page and back. */
export function SignedInLayout(): JSX.Element {
  const session = useSession();
  const location = useLocation();
  const wasSignedIn = useRef(session.user !== null);

  if (session.user === null) {
    if (session.needsSetup) {
      return <Navigate to="/setup" replace />;
    }
    const here = `${location.pathname}${location.search}${location.hash}`;
    // eslint-disable-next-line react-hooks/refs -- only tells the two ways here apart, never drawn
    const reason = wasSignedIn.current ? 'expired' : undefined;
    return <Navigate to={signInAddress(here, reason)} replace />;
  }
  return (
    <div className="flex min-h-dvh flex-col">
      <TopBar />
      <main id="main" tabIndex={-1} className="flex grow flex-col">
        <Suspense fallback={<SkeletonLines lines={6} />}>
          <Outlet />
        </Suspense>
      </main>
    </div>
  );
}
