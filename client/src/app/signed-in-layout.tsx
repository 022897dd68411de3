import { Suspense, useState, type JSX } from 'react';
import { Navigate, Outlet, useLocation } from 'react-router-dom';

import { TopBar } from '#client/app/top-bar.tsx';
import { SkeletonLines } from '#client/components/skeleton.tsx';
import { signInAddress } from '#client/lib/return-address.ts';
import { useSession } from '#client/lib/session.ts';

/** Pages for people who are signed in; others are led to the sign-in page and back. */
export function SignedInLayout(): JSX.Element {
  const session = useSession();
  const location = useLocation();
  // Kept from the first draw: tells someone whose session ended from someone who never had one.
  const [wasSignedIn] = useState(session.user !== null);

  if (session.user === null) {
    if (session.needsSetup) {
      return <Navigate to="/setup" replace />;
    }
    const here = `${location.pathname}${location.search}${location.hash}`;
    const reason = wasSignedIn ? 'expired' : undefined;
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
