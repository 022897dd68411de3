import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';

import { latticeSummary, type CreateLatticeRequest } from '#common/schemas/lattice';
import {
  appliedPrototype,
  prototypeList,
  readCifResponse,
  type ApplyPrototypeRequest,
} from '#common/schemas/prototype';
import { api } from '#client/lib/api-client.ts';
import { latticesKey } from '#client/lib/query-keys.ts';

/** The structure types a cell can start from; they change with the server's version only. */
export const prototypesQuery = queryOptions({
  queryKey: ['prototypes'],
  queryFn: ({ signal }) => api.get('/prototypes', { schema: prototypeList, signal }),
  staleTime: Infinity,
  select: (list) => list.items,
});

/** A structure type filled with these ions, its lattice parameters guessed from ionic radii. */
export const appliedPrototypeQuery = (id: string, ions: ApplyPrototypeRequest['ions']) =>
  queryOptions({
    queryKey: ['prototypes', id, 'applied', ions],
    queryFn: ({ signal }) =>
      api.post(`/prototypes/${id}/apply`, { schema: appliedPrototype, body: { ions }, signal }),
    staleTime: Infinity,
  });

/** Reads the text of a CIF; its failure names the line. */
export function useReadCif() {
  return useMutation({
    mutationFn: (text: string) =>
      api.post('/cif/read', { schema: readCifResponse, body: { text } }),
  });
}

/** Creates a lattice with its first draft. */
export function useCreateLattice(workspace: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: CreateLatticeRequest) =>
      api.post(`/workspaces/${workspace}/lattices`, { schema: latticeSummary, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: latticesKey(workspace) }),
  });
}
