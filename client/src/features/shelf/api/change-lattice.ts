import { useMutation, useQueryClient, type UseMutationResult } from '@tanstack/react-query';
import type { z } from 'zod';

import {
  latticeSummary,
  type LatticeSummary,
  type updateLatticeRequest,
} from '#common/schemas/lattice';
import { done } from '#common/schemas/shared';
import { useToast } from '#client/components/toast.tsx';
import { api } from '#client/lib/api-client.ts';
import { messageOf } from '#client/lib/api-error.ts';
import { latticesKey } from '#client/lib/query-keys.ts';

type LatticeChange = z.infer<typeof updateLatticeRequest>;

function useRefresh(workspace: string): () => Promise<void> {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: latticesKey(workspace) });
}

/** Renames a lattice or sets its tags. */
export function useUpdateLattice(
  workspace: string,
  lattice: string,
): UseMutationResult<LatticeSummary, unknown, LatticeChange> {
  const refresh = useRefresh(workspace);
  return useMutation({
    mutationFn: (body: LatticeChange) =>
      api.patch(`/workspaces/${workspace}/lattices/${lattice}`, { schema: latticeSummary, body }),
    onSuccess: refresh,
  });
}

/** Puts a deleted lattice back on the shelf, and says so. */
export function useRestoreLattice(
  workspace: string,
): (lattice: { id: string; name: string }) => void {
  const refresh = useRefresh(workspace);
  const show = useToast();
  const { mutate } = useMutation({
    mutationFn: ({ id }: { id: string; name: string }) =>
      api.post(`/workspaces/${workspace}/lattices/${id}/restore`, { schema: latticeSummary }),
    onSuccess: async (_, { name }) => {
      await refresh();
      show({ message: `“${name}” is back on the shelf` });
    },
    onError: (error) => show({ message: messageOf(error), tone: 'failure' }),
  });
  return mutate;
}

/** Takes a lattice off the shelf; the message that follows holds the way back. */
export function useDeleteLattice(
  workspace: string,
): (lattice: { id: string; name: string }) => void {
  const refresh = useRefresh(workspace);
  const restore = useRestoreLattice(workspace);
  const show = useToast();
  const { mutate } = useMutation({
    mutationFn: ({ id }: { id: string; name: string }) =>
      api.delete(`/workspaces/${workspace}/lattices/${id}`, { schema: done }),
    onSuccess: async (_, lattice) => {
      await refresh();
      show({
        message: `“${lattice.name}” is deleted`,
        action: { label: 'Undo', onAction: () => restore(lattice) },
      });
    },
    onError: (error) => show({ message: messageOf(error), tone: 'failure' }),
  });
  return mutate;
}
