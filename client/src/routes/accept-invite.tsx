import { useQuery } from '@tanstack/react-query';
import type { JSX } from 'react';
import { useNavigate, useParams } from 'react-router-dom';

import { ErrorState } from '#client/components/error-state.tsx';
import { SkeletonLines } from '#client/components/skeleton.tsx';
import { invitationQuery } from '#client/features/auth/api/invitation.ts';
import { AcceptInvitation } from '#client/features/auth/components/accept-invitation.tsx';
import { AuthFrame } from '#client/features/auth/components/auth-frame.tsx';
import { hasCode } from '#client/lib/api-error.ts';
import { formatExact } from '#client/lib/relative-age.ts';
import { useSession } from '#client/lib/session.ts';

/** /accept-invite/:token */
export function Component(): JSX.Element {
  const { token = '' } = useParams();
  const { user } = useSession();
  const navigate = useNavigate();
  const { data: invitation, error, isPending, refetch } = useQuery(invitationQuery(token));

  if (isPending) {
    return (
      <AuthFrame title="Invitation" heading="Invitation">
        <SkeletonLines lines={4} />
      </AuthFrame>
    );
  }
  if (invitation === undefined) {
    return (
      <AuthFrame title="Invitation" heading="Invitation">
        <ErrorState
          error={error}
          title={
            hasCode(error, 'invitation.not_found')
              ? 'This invitation is not valid'
              : 'The invitation could not be read'
          }
          onRetry={hasCode(error, 'invitation.not_found') ? undefined : () => void refetch()}
        />
      </AuthFrame>
    );
  }
  return (
    <AuthFrame
      title={`Join ${invitation.workspaceName}`}
      heading={`Join ${invitation.workspaceName}`}
      lead={
        <>
          {invitation.invitedBy} invites you as {invitation.role}. The invitation holds until{' '}
          {formatExact(invitation.expiresAt)}.
        </>
      }
    >
      <AcceptInvitation
        token={token}
        invitation={invitation}
        user={user}
        onDone={() => void navigate(`/w/${invitation.workspaceSlug}`, { replace: true })}
      />
    </AuthFrame>
  );
}
