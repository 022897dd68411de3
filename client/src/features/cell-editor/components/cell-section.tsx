import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState, type JSX, type ReactNode } from 'react';

import type { FieldProblem } from '#common/errors/problem';
import { Button } from '#client/components/button.tsx';
import { ConfirmDialog } from '#client/components/confirm-dialog.tsx';
import { useToast } from '#client/components/toast.tsx';
import { discardDraft, draftQuery } from '#client/features/cell-editor/api/draft.ts';
import { CellForm } from '#client/features/cell-editor/components/cell-form.tsx';
import { DraftBar } from '#client/features/cell-editor/components/draft-bar.tsx';
import {
  useEditorHistory,
  useKeeperStatus,
} from '#client/features/cell-editor/hooks/use-editor-store.ts';
import type { ResolvedState } from '#client/features/cell-editor/hooks/use-resolved-cell.ts';
import type { EditorStore } from '#client/features/cell-editor/model/editor-store.ts';
import { useHotkey } from '#client/lib/hotkeys.ts';
import { latticeKey, type LatticeRef } from '#client/lib/lattice-keys.ts';

interface CellSectionProps {
  latticeRef: LatticeRef;
  store: EditorStore;
  resolved: ResolvedState;
  serverProblems: readonly FieldProblem[];
  pickedLabels: ReadonlySet<string>;
  energy: ReactNode;
  /** There is a revision that the draft could go back to, and the draft differs from it. */
  canDiscard: boolean;
}

function DiscardButton({
  latticeRef,
  store,
}: {
  latticeRef: LatticeRef;
  store: EditorStore;
}): JSX.Element {
  const [isAsking, setAsking] = useState(false);
  const client = useQueryClient();
  const show = useToast();
  const discard = useMutation({
    mutationFn: async () => {
      await store.keeper.flush();
      return discardDraft(latticeRef, store.keeper.currentEtag);
    },
    onSuccess: async (draft) => {
      setAsking(false);
      client.setQueryData(draftQuery(latticeRef).queryKey, draft);
      store.takeTheirs(draft);
      show({
        message: 'Draft discarded: this is the newest revision again.',
        action: { label: 'Undo', onAction: () => store.undo() },
      });
      await client.invalidateQueries({ queryKey: latticeKey(latticeRef) });
    },
  });
  return (
    <>
      <Button size="small" variant="quiet" onClick={() => setAsking(true)}>
        Discard draft
      </Button>
      <ConfirmDialog
        open={isAsking}
        onClose={() => setAsking(false)}
        title="Discard the draft?"
        confirmLabel="Discard"
        onConfirm={() => discard.mutate()}
        isBusy={discard.isPending}
        error={discard.error}
      >
        The cell goes back to the newest saved revision.
      </ConfirmDialog>
    </>
  );
}

/** The cell while it is edited: undo, redo, saved state, form. */
export function CellSection(props: CellSectionProps): JSX.Element {
  const { store, latticeRef } = props;
  const history = useEditorHistory(store);
  const status = useKeeperStatus(store);
  useHotkey('mod+z', (event) => {
    event.preventDefault();
    store.undo();
  });
  useHotkey('mod+shift+z', (event) => {
    event.preventDefault();
    store.redo();
  });
  return (
    <div className="grid grid-cols-1 gap-4">
      <div className="flex min-h-8 flex-wrap items-center justify-between gap-2">
        <DraftBar
          status={status}
          canUndo={history.past.length > 0}
          canRedo={history.future.length > 0}
          onUndo={() => store.undo()}
          onRedo={() => store.redo()}
        />
        {props.canDiscard && <DiscardButton latticeRef={latticeRef} store={store} />}
      </div>
      <CellForm
        content={history.present}
        resolved={props.resolved}
        serverProblems={props.serverProblems}
        pickedLabels={props.pickedLabels}
        energy={props.energy}
        edit={(change, field) => store.edit(change, field)}
      />
    </div>
  );
}
