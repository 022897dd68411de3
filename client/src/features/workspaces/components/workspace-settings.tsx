import { zodResolver } from '@hookform/resolvers/zod';
import type { JSX } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';

import type { MembershipSummary } from '#common/schemas/auth';
import { updateWorkspaceRequest } from '#common/schemas/workspace';
import { Button } from '#client/components/button.tsx';
import { InlineError } from '#client/components/error-state.tsx';
import { SwitchField } from '#client/components/switch-field.tsx';
import { TextField } from '#client/components/text-field.tsx';
import { useToast } from '#client/components/toast.tsx';
import {
  useUpdateWorkspace,
  type WorkspaceChange,
} from '#client/features/workspaces/api/workspace.ts';
import { messageOf } from '#client/lib/api-error.ts';
import { showFormError } from '#client/lib/form-errors.ts';

const nameForm = z.object({
  name: updateWorkspaceRequest.shape.name.unwrap().min(1, 'Write a name.'),
});
type NameForm = z.infer<typeof nameForm>;

function NameSetting({ workspace }: { workspace: MembershipSummary }): JSX.Element {
  const update = useUpdateWorkspace(workspace.workspaceSlug);
  const show = useToast();
  const form = useForm<NameForm>({
    resolver: zodResolver(nameForm),
    values: { name: workspace.workspaceName },
  });
  const { errors, isDirty } = form.formState;
  const send = (request: NameForm): void =>
    update.mutate(request, {
      onSuccess: () => show({ message: 'The workspace has its new name' }),
      onError: (error) => showFormError(error, form.setError, ['name']),
    });
  return (
    <form
      noValidate
      className="grid gap-4 py-6"
      onSubmit={(event) => void form.handleSubmit(send)(event)}
    >
      <InlineError error={errors.root?.server?.message} />
      <div className="flex items-start gap-2">
        <TextField
          label="Name"
          className="max-w-sm grow"
          hint={`The address stays /w/${workspace.workspaceSlug}, so links keep working.`}
          error={errors.name?.message}
          {...form.register('name')}
        />
        <Button type="submit" className="mt-[22px]" disabled={!isDirty} isBusy={update.isPending}>
          Save the name
        </Button>
      </div>
    </form>
  );
}

/** Name and rules of a workspace. */
export function WorkspaceSettings({ workspace }: { workspace: MembershipSummary }): JSX.Element {
  const update = useUpdateWorkspace(workspace.workspaceSlug);
  const show = useToast();
  const set = (change: WorkspaceChange): void =>
    update.mutate(change, {
      onSuccess: () => show({ message: 'Saved' }),
      onError: (error) => show({ message: messageOf(error), tone: 'failure' }),
    });
  const pending = update.isPending ? update.variables : {};
  return (
    <div className="rule-list mt-3">
      <NameSetting workspace={workspace} />
      <div className="py-6">
        <SwitchField
          label="A second person accepts"
          hint="Whoever wrote or submitted a revision can’t accept it. Switch this off only if one person works here alone."
          isOn={pending.requiresSecondPerson ?? workspace.requiresSecondPerson}
          onChange={(requiresSecondPerson) => set({ requiresSecondPerson })}
          disabled={update.isPending}
        />
      </div>
      <div className="py-6">
        <SwitchField
          label="Readers may remark"
          hint="Readers may pin remarks to revisions and reply to others."
          isOn={pending.readersMayComment ?? workspace.readersMayComment}
          onChange={(readersMayComment) => set({ readersMayComment })}
          disabled={update.isPending}
        />
      </div>
    </div>
  );
}
