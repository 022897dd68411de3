import type { CellDefinition } from '#common/schemas/cell';
import type { LatticeSummary, RevisionDetail } from '#common/schemas/lattice';

import type { Agent } from './app.js';
import { rockSalt } from './cells.js';

/** Where the lattices of a workspace are. */
export const latticesPath = (workspace: { slug: string }): string =>
  `/api/workspaces/${workspace.slug}/lattices`;

/** Makes a lattice with a draft. */
export async function makeLattice(
  agent: Agent,
  workspace: { slug: string },
  given: { name?: string; cell?: CellDefinition; tags?: string[]; prototype?: string } = {},
): Promise<LatticeSummary> {
  const body = { name: 'Periclase', cell: rockSalt(), ...given };
  const response = await agent.post(latticesPath(workspace)).send(body).expect(201);
  return response.body as LatticeSummary;
}

/** The ETag of the draft as it is now. */
export async function draftEtag(agent: Agent, path: string): Promise<string> {
  return (await agent.get(`${path}/draft`).expect(200)).headers['etag']!;
}

/** Saves the draft, after changing the cell if one is given. */
export async function saveRevision(
  agent: Agent,
  path: string,
  cell?: CellDefinition,
): Promise<RevisionDetail> {
  if (cell !== undefined) {
    const method = { toleranceRelative: 1e-10, uniformBackground: false };
    await agent
      .put(`${path}/draft`)
      .set('if-match', await draftEtag(agent, path))
      .send({ cell, method })
      .expect(200);
  }
  const response = await agent
    .post(`${path}/revisions`)
    .set('if-match', await draftEtag(agent, path))
    .send({ note: 'As measured' })
    .expect(201);
  return response.body as RevisionDetail;
}

/** A new lattice with one saved revision; its address. */
export async function makeRevision(
  agent: Agent,
  workspace: { slug: string },
  cell: CellDefinition = rockSalt(),
): Promise<string> {
  const { id } = await makeLattice(agent, workspace, { cell });
  const path = `${latticesPath(workspace)}/${id}`;
  await saveRevision(agent, path);
  return path;
}
