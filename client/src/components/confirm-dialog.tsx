import type { JSX, ReactNode } from 'react';

import { Button } from '#client/components/button.tsx';
import { Dialog } from '#client/components/dialog.tsx';
import { InlineError } from '#client/components/error-state.tsx';

interface ConfirmDialogProps {
  open: boolean;
  onClose: () => void;
  title: string;
  children: ReactNode;
  /** The verb: `Remove`, not `OK`. */
  confirmLabel: string;
  onConfirm: () => void;
  isBusy?: boolean;
  isDangerous?: boolean;
  error?: unknown;
}

/** Asks once before something that can't be undone. */
export function ConfirmDialog({
  open,
  onClose,
  title,
  children,
  confirmLabel,
  onConfirm,
  isBusy = false,
  isDangerous = true,
  error,
}: ConfirmDialogProps): JSX.Element {
  return (
    <Dialog
      open={open}
      onClose={onClose}
      title={title}
      footer={
        <>
          <Button onClick={onClose}>Cancel</Button>
          <Button variant={isDangerous ? 'danger' : 'primary'} onClick={onConfirm} isBusy={isBusy}>
            {confirmLabel}
          </Button>
        </>
      }
    >
      <div className="text-soft">{children}</div>
      <InlineError error={error} className="mt-4" />
    </Dialog>
  );
}
