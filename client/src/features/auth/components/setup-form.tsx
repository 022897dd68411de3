import { zodResolver } from '@hookform/resolvers/zod';
import type { JSX } from 'react';
import { useForm } from 'react-hook-form';

import { passwordLimits, setupRequest, type SetupRequest } from '#common/schemas/auth';
import { Button } from '#client/components/button.tsx';
import { InlineError } from '#client/components/error-state.tsx';
import { TextField } from '#client/components/text-field.tsx';
import { useSetUp } from '#client/features/auth/api/set-up.ts';
import { showFormError } from '#client/lib/form-errors.ts';

const fields = ['name', 'email', 'password', 'workspaceName'] as const;

/** The first owner's account and their workspace. */
export function SetupForm(): JSX.Element {
  const setUp = useSetUp();
  const form = useForm<SetupRequest>({
    resolver: zodResolver(setupRequest),
    defaultValues: { name: '', email: '', password: '', workspaceName: '' },
  });
  const { errors } = form.formState;

  const send = (request: SetupRequest): void =>
    setUp.mutate(request, {
      onError: (error) =>
        showFormError(error, form.setError, fields, { 'auth.weak_password': 'password' }),
    });

  return (
    <form
      noValidate
      className="grid gap-4"
      onSubmit={(event) => void form.handleSubmit(send)(event)}
    >
      <InlineError error={errors.root?.server?.message} />
      <TextField
        label="Your name"
        autoComplete="name"
        autoFocus
        error={errors.name?.message}
        {...form.register('name')}
      />
      <TextField
        label="E-mail"
        type="email"
        autoComplete="username"
        error={errors.email?.message}
        {...form.register('email')}
      />
      <TextField
        label="Password"
        type="password"
        autoComplete="new-password"
        hint={`At least ${passwordLimits.minLength} characters.`}
        error={errors.password?.message}
        {...form.register('password')}
      />
      <TextField
        label="Name of the workspace"
        hint="Your group’s room. More can follow, and the name can change."
        error={errors.workspaceName?.message}
        {...form.register('workspaceName')}
      />
      <Button type="submit" variant="primary" size="large" isBusy={setUp.isPending}>
        Set up Holdfast
      </Button>
    </form>
  );
}
