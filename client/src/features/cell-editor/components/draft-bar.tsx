import { CloudOff, Redo2, Undo2 } from 'lucide-react';
import type { JSX } from 'react';

import { IconButton } from '#client/components/button.tsx';
import type { KeeperStatus } from '#client/features/cell-editor/model/draft-keeper.ts';

const clock = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' });

/** How the edit stands, in a few words. */
export function statusWords(status: KeeperStatus): string {
  switch (status.kind) {
    case 'clean':
      return 'No unsaved edit';
    case 'waiting':
    case 'saving':
      return 'Saving …';
    case 'saved':
      return `Saved as draft ${clock.format(status.atMs)}`;
    case 'offline':
      return 'Not saved: no connection. Kept on this device and tried again.';
    case 'failed':
      return `Not saved: ${status.message}`;
    case 'conflict':
      return 'Not saved: someone else changed this draft.';
  }
}

/** Whether the status tells of an edit that the server does not have. */
export function isUnsaved(status: KeeperStatus): boolean {
  return status.kind === 'offline' || status.kind === 'failed' || status.kind === 'conflict';
}

interface DraftBarProps {
  status: KeeperStatus;
  canUndo: boolean;
  canRedo: boolean;
  onUndo: () => void;
  onRedo: () => void;
}

/** Undo, redo, and whether the edit is saved. */
export function DraftBar({ status, canUndo, canRedo, onUndo, onRedo }: DraftBarProps): JSX.Element {
  return (
    <div className="flex items-center gap-1">
      <IconButton
        label="Undo"
        title="Undo (Ctrl+Z)"
        aria-keyshortcuts="Control+Z"
        icon={<Undo2 aria-hidden className="size-4" />}
        disabled={!canUndo}
        onClick={onUndo}
      />
      <IconButton
        label="Redo"
        title="Redo (Ctrl+Shift+Z)"
        aria-keyshortcuts="Control+Shift+Z"
        icon={<Redo2 aria-hidden className="size-4" />}
        disabled={!canRedo}
        onClick={onRedo}
      />
      <p
        role="status"
        className={`ml-2 flex items-center gap-1.5 text-small ${isUnsaved(status) ? 'text-fails' : 'text-soft'}`}
      >
        {isUnsaved(status) && <CloudOff aria-hidden className="size-4 shrink-0" />}
        {statusWords(status)}
      </p>
    </div>
  );
}
