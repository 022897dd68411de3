import { zodResolver } from '@hookform/resolvers/zod';
import type { JSX } from 'react';
import { useForm } from 'react-hook-form';

import { updateProfileRequest, type CurrentUser } from '#common/schemas/auth';
import { Button } from '#client/components/button.tsx';
import { InlineError } from '#client/components/error-state.tsx';
import { TextField } from '#client/components/text-field.tsx';
import { useToast } from '#client/components/toast.tsx';
import { useUpdateProfile, type ProfileChange } from '#client/features/account/api/account.ts';
import { showFormError } from '#client/lib/form-errors.ts';

/** The name others see; the address is shown, not changed. */
export function ProfileForm({ user }: { user: CurrentUser }): JSX.Element {
  const update = useUpdateProfile();
  const show = useToast();
  const form = useForm<ProfileChange>({
    resolver: zodResolver(updateProfileRequest),
    values: { name: user.name },
  });
  const { errors, isDirty } = form.formState;
  const send = (request: ProfileChange): void =>
    update.mutate(request, {
      onSuccess: () => show({ message: 'Your name is saved' }),
      onError: (error) => showFormError(error, form.setError, ['name']),
    });
  return (
    <form
      noValidate
      className="mt-3 grid max-w-sm gap-4"
      onSubmit={(event) => void form.handleSubmit(send)(event)}
    >
      <InlineError error={errors.root?.server?.message} />
      <TextField
        label="Name"
        autoComplete="name"
        error={errors.name?.message}
        {...form.register('name')}
      />
      <TextField
        label="E-mail"
        value={user.email}
        readOnly
        hint="You sign in with it. It can’t be changed here."
      />
      <div>
        <Button type="submit" disabled={!isDirty} isBusy={update.isPending}>
          Save the name
        </Button>
      </div>
    </form>
  );
}
