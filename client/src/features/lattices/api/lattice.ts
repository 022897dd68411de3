import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';

import { latticeSummary, type LatticeSummary } from '#common/schemas/lattice';
import { api } from '#client/lib/api-client.ts';
import { latticeKey, latticePath, type LatticeRef } from '#client/lib/lattice-keys.ts';
import { latticesKey } from '#client/lib/query-keys.ts';

/** One lattice as the shelf knows it: name, state, author. */
export const latticeQuery = (ref: LatticeRef) =>
  queryOptions({
    queryKey: [...latticeKey(ref), 'summary'],
    queryFn: ({ signal }) => api.get(latticePath(ref), { schema: latticeSummary, signal }),
  });

/** Gives the lattice another name; the title changes at once and goes back on failure. */
export function useRenameLattice(ref: LatticeRef) {
  const client = useQueryClient();
  const { queryKey } = latticeQuery(ref);
  return useMutation({
    mutationFn: (name: string) =>
      api.patch(latticePath(ref), { schema: latticeSummary, body: { name } }),
    onMutate: async (name) => {
      await client.cancelQueries({ queryKey });
      const before = client.getQueryData<LatticeSummary>(queryKey);
      client.setQueryData<LatticeSummary>(queryKey, (old) => old && { ...old, name });
      return { before };
    },
    onError: (_error, _name, context) => client.setQueryData(queryKey, context?.before),
    onSettled: () => client.invalidateQueries({ queryKey: latticesKey(ref.workspace) }),
  });
}
