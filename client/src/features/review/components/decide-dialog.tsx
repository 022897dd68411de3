import { useState, type JSX } from 'react';
import { useForm } from 'react-hook-form';

import { acceptRevisionRequest, returnRevisionRequest } from '#common/schemas/review';
import { Button } from '#client/components/button.tsx';
import { Dialog } from '#client/components/dialog.tsx';
import { InlineError } from '#client/components/error-state.tsx';
import { Segmented } from '#client/components/segmented.tsx';
import { TextAreaField } from '#client/components/text-area-field.tsx';
import { useToast } from '#client/components/toast.tsx';
import { useDecide } from '#client/features/review/api/decisions.ts';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';

type Verb = 'accept' | 'return';

interface DecideDialogProps {
  latticeRef: LatticeRef;
  revision: number;
  open: boolean;
  onClose: () => void;
  /** False where a second person is asked for and this is the author: then why. */
  mayAccept: boolean;
  openRemarks: number;
}

function note(verb: Verb, openRemarks: number): string {
  if (verb === 'return') {
    return 'The author sees the reason at the top of the lattice.';
  }
  return openRemarks === 0
    ? 'The revision is accepted as it stands.'
    : `${openRemarks === 1 ? 'One remark is' : `${openRemarks} remarks are`} still open.`;
}

function DecideForm(
  props: Omit<DecideDialogProps, 'open'> & { formId: string; verb: Verb },
): JSX.Element {
  const { verb, revision, latticeRef, formId } = props;
  const show = useToast();
  const decide = useDecide(latticeRef, revision);
  const schema = verb === 'return' ? returnRevisionRequest : acceptRevisionRequest;
  const form = useForm({ defaultValues: { reason: '' } });
  const send = form.handleSubmit(({ reason }) =>
    decide.mutate(
      { verb, reason },
      {
        onSuccess: () => {
          props.onClose();
          show({
            message:
              verb === 'accept'
                ? `Revision ${revision} is accepted.`
                : `Revision ${revision} is returned.`,
          });
        },
      },
    ),
  );
  return (
    <form id={formId} onSubmit={(event) => void send(event)} className="grid gap-3">
      <TextAreaField
        label={verb === 'return' ? 'Reason' : 'Reason (may be left out)'}
        error={form.formState.errors.reason?.message ?? null}
        hint={note(verb, props.openRemarks)}
        {...form.register('reason', {
          validate: (reason) => schema.safeParse({ reason }).error?.issues[0]?.message ?? true,
        })}
      />
      <InlineError error={decide.error} />
    </form>
  );
}

/** A reviewer’s decision: accept, or return with a reason. */
export function DecideDialog({ open, ...props }: DecideDialogProps): JSX.Element {
  const [wanted, setVerb] = useState<Verb>('return');
  const verb: Verb = props.mayAccept ? wanted : 'return';
  const formId = 'decide-form';
  return (
    <Dialog
      open={open}
      onClose={props.onClose}
      title={`Return or accept revision ${props.revision}`}
      footer={
        <>
          <Button onClick={props.onClose}>Cancel</Button>
          <Button variant="primary" type="submit" form={formId}>
            {verb === 'accept' ? 'Accept' : 'Return'}
          </Button>
        </>
      }
    >
      <div className="grid gap-4">
        <Segmented
          label="Decision"
          className="justify-self-start"
          value={verb}
          options={[
            { value: 'return', label: 'return' },
            { value: 'accept', label: 'accept', isDisabled: !props.mayAccept },
          ]}
          onChange={setVerb}
        />
        {!props.mayAccept && (
          <p className="text-small text-soft">
            This workspace asks for a second person: someone other than the author must accept it.
          </p>
        )}
        <DecideForm key={verb} {...props} verb={verb} formId={formId} />
      </div>
    </Dialog>
  );
}
