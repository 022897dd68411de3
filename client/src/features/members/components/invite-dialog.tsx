import { zodResolver } from '@hookform/resolvers/zod';
import { useId, type JSX } from 'react';
import { Controller, useForm } from 'react-hook-form';

import { createInvitationRequest } from '#common/schemas/auth';
import { Button } from '#client/components/button.tsx';
import { CopyButton } from '#client/components/copy-button.tsx';
import { Dialog } from '#client/components/dialog.tsx';
import { InlineError } from '#client/components/error-state.tsx';
import { SelectField } from '#client/components/select-field.tsx';
import { TextField } from '#client/components/text-field.tsx';
import {
  useCreateInvitation,
  type CreatedInvitation,
  type CreateInvitation,
} from '#client/features/members/api/invitations.ts';
import { roleOptions } from '#client/features/members/role-words.ts';
import { showFormError } from '#client/lib/form-errors.ts';
import { formatExact } from '#client/lib/relative-age.ts';

interface InviteDialogProps {
  workspace: string;
  open: boolean;
  onClose: () => void;
}

/** The link, this once. */
function InvitationLink({
  invitation,
  onClose,
}: {
  invitation: CreatedInvitation;
  onClose: () => void;
}): JSX.Element {
  const link = `${window.location.origin}/accept-invite/${invitation.token}`;
  return (
    <div className="grid gap-4">
      <p>
        Send this link to <strong className="font-medium">{invitation.email}</strong>. It works
        once, until {formatExact(invitation.expiresAt)}, and{' '}
        <strong className="font-medium">is shown only now</strong>.
      </p>
      <TextField
        label="Invitation link"
        readOnly
        value={link}
        onFocus={(event) => event.target.select()}
      />
      <div className="flex justify-end gap-2">
        <Button onClick={onClose}>Done</Button>
        <CopyButton text={link} label="Copy the link" isNamed variant="primary" />
      </div>
    </div>
  );
}

function InviteForm({
  create,
  onClose,
}: {
  create: ReturnType<typeof useCreateInvitation>;
  onClose: () => void;
}): JSX.Element {
  const formId = useId();
  const form = useForm<CreateInvitation>({
    resolver: zodResolver(createInvitationRequest),
    defaultValues: { email: '', role: 'reader' },
  });
  const { errors } = form.formState;
  const send = (request: CreateInvitation): void =>
    create.mutate(request, {
      onError: (error) =>
        showFormError(error, form.setError, ['email', 'role'], { 'member.already': 'email' }),
    });
  return (
    <form
      id={formId}
      noValidate
      className="grid gap-4"
      onSubmit={(event) => void form.handleSubmit(send)(event)}
    >
      <InlineError error={errors.root?.server?.message} />
      <TextField
        label="E-mail"
        type="email"
        data-autofocus
        autoComplete="off"
        error={errors.email?.message}
        {...form.register('email')}
      />
      <Controller
        control={form.control}
        name="role"
        render={({ field }) => (
          <SelectField
            label="Role"
            options={roleOptions}
            value={field.value}
            onChange={field.onChange}
            error={errors.role?.message}
            hint={roleOptions.find((one) => one.value === field.value)?.hint}
          />
        )}
      />
      <div className="mt-2 flex justify-end gap-2">
        <Button onClick={onClose}>Cancel</Button>
        <Button type="submit" variant="primary" isBusy={create.isPending}>
          Make the link
        </Button>
      </div>
    </form>
  );
}

function InviteContent({ workspace, onClose }: Omit<InviteDialogProps, 'open'>): JSX.Element {
  const create = useCreateInvitation(workspace);
  return create.data === undefined ? (
    <InviteForm create={create} onClose={onClose} />
  ) : (
    <InvitationLink invitation={create.data} onClose={onClose} />
  );
}

/** Invites someone: address and role, then the single-use link. */
export function InviteDialog({ workspace, open, onClose }: InviteDialogProps): JSX.Element {
  return (
    <Dialog open={open} onClose={onClose} title="Invite someone">
      <InviteContent workspace={workspace} onClose={onClose} />
    </Dialog>
  );
}
