import { useQuery } from '@tanstack/react-query';
import type { JSX } from 'react';

import type { InvitationSummary } from '#common/schemas/auth';
import { Button } from '#client/components/button.tsx';
import { ErrorState } from '#client/components/error-state.tsx';
import { RelativeTime } from '#client/components/relative-time.tsx';
import { SkeletonLines } from '#client/components/skeleton.tsx';
import { useToast } from '#client/components/toast.tsx';
import {
  invitationsQuery,
  useWithdrawInvitation,
} from '#client/features/members/api/invitations.ts';
import { messageOf } from '#client/lib/api-error.ts';

function Invitation({
  invitation,
  workspace,
}: {
  invitation: InvitationSummary;
  workspace: string;
}): JSX.Element {
  const withdraw = useWithdrawInvitation(workspace);
  const show = useToast();
  return (
    <li className="flex items-center gap-5 py-3">
      <span className="min-w-0 grow">
        <span className="block font-medium">{invitation.email}</span>
        <span className="block text-small text-soft">
          as {invitation.role}, by {invitation.invitedBy}, ends{' '}
          <RelativeTime at={invitation.expiresAt} />
        </span>
      </span>
      <Button
        variant="quiet"
        size="small"
        aria-label={`Withdraw the invitation of ${invitation.email}`}
        isBusy={withdraw.isPending}
        onClick={() =>
          withdraw.mutate(
            { id: invitation.id },
            {
              onSuccess: () => show({ message: 'The invitation is withdrawn' }),
              onError: (error) => show({ message: messageOf(error), tone: 'failure' }),
            },
          )
        }
      >
        Withdraw
      </Button>
    </li>
  );
}

/** Invitations that wait for their people. */
export function PendingInvitations({ workspace }: { workspace: string }): JSX.Element {
  const { data, error, isPending, refetch } = useQuery(invitationsQuery(workspace));
  return (
    <section aria-labelledby="pending-invitations" className="mt-10">
      <h2 id="pending-invitations" className="text-lead">
        Invitations
      </h2>
      {isPending && <SkeletonLines lines={2} label="Loading the invitations" />}
      {error !== null && data === undefined && (
        <ErrorState error={error} onRetry={() => void refetch()} />
      )}
      {data?.items.length === 0 && <p className="mt-2 text-soft">None is waiting.</p>}
      {data !== undefined && data.items.length > 0 && (
        <ul className="rule-list mt-2 border-y border-line">
          {data.items.map((invitation) => (
            <Invitation key={invitation.id} invitation={invitation} workspace={workspace} />
          ))}
        </ul>
      )}
    </section>
  );
}
