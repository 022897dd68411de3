import { zodResolver } from '@hookform/resolvers/zod';
import type { JSX } from 'react';
import { useForm } from 'react-hook-form';

import { signInRequest, type SessionState, type SignInRequest } from '#common/schemas/auth';
import { Button } from '#client/components/button.tsx';
import { InlineError } from '#client/components/error-state.tsx';
import { TextField } from '#client/components/text-field.tsx';
import { useSignIn } from '#client/features/auth/api/sign-in.ts';
import { DemoPeople } from '#client/features/auth/components/demo-people.tsx';
import { useCountdown } from '#client/features/auth/use-countdown.ts';
import { hasCode } from '#client/lib/api-error.ts';
import { showFormError } from '#client/lib/form-errors.ts';

const defaultWaitSeconds = 30;

/** E-mail and password, and the demo's people where there are any. */
export function SignInForm({ demo }: { demo: SessionState['demo'] }): JSX.Element {
  const signIn = useSignIn();
  const { secondsLeft, start } = useCountdown();
  const isBusy = signIn.isPending || signIn.isSuccess;
  const form = useForm<SignInRequest>({
    resolver: zodResolver(signInRequest),
    defaultValues: { email: '', password: '' },
  });
  const { errors } = form.formState;

  const send = (request: SignInRequest): void => {
    form.clearErrors();
    signIn.mutate(request, {
      onError: (error) => {
        if (hasCode(error, 'auth.slowed')) {
          start(error.details.retryAfterSeconds ?? defaultWaitSeconds);
        }
        showFormError(error, form.setError, ['email', 'password']);
      },
    });
  };

  return (
    <>
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
          spellCheck={false}
          autoFocus
          error={errors.email?.message}
          {...form.register('email')}
        />
        <TextField
          label="Password"
          type="password"
          autoComplete="current-password"
          error={errors.password?.message}
          {...form.register('password')}
        />
        <Button
          type="submit"
          variant="primary"
          size="large"
          isBusy={isBusy}
          disabled={secondsLeft > 0}
        >
          {secondsLeft > 0 ? `Wait ${secondsLeft} s` : 'Sign in'}
        </Button>
      </form>
      {demo !== null && (
        <DemoPeople
          demo={demo}
          isDisabled={isBusy || secondsLeft > 0}
          onChoose={(email) => send({ email, password: demo.password })}
        />
      )}
    </>
  );
}
