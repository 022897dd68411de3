import type { JSX } from 'react';

import type { CurrentUser, InvitationPreview } from '#common/schemas/auth';
import { ButtonLink } from '#client/components/button.tsx';
import { JoinButton, NewAccountForm } from '#client/features/auth/components/invitation-forms.tsx';
import { signInAddress } from '#client/lib/return-address.ts';

interface AcceptInvitationProps {
  token: string;
  invitation: InvitationPreview;
  user: CurrentUser | null;
  onDone: () => void;
}

/** What the invited person has to do: join, sign in first, or make an account. */
export function AcceptInvitation({
  token,
  invitation,
  user,
  onDone,
}: AcceptInvitationProps): JSX.Element {
  if (user !== null && user.email !== invitation.email) {
    return (
      <div className="grid gap-4">
        <p>
          The invitation is for <strong className="font-medium">{invitation.email}</strong>, and you
          are signed in as <strong className="font-medium">{user.email}</strong>. Sign out and open
          the link again, or ask for an invitation to your own address.
        </p>
        <ButtonLink to="/">Back to my workspaces</ButtonLink>
      </div>
    );
  }
  if (user !== null) {
    return <JoinButton {...{ token, invitation, onDone }} />;
  }
  if (invitation.hasAccount) {
    return (
      <div className="grid gap-4">
        <p>There is an account for {invitation.email} already. Sign in with it, then join.</p>
        <ButtonLink to={signInAddress(`/accept-invite/${token}`)} variant="primary" size="large">
          Sign in
        </ButtonLink>
      </div>
    );
  }
  return <NewAccountForm {...{ token, invitation, onDone }} />;
}
