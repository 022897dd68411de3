import type { JSX, ReactNode } from 'react';

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

/** The words of a move and what it says when done. */
interface Move {
  readonly verb: 'submit' | 'withdraw';
  readonly title: string;
  readonly confirmLabel: string;
  readonly doneMessage: string;
}

/** Asks before a revision changes hands, does it and says so. */
function MoveDialog({
  latticeRef,
  revision,
  open,
  onClose,
  move,
  children,
}: MoveDialogProps & { move: Move; children: ReactNode }): JSX.Element {
  const show = useToast();
  const decide = useDecide(latticeRef, revision);
  const onSuccess = (): void => {
    onClose();
    show({ message: move.doneMessage });
  };
  return (
    <ConfirmDialog
      open={open}
      onClose={onClose}
      title={move.title}
      confirmLabel={move.confirmLabel}
      isDangerous={false}
      isBusy={decide.isPending}
      error={decide.error}
      onConfirm={() => decide.mutate({ verb: move.verb }, { onSuccess })}
    >
      {children}
    </ConfirmDialog>
  );
}

/** Hands a revision to the reviewers. */
export function SubmitDialog({
  openRemarks,
  ...props
}: MoveDialogProps & { openRemarks: number }): JSX.Element {
  const move: Move = {
    verb: 'submit',
    title: `Submit revision ${props.revision} for review?`,
    confirmLabel: 'Submit',
    doneMessage: `Revision ${props.revision} is in review.`,
  };
  return (
    <MoveDialog {...props} move={move}>
      A reviewer can then accept it or return it with a reason. You can withdraw it until then.
      {openRemarks > 0 && (
        <span className="mt-2 block">
          {openRemarks === 1 ? 'One remark is' : `${openRemarks} remarks are`} still open.
        </span>
      )}
    </MoveDialog>
  );
}

/** Takes a revision out of review again. */
export function WithdrawDialog(props: MoveDialogProps): JSX.Element {
  const move: Move = {
    verb: 'withdraw',
    title: `Withdraw revision ${props.revision} from review?`,
    confirmLabel: 'Withdraw',
    doneMessage: `Revision ${props.revision} is withdrawn.`,
  };
  return (
    <MoveDialog {...props} move={move}>
      It goes back to a draft state; its remarks stay.
    </MoveDialog>
  );
}
