import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';

import { revisionDetail, revisionList } from '#common/schemas/lattice';
import { api } from '#client/lib/api-client.ts';
import { latticeKey, latticePath, type LatticeRef } from '#client/lib/lattice-keys.ts';
import { latticesKey } from '#client/lib/query-keys.ts';

/** Every revision of a lattice, newest first. */
export const revisionsQuery = (ref: LatticeRef) =>
  queryOptions({
    queryKey: [...latticeKey(ref), 'revisions'],
    queryFn: ({ signal }) =>
      api.get(`${latticePath(ref)}/revisions`, { schema: revisionList, signal }),
    select: (list) => list.items.toSorted((one, other) => other.number - one.number),
  });

/** One revision with its cell and what was computed from it. */
export const revisionQuery = (ref: LatticeRef, number: number) =>
  queryOptions({
    queryKey: [...latticeKey(ref), 'revisions', number],
    queryFn: ({ signal }) =>
      api.get(`${latticePath(ref)}/revisions/${number}`, { schema: revisionDetail, signal }),
    enabled: number > 0,
  });

interface SaveRevision {
  note: string;
  /** Saves what is not saved yet and gives the version of the draft that is meant. */
  settleDraft: () => Promise<string>;
}

/** Turns the draft into an immutable revision. */
export function useSaveRevision(ref: LatticeRef) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: async ({ note, settleDraft }: SaveRevision) =>
      api.post(`${latticePath(ref)}/revisions`, {
        schema: revisionDetail,
        body: { note },
        ifMatch: await settleDraft(),
      }),
    onSuccess: async (revision) => {
      client.setQueryData(revisionQuery(ref, revision.number).queryKey, revision);
      await client.invalidateQueries({ queryKey: latticesKey(ref.workspace) });
    },
  });
}
