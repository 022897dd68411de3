import { useState, type JSX } from 'react';
import { useNavigate } from 'react-router-dom';
import { useQueryClient } from '@tanstack/react-query';

import type { Role } from '#common/schemas/auth';
import type { Member } from '#common/schemas/workspace';
import { Button } from '#client/components/button.tsx';
import { ConfirmDialog } from '#client/components/confirm-dialog.tsx';
import { PersonBadge } from '#client/components/person-badge.tsx';
import { RelativeTime } from '#client/components/relative-time.tsx';
import { SelectField } from '#client/components/select-field.tsx';
import { useToast } from '#client/components/toast.tsx';
import { useChangeRole, useRemoveMember } from '#client/features/members/api/members.ts';
import { roleOptions, roleWord } from '#client/features/members/role-words.ts';
import { messageOf } from '#client/lib/api-error.ts';
import { sessionQuery, useCan, useCurrentUser } from '#client/lib/session.ts';

interface MemberProps {
  member: Member;
  workspace: string;
  workspaceName: string;
}

function RoleCell({ member, workspace }: Omit<MemberProps, 'workspaceName'>): JSX.Element {
  const can = useCan();
  const show = useToast();
  const changeRole = useChangeRole(workspace);
  if (!can('member.change_role')) {
    return <>{roleWord(member.role)}</>;
  }
  const change = (role: Role): void => {
    if (role !== member.role) {
      changeRole.mutate(
        { userId: member.userId, role },
        {
          onSuccess: () => show({ message: `${member.name} is ${role} now` }),
          onError: (error) => show({ message: messageOf(error), tone: 'failure' }),
        },
      );
    }
  };
  return (
    <SelectField
      label={`Role of ${member.name}`}
      isLabelHidden
      options={roleOptions}
      value={changeRole.isPending ? changeRole.variables.role : member.role}
      onChange={change}
      disabled={changeRole.isPending}
      className="w-48"
    />
  );
}

function RemoveCell({ member, workspace, workspaceName }: MemberProps): JSX.Element | null {
  const can = useCan();
  const me = useCurrentUser();
  const client = useQueryClient();
  const navigate = useNavigate();
  const show = useToast();
  const remove = useRemoveMember(workspace);
  const [isAsking, setAsking] = useState(false);
  const isMe = member.userId === me.id;
  if (!can(isMe ? 'workspace.leave' : 'member.remove')) {
    return null;
  }
  const confirm = (): void =>
    remove.mutate(
      { userId: member.userId },
      {
        onSuccess: () => {
          setAsking(false);
          if (isMe) {
            void client
              .invalidateQueries({ queryKey: sessionQuery.queryKey })
              .then(() => navigate('/'));
          }
          show({ message: isMe ? `You left ${workspaceName}` : `${member.name} is removed` });
        },
      },
    );
  return (
    <>
      <Button
        variant="quiet"
        size="small"
        aria-label={isMe ? undefined : `Remove ${member.name}`}
        onClick={() => setAsking(true)}
      >
        {isMe ? 'Leave' : 'Remove'}
      </Button>
      <ConfirmDialog
        open={isAsking}
        onClose={() => setAsking(false)}
        title={isMe ? `Leave ${workspaceName}?` : `Remove ${member.name}?`}
        confirmLabel={isMe ? 'Leave' : 'Remove'}
        onConfirm={confirm}
        isBusy={remove.isPending}
        error={remove.error}
      >
        {isMe
          ? 'You no longer see its lattices. What you made stays there, with your name.'
          : 'They no longer see this workspace. What they made stays here, with their name.'}
      </ConfirmDialog>
    </>
  );
}

/** One member: who, role, since when, out. */
export function MemberRow(props: MemberProps): JSX.Element {
  const { member } = props;
  const me = useCurrentUser();
  return (
    <li className="grid grid-cols-[minmax(0,1fr)_auto] items-center gap-x-5 gap-y-2 py-3 md:grid-cols-[minmax(0,1fr)_9.5rem_12rem_5rem]">
      <div className="max-md:col-span-2">
        <div className="flex items-center gap-3">
          <PersonBadge name={member.name} initials={member.initials} isDecorative />
          <span className="min-w-0">
            <span className="block font-medium">
              {member.name}
              {member.userId === me.id && <span className="font-normal text-soft"> (you)</span>}
            </span>
            <span className="block text-small text-soft">{member.email}</span>
          </span>
        </div>
      </div>
      <span className="text-small text-soft max-md:hidden">
        joined <RelativeTime at={member.joinedAt} />
      </span>
      <RoleCell {...props} />
      <span className="text-right">
        <RemoveCell {...props} />
      </span>
    </li>
  );
}
