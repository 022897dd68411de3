import { Dialog as Modal, DialogBackdrop, DialogPanel, DialogTitle } from '@headlessui/react';
import { X } from 'lucide-react';
import type { JSX, ReactNode } from 'react';

import { IconButton } from '#client/components/button.tsx';
import { classNames } from '#client/lib/class-names.ts';

interface DialogProps {
  open: boolean;
  onClose: () => void;
  title: string;
  children: ReactNode;
  /** Buttons; the main one last. */
  footer?: ReactNode;
  width?: 'narrow' | 'wide';
}

/** A sheet over the page: holds the focus, closes with Escape, gives the focus back. */
export function Dialog({
  open,
  onClose,
  title,
  children,
  footer,
  width = 'narrow',
}: DialogProps): JSX.Element {
  return (
    <Modal open={open} onClose={onClose} className="relative z-40">
      <DialogBackdrop className="fixed inset-0 bg-ink/25 dark:bg-paper/70" />
      <div className="fixed inset-0 grid items-end justify-items-center overflow-y-auto md:items-center md:p-6">
        <DialogPanel
          className={classNames(
            'animate-appear w-full border border-line bg-raised shadow-sheet md:rounded-control',
            width === 'narrow' ? 'md:max-w-md' : 'md:max-w-2xl',
          )}
        >
          <div className="flex items-start justify-between gap-4 px-6 pt-5">
            <DialogTitle className="text-lead">{title}</DialogTitle>
            <IconButton
              label="Close"
              icon={<X aria-hidden className="size-4" />}
              onClick={onClose}
              className="-mt-1 -mr-2"
            />
          </div>
          <div className="px-6 pt-3 pb-6">{children}</div>
          {footer !== undefined && (
            <div className="flex flex-wrap justify-end gap-2 border-t border-line px-6 py-4">
              {footer}
            </div>
          )}
        </DialogPanel>
      </div>
    </Modal>
  );
}
