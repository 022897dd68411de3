import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { z } from 'zod';

import { annotation, annotationList, type CreateAnnotationRequest } from '#common/schemas/review';
import { id } from '#common/schemas/shared';
import { api } from '#client/lib/api-client.ts';
import { latticeKey, latticePath, type LatticeRef } from '#client/lib/lattice-keys.ts';
import { latticesKey } from '#client/lib/query-keys.ts';

/** Remarks on one revision, in the order of their numbers. */
export const annotationsQuery = (ref: LatticeRef, revision: number) =>
  queryOptions({
    queryKey: [...latticeKey(ref), 'annotations', revision],
    queryFn: ({ signal }) =>
      api.get(`${latticePath(ref)}/revisions/${revision}/annotations`, {
        schema: annotationList,
        signal,
      }),
    select: (list) => list.items.toSorted((one, other) => one.number - other.number),
    enabled: revision > 0,
    // A conversation: look again now and then while the page is open.
    refetchInterval: 30_000,
  });

/** Enough to know that it worked: the list is asked again anyway. */
const settled = z.object({ id });

function useRefresh(ref: LatticeRef): () => Promise<void> {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: latticesKey(ref.workspace) });
}

/** Pins a new remark to a revision. */
export function useCreateAnnotation(ref: LatticeRef, revision: number) {
  const refresh = useRefresh(ref);
  return useMutation({
    mutationFn: (body: CreateAnnotationRequest) =>
      api.post(`${latticePath(ref)}/revisions/${revision}/annotations`, {
        schema: annotation,
        body,
      }),
    onSuccess: refresh,
  });
}

/** Answers a remark. */
export function useReply(ref: LatticeRef, annotationId: string) {
  const refresh = useRefresh(ref);
  return useMutation({
    mutationFn: (text: string) =>
      api.post(`${latticePath(ref)}/annotations/${annotationId}/replies`, {
        schema: settled,
        body: { text },
      }),
    onSuccess: refresh,
  });
}

/** Marks a remark as settled, or opens it again. */
export function useSettle(ref: LatticeRef, annotationId: string) {
  const refresh = useRefresh(ref);
  return useMutation({
    mutationFn: (verb: 'resolve' | 'reopen') =>
      api.post(`${latticePath(ref)}/annotations/${annotationId}/${verb}`, { schema: settled }),
    onSuccess: refresh,
  });
}
