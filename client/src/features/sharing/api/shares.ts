import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { z } from 'zod';

import { createdShare, sharedRevision, shareList } from '#common/schemas/sharing';
import { api } from '#client/lib/api-client.ts';
import { latticeKey, latticePath, type LatticeRef } from '#client/lib/lattice-keys.ts';

/** Links to revisions of a lattice; without their secrets. */
export const sharesQuery = (ref: LatticeRef) =>
  queryOptions({
    queryKey: [...latticeKey(ref), 'shares'],
    queryFn: ({ signal }) => api.get(`${latticePath(ref)}/shares`, { schema: shareList, signal }),
    select: (list) => list.items,
  });

/** Makes a link to one revision; its secret is in this one answer only. */
export function useCreateShare(ref: LatticeRef, revision: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (expiresInDays: number | null) =>
      api.post(`${latticePath(ref)}/revisions/${revision}/shares`, {
        schema: createdShare,
        body: { expiresInDays },
      }),
    onSuccess: () => client.invalidateQueries({ queryKey: sharesQuery(ref).queryKey }),
  });
}

/** Withdraws a link: whoever opens it afterwards finds nothing. */
export function useWithdrawShare(ref: LatticeRef) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (shareId: string) =>
      api.delete(`${latticePath(ref)}/shares/${shareId}`, { schema: z.unknown() }),
    onSuccess: () => client.invalidateQueries({ queryKey: sharesQuery(ref).queryKey }),
  });
}

/** What a link holder sees. */
export const sharedRevisionQuery = (token: string) =>
  queryOptions({
    queryKey: ['shares', token],
    queryFn: ({ signal }) => api.get(`/shares/${token}`, { schema: sharedRevision, signal }),
    staleTime: 60_000,
  });
