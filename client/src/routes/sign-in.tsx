import type { JSX } from 'react';
import { Navigate, useSearchParams } from 'react-router-dom';

import { AuthFrame } from '#client/features/auth/components/auth-frame.tsx';
import { SignInForm } from '#client/features/auth/components/sign-in-form.tsx';
import { readReturnAddress } from '#client/lib/return-address.ts';
import { useSession } from '#client/lib/session.ts';

/** /sign-in */
export function Component(): JSX.Element {
  const session = useSession();
  const [search] = useSearchParams();
  if (session.needsSetup) {
    return <Navigate to="/setup" replace />;
  }
  if (session.user !== null) {
    return <Navigate to={readReturnAddress(search)} replace />;
  }
  return (
    <AuthFrame
      title="Sign in"
      heading="Sign in"
      lead={
        search.get('reason') === 'expired'
          ? 'Your session ended. Sign in, and you are back where you were.'
          : undefined
      }
    >
      <SignInForm demo={session.demo} />
    </AuthFrame>
  );
}
