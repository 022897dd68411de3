import { useMutation, useQueryClient } from '@tanstack/react-query';

import { revisionSummary } from '#common/schemas/lattice';
import { api } from '#client/lib/api-client.ts';
import { latticePath, type LatticeRef } from '#client/lib/lattice-keys.ts';
import { latticesKey } from '#client/lib/query-keys.ts';

export type Decision =
  | { verb: 'submit' }
  | { verb: 'withdraw' }
  | { verb: 'accept'; reason: string }
  | { verb: 'return'; reason: string };

/** Moves a revision along: into review, out of it, accepted or returned. */
export function useDecide(ref: LatticeRef, revision: number) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (decision: Decision) =>
      api.post(`${latticePath(ref)}/revisions/${revision}/${decision.verb}`, {
        schema: revisionSummary,
        ...('reason' in decision ? { body: { reason: decision.reason } } : {}),
      }),
    // Also after a failure: someone else may have decided meanwhile.
    onSettled: () => client.invalidateQueries({ queryKey: latticesKey(ref.workspace) }),
  });
}
