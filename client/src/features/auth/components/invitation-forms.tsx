import { zodResolver } from '@hookform/resolvers/zod';
import type { JSX } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';

import {
  acceptInvitationRequest,
  passwordLimits,
  type InvitationPreview,
} from '#common/schemas/auth';
import { Button } from '#client/components/button.tsx';
import { InlineError } from '#client/components/error-state.tsx';
import { TextField } from '#client/components/text-field.tsx';
import { useAcceptInvitation } from '#client/features/auth/api/invitation.ts';
import { showFormError } from '#client/lib/form-errors.ts';

interface InvitationFormProps {
  token: string;
  invitation: InvitationPreview;
  onDone: () => void;
}

/** For a new account, both are needed; the contract leaves them out for people signed in. */
const newAccount = z.object({
  name: acceptInvitationRequest.shape.name.unwrap(),
  password: acceptInvitationRequest.shape.password.unwrap(),
});
type NewAccount = z.infer<typeof newAccount>;

/** Someone without an account: name and password, the address is the invited one. */
export function NewAccountForm({ token, invitation, onDone }: InvitationFormProps): JSX.Element {
  const accept = useAcceptInvitation(token);
  const form = useForm<NewAccount>({
    resolver: zodResolver(newAccount),
    defaultValues: { name: '', password: '' },
  });
  const { errors } = form.formState;
  const send = (request: NewAccount): void =>
    accept.mutate(request, {
      onSuccess: onDone,
      onError: (error) =>
        showFormError(error, form.setError, ['name', 'password'], {
          'auth.weak_password': 'password',
        }),
    });

  return (
    <form
      noValidate
      className="grid gap-4"
      onSubmit={(event) => void form.handleSubmit(send)(event)}
    >
      <InlineError error={errors.root?.server?.message} />
      <TextField
        label="E-mail"
        type="email"
        autoComplete="username"
        value={invitation.email}
        readOnly
      />
      <TextField
        label="Your name"
        autoComplete="name"
        autoFocus
        error={errors.name?.message}
        {...form.register('name')}
      />
      <TextField
        label="Choose a password"
        type="password"
        autoComplete="new-password"
        hint={`At least ${passwordLimits.minLength} characters.`}
        error={errors.password?.message}
        {...form.register('password')}
      />
      <Button type="submit" variant="primary" size="large" isBusy={accept.isPending}>
        Join {invitation.workspaceName}
      </Button>
    </form>
  );
}

/** Someone signed in with the invited address: one click. */
export function JoinButton({ token, invitation, onDone }: InvitationFormProps): JSX.Element {
  const accept = useAcceptInvitation(token);
  return (
    <div className="grid gap-4">
      <InlineError error={accept.error} />
      <Button
        variant="primary"
        size="large"
        isBusy={accept.isPending}
        onClick={() => accept.mutate({}, { onSuccess: onDone })}
      >
        Join {invitation.workspaceName}
      </Button>
    </div>
  );
}
