import { useQuery } from '@tanstack/react-query';
import { UserPlus } from 'lucide-react';
import { useState, type JSX } from 'react';

import type { MembershipSummary } from '#common/schemas/auth';
import { Button } from '#client/components/button.tsx';
import { ErrorState } from '#client/components/error-state.tsx';
import { PageHeader } from '#client/components/page.tsx';
import { SkeletonLines } from '#client/components/skeleton.tsx';
import { membersQuery } from '#client/features/members/api/members.ts';
import { InviteDialog } from '#client/features/members/components/invite-dialog.tsx';
import { MemberRow } from '#client/features/members/components/member-row.tsx';
import { PendingInvitations } from '#client/features/members/components/pending-invitations.tsx';
import { useCan } from '#client/lib/session.ts';

function MemberList({ workspace }: { workspace: MembershipSummary }): JSX.Element {
  const { data, error, isPending, refetch } = useQuery(membersQuery(workspace.workspaceSlug));
  if (isPending) {
    return <SkeletonLines lines={5} label="Loading the members" />;
  }
  if (data === undefined) {
    return <ErrorState error={error} onRetry={() => void refetch()} />;
  }
  return (
    <ul className="rule-list mt-5 border-y border-line">
      {data.items.map((member) => (
        <MemberRow
          key={member.userId}
          member={member}
          workspace={workspace.workspaceSlug}
          workspaceName={workspace.workspaceName}
        />
      ))}
    </ul>
  );
}

/** Who belongs to the workspace, in which role, and who is invited. */
export function Members({ workspace }: { workspace: MembershipSummary }): JSX.Element {
  const can = useCan();
  const [isInviting, setInviting] = useState(false);
  return (
    <>
      <PageHeader
        title="Members"
        actions={
          can('invitation.create') && (
            <Button variant="primary" onClick={() => setInviting(true)}>
              <UserPlus aria-hidden className="size-4" />
              Invite
            </Button>
          )
        }
      />
      <MemberList workspace={workspace} />
      {can('invitation.list') && <PendingInvitations workspace={workspace.workspaceSlug} />}
      <InviteDialog
        workspace={workspace.workspaceSlug}
        open={isInviting}
        onClose={() => setInviting(false)}
      />
    </>
  );
}
