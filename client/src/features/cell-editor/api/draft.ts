import { queryOptions } from '@tanstack/react-query';
import { z } from 'zod';

import { draft, type Draft, type PutDraftRequest } from '#common/schemas/lattice';
import { api } from '#client/lib/api-client.ts';
import { latticeKey, latticePath, type LatticeRef } from '#client/lib/lattice-keys.ts';

/** The unsaved edit of a lattice, or its newest revision where nothing is edited. */
export const draftQuery = (ref: LatticeRef) =>
  queryOptions({
    queryKey: [...latticeKey(ref), 'draft'],
    queryFn: ({ signal }) => api.get(`${latticePath(ref)}/draft`, { schema: draft, signal }),
  });

/** Keeps an edit; refused with `draft.conflict` when someone else's came between. */
export const putDraft = (ref: LatticeRef, body: PutDraftRequest, etag: string): Promise<Draft> =>
  api.put(`${latticePath(ref)}/draft`, { schema: draft, body, ifMatch: etag });

/** Reads the draft past every store. */
export const readDraft = (ref: LatticeRef): Promise<Draft> =>
  api.get(`${latticePath(ref)}/draft`, { schema: draft });

/** Throws the edit away: what is left is the newest revision. */
export async function discardDraft(ref: LatticeRef, etag: string): Promise<Draft> {
  await api.delete(`${latticePath(ref)}/draft`, { schema: z.unknown(), ifMatch: etag });
  return readDraft(ref);
}
