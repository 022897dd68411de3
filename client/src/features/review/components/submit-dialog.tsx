import type { JSX } from 'react';

import { ConfirmDialog } from '#client/components/confirm-dialog.tsx';
import { useToast } from '#client/components/toast.tsx';
import { useDecide } from '#client/features/review/api/decisions.ts';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';

interface MoveDialogProps {
  latticeRef: LatticeRef;
  revision: number;
  open: boolean;
  onClose: () => void;
}

/** Hands a revision to the reviewers. */
export function SubmitDialog({
  latticeRef,
  revision,
  open,
  onClose,
  openRemarks,
}: MoveDialogProps & { openRemarks: number }): JSX.Element {
  const show = useToast();
  const decide = useDecide(latticeRef, revision);
  return (
    <ConfirmDialog
      open={open}
      onClose={onClose}
      title={`Submit revision ${revision} for review?`}
      confirmLabel="Submit"
      isDangerous={false}
      isBusy={decide.isPending}
      error={decide.error}
      onConfirm={() =>
        decide.mutate(
          { verb: 'submit' },
          {
            onSuccess: () => {
              onClose();
              show({ message: `Revision ${revision} is in review.` });
            },
          },
        )
      }
    >
      A reviewer can then accept it or return it with a reason. You can withdraw it until then.
      {openRemarks > 0 && (
        <span className="mt-2 block">
          {openRemarks === 1 ? 'One remark is' : `${openRemarks} remarks are`} still open.
        </span>
      )}
    </ConfirmDialog>
  );
}

/** Takes a revision out of review again. */
export function WithdrawDialog({
  latticeRef,
  revision,
  open,
  onClose,
}: MoveDialogProps): JSX.Element {
  const show = useToast();
  const decide = useDecide(latticeRef, revision);
  return (
    <ConfirmDialog
      open={open}
      onClose={onClose}
      title={`Withdraw revision ${revision} from review?`}
      confirmLabel="Withdraw"
      isDangerous={false}
      isBusy={decide.isPending}
      error={decide.error}
      onConfirm={() =>
        decide.mutate(
          { verb: 'withdraw' },
          {
            onSuccess: () => {
              onClose();
              show({ message: `Revision ${revision} is withdrawn.` });
            },
          },
        )
      }
    >
      It goes back to a draft state; its remarks stay.
    </ConfirmDialog>
  );
}
