import { useState, type JSX } from 'react';

import type { RevisionSummary } from '#common/schemas/lattice';
import { Button } from '#client/components/button.tsx';
import { DecideDialog } from '#client/features/review/components/decide-dialog.tsx';
import { SubmitDialog, WithdrawDialog } from '#client/features/review/components/submit-dialog.tsx';
import { ShareDialog } from '#client/features/sharing/components/share-dialog.tsx';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';
import { useCan } from '#client/lib/session.ts';

interface ReviewActionsProps {
  latticeRef: LatticeRef;
  revision: RevisionSummary;
  openRemarks: number;
  /** Another button is the main one on the page. */
  isSecondary?: boolean;
}

type Open = 'submit' | 'withdraw' | 'decide' | null;

/** What the person may do with a saved revision: submit, withdraw, return or accept. */
export function ReviewActions(props: ReviewActionsProps): JSX.Element {
  const { latticeRef, revision, openRemarks } = props;
  const can = useCan();
  const [open, setOpen] = useState<Open>(null);
  const close = (): void => setOpen(null);
  const subject = {
    authorId: revision.author.id,
    submittedById: revision.submittedBy?.id ?? null,
    state: revision.state,
  };
  const isInReview = revision.state === 'in_review';
  const maySubmit =
    (revision.state === 'draft' || revision.state === 'returned') &&
    can('revision.submit', subject);
  const mayDecide = isInReview && can('revision.return', subject);
  const main = props.isSecondary === true ? 'plain' : 'primary';
  const dialog = { latticeRef, revision: revision.number, onClose: close };
  return (
    <>
      {isInReview && can('revision.withdraw', subject) && (
        <Button onClick={() => setOpen('withdraw')}>Withdraw</Button>
      )}
      {maySubmit && (
        <Button variant={main} onClick={() => setOpen('submit')}>
          Submit for review
        </Button>
      )}
      {mayDecide && (
        <Button variant={main} onClick={() => setOpen('decide')}>
          Return or accept
        </Button>
      )}
      <SubmitDialog {...dialog} open={open === 'submit'} openRemarks={openRemarks} />
      <WithdrawDialog {...dialog} open={open === 'withdraw'} />
      <DecideDialog
        {...dialog}
        open={open === 'decide'}
        openRemarks={openRemarks}
        mayAccept={can('revision.accept', subject)}
      />
    </>
  );
}

/** Opens the links of a lattice. */
export function ShareAction({
  latticeRef,
  revision,
}: {
  latticeRef: LatticeRef;
  revision: number;
}): JSX.Element | null {
  const can = useCan();
  const [isOpen, setOpen] = useState(false);
  if (!can('share.list')) {
    return null;
  }
  return (
    <>
      <Button onClick={() => setOpen(true)}>Share</Button>
      <ShareDialog
        latticeRef={latticeRef}
        revision={revision}
        open={isOpen}
        onClose={() => setOpen(false)}
      />
    </>
  );
}
