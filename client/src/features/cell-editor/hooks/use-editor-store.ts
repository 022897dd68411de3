import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState, useSyncExternalStore } from 'react';

import type { Draft } from '#common/schemas/lattice';
import { draftQuery, putDraft, readDraft } from '#client/features/cell-editor/api/draft.ts';
import type { KeeperStatus } from '#client/features/cell-editor/model/draft-keeper.ts';
import type { EditorHistory } from '#client/features/cell-editor/model/editor-history.ts';
import { EditorStore } from '#client/features/cell-editor/model/editor-store.ts';
import { recallUnsaved, rememberUnsaved } from '#client/features/cell-editor/model/unsaved-copy.ts';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';

/** The editor of a lattice's draft; one per page, started from the draft as it was opened. */
export function useEditorStore(ref: LatticeRef, draft: Draft): EditorStore {
  const client = useQueryClient();
  const [store] = useState(
    () =>
      new EditorStore(
        draft,
        {
          put: (body, etag) => putDraft(ref, body, etag),
          read: () => readDraft(ref),
          remember: (copy) => rememberUnsaved(ref.latticeId, copy),
          now: () => Date.now(),
          onSaved: (saved) => client.setQueryData(draftQuery(ref).queryKey, saved),
        },
        recallUnsaved(ref.latticeId),
      ),
  );
  useEffect(() => {
    const flush = (): void => void store.keeper.flush();
    window.addEventListener('online', flush);
    window.addEventListener('pagehide', flush);
    return () => {
      window.removeEventListener('online', flush);
      window.removeEventListener('pagehide', flush);
      flush();
    };
  }, [store]);
  return store;
}

export function useEditorHistory(store: EditorStore): EditorHistory {
  return useSyncExternalStore(store.subscribe, store.getHistory);
}

export function useKeeperStatus(store: EditorStore): KeeperStatus {
  return useSyncExternalStore(store.keeper.subscribe, store.keeper.getStatus);
}
