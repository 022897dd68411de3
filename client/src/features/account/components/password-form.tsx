import { zodResolver } from '@hookform/resolvers/zod';
import type { JSX } from 'react';
import { useForm } from 'react-hook-form';

import {
  changePasswordRequest,
  passwordLimits,
  type ChangePasswordRequest,
} from '#common/schemas/auth';
import { Button } from '#client/components/button.tsx';
import { InlineError } from '#client/components/error-state.tsx';
import { TextField } from '#client/components/text-field.tsx';
import { useToast } from '#client/components/toast.tsx';
import { useChangePassword } from '#client/features/account/api/account.ts';
import { showFormError } from '#client/lib/form-errors.ts';

const fields = ['currentPassword', 'newPassword'] as const;

/** Changes the password; the present one is asked for. */
export function PasswordForm({ email }: { email: string }): JSX.Element {
  const change = useChangePassword();
  const show = useToast();
  const form = useForm<ChangePasswordRequest>({
    resolver: zodResolver(changePasswordRequest),
    defaultValues: { currentPassword: '', newPassword: '' },
  });
  const { errors } = form.formState;
  const send = (request: ChangePasswordRequest): void =>
    change.mutate(request, {
      onSuccess: () => {
        form.reset();
        show({ message: 'Your password is changed' });
      },
      onError: (error) =>
        showFormError(error, form.setError, fields, {
          'auth.bad_credentials': 'currentPassword',
          'auth.weak_password': 'newPassword',
        }),
    });
  return (
    <form
      noValidate
      className="mt-3 grid max-w-sm gap-4"
      onSubmit={(event) => void form.handleSubmit(send)(event)}
    >
      <InlineError error={errors.root?.server?.message} />
      {/* For password managers: whose password this is. */}
      <input type="hidden" name="username" autoComplete="username" value={email} readOnly />
      <TextField
        label="Present password"
        type="password"
        autoComplete="current-password"
        error={errors.currentPassword?.message}
        {...form.register('currentPassword')}
      />
      <TextField
        label="New password"
        type="password"
        autoComplete="new-password"
        hint={`At least ${passwordLimits.minLength} characters.`}
        error={errors.newPassword?.message}
        {...form.register('newPassword')}
      />
      <div>
        <Button type="submit" isBusy={change.isPending}>
          Change the password
        </Button>
      </div>
    </form>
  );
}
