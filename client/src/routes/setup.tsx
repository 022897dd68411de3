import type { JSX } from 'react';
import { Navigate } from 'react-router-dom';

import { AuthFrame } from '#client/features/auth/components/auth-frame.tsx';
import { SetupForm } from '#client/features/auth/components/setup-form.tsx';
import { useSession } from '#client/lib/session.ts';

/** /setup: once, on a server that starts empty. */
export function Component(): JSX.Element {
  const session = useSession();
  if (!session.needsSetup) {
    return <Navigate to="/" replace />;
  }
  return (
    <AuthFrame
      title="Set up"
      heading="Set up Holdfast"
      lead="This server is empty. The first account owns it, and invites the others."
    >
      {/* The new session has no need of set-up, and the page then leads on by itself. */}
      <SetupForm />
    </AuthFrame>
  );
}
