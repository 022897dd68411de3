import { zodResolver } from '@hookform/resolvers/zod';
import { useId, type JSX } from 'react';
import { useForm } from 'react-hook-form';
import { z } from 'zod';

import { createLatticeRequest, type LatticeSummary } from '#common/schemas/lattice';
import { Button } from '#client/components/button.tsx';
import { Dialog } from '#client/components/dialog.tsx';
import { InlineError } from '#client/components/error-state.tsx';
import { TextField } from '#client/components/text-field.tsx';
import { useUpdateLattice } from '#client/features/shelf/api/change-lattice.ts';
import { showFormError } from '#client/lib/form-errors.ts';

interface RenameDialogProps {
  lattice: LatticeSummary;
  workspace: string;
  open: boolean;
  onClose: () => void;
}

const renameForm = z.object({ name: createLatticeRequest.shape.name });
type RenameForm = z.infer<typeof renameForm>;

/** Gives a lattice another name. */
export function RenameDialog({
  lattice,
  workspace,
  open,
  onClose,
}: RenameDialogProps): JSX.Element {
  const formId = useId();
  const update = useUpdateLattice(workspace, lattice.id);
  const form = useForm<RenameForm>({
    resolver: zodResolver(renameForm),
    values: { name: lattice.name },
  });
  const { errors } = form.formState;
  const send = (request: RenameForm): void =>
    update.mutate(request, {
      onSuccess: onClose,
      onError: (error) => showFormError(error, form.setError, ['name']),
    });

  return (
    <Dialog
      open={open}
      onClose={onClose}
      title="Rename the lattice"
      footer={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" form={formId} variant="primary" isBusy={update.isPending}>
            Rename
          </Button>
        </>
      }
    >
      <form
        id={formId}
        noValidate
        className="grid gap-4"
        onSubmit={(event) => void form.handleSubmit(send)(event)}
      >
        <InlineError error={errors.root?.server?.message} />
        <TextField
          label="Name"
          data-autofocus
          error={errors.name?.message}
          {...form.register('name')}
        />
      </form>
    </Dialog>
  );
}
