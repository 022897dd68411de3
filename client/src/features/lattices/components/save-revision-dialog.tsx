import { zodResolver } from '@hookform/resolvers/zod';
import type { JSX } from 'react';
import { useForm } from 'react-hook-form';

import { saveRevisionRequest, type RevisionDetail } from '#common/schemas/lattice';
import { Button } from '#client/components/button.tsx';
import { Dialog } from '#client/components/dialog.tsx';
import { InlineError } from '#client/components/error-state.tsx';
import { TextAreaField } from '#client/components/text-area-field.tsx';
import { useToast } from '#client/components/toast.tsx';
import { useSaveRevision } from '#client/features/lattices/api/revisions.ts';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';

interface SaveRevisionDialogProps {
  latticeRef: LatticeRef;
  open: boolean;
  onClose: () => void;
  nextNumber: number;
  /** Saves what is not saved yet and gives the version that becomes the revision. */
  settleDraft: () => Promise<string>;
  onSaved: (revision: RevisionDetail) => void;
  /** Said where the cell has no energy: it may be saved all the same. */
  caution: string | null;
}

function NoteForm({ formId, ...props }: SaveRevisionDialogProps & { formId: string }): JSX.Element {
  const show = useToast();
  const save = useSaveRevision(props.latticeRef);
  const form = useForm({
    resolver: zodResolver(saveRevisionRequest),
    defaultValues: { note: '' },
  });
  const send = form.handleSubmit(({ note }) => {
    save.mutate(
      { note, settleDraft: props.settleDraft },
      {
        onSuccess: (revision) => {
          show({ message: `Revision ${revision.number} is saved.` });
          props.onSaved(revision);
          props.onClose();
        },
      },
    );
  });
  return (
    <form id={formId} onSubmit={(event) => void send(event)} className="grid gap-3">
      <TextAreaField
        label="Note"
        placeholder="What changed, and why"
        error={form.formState.errors.note?.message ?? null}
        hint="A revision never changes again; others can remark on it."
        {...form.register('note')}
      />
      {props.caution !== null && (
        <p className="border-l-3 border-doubtful bg-wash px-3 py-2 text-small">{props.caution}</p>
      )}
      <InlineError error={save.error} />
    </form>
  );
}

/** Makes the draft an immutable revision, with a note. */
export function SaveRevisionDialog(props: SaveRevisionDialogProps): JSX.Element {
  const formId = 'save-revision-form';
  return (
    <Dialog
      open={props.open}
      onClose={props.onClose}
      title={`Save revision ${props.nextNumber}`}
      footer={
        <>
          <Button onClick={props.onClose}>Cancel</Button>
          <Button variant="primary" type="submit" form={formId}>
            Save
          </Button>
        </>
      }
    >
      <NoteForm {...props} formId={formId} />
    </Dialog>
  );
}
