import { latticesKey } from '#client/lib/query-keys.ts';

/** Whose lattice: the workspace's address name and the lattice's id. */
export interface LatticeRef {
  readonly workspace: string;
  readonly latticeId: string;
}

/** Stem of every query about one lattice. */
export const latticeKey = ({ workspace, latticeId }: LatticeRef) =>
  [...latticesKey(workspace), latticeId] as const;

/** Address of a lattice below /api. */
export const latticePath = ({ workspace, latticeId }: LatticeRef): string =>
  `/workspaces/${workspace}/lattices/${latticeId}`;
