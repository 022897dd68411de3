import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { createLatticeRequest, draft, latticeSummary, revisionList } from '#common/schemas/lattice';
import { sessionState } from '#common/schemas/auth';

import { startProduct, type Product } from './product.js';

let product: Product;

beforeAll(async () => {
  product = await startProduct();
});

afterAll(async () => {
  await product.stop();
});

/** A signed-in person's calls, as the client makes them. */
async function signIn(role: string) {
  const visitor = sessionState.parse(await (await fetch(`${product.origin}/api/session`)).json());
  const person = visitor.demo?.people.find((candidate) => candidate.role === role);
  const answer = await fetch(`${product.origin}/api/session`, {
    method: 'POST',
    headers: { 'content-type': 'application/json', origin: product.origin },
    body: JSON.stringify({ email: person?.email, password: visitor.demo?.password }),
  });
  const cookie = answer.headers
    .getSetCookie()
    .map((line) => line.split(';')[0])
    .join('; ');
  const workspace = sessionState.parse(await answer.json()).user?.memberships[0]?.workspaceSlug;
  return (method: string, path: string, body?: unknown, ifMatch?: string) =>
    fetch(`${product.origin}/api/workspaces/${workspace}${path}`, {
      method,
      headers: {
        cookie,
        origin: product.origin,
        'content-type': 'application/json',
        ...(ifMatch === undefined ? {} : { 'if-match': ifMatch }),
      },
      body: body === undefined ? undefined : JSON.stringify(body),
    });
}

/** Magnesia with an edge of its own, so that every save is a new cell and a new evaluation. */
function magnesia(edgeA: number) {
  const site = { x: '0', y: '0', z: '0', occupancy: '1' };
  return {
    lattice: { a: `${edgeA}`, b: `${edgeA}`, c: `${edgeA}`, alpha: '90', beta: '90', gamma: '90' },
    symmetry: { kind: 'setting' as const, hallNumber: 523 },
    parameters: [],
    sites: [
      { ...site, label: 'Mg1', element: 'Mg', charge: '2' },
      { ...site, label: 'O1', element: 'O', charge: '-2', x: '1/2', y: '1/2', z: '1/2' },
    ],
  };
}

describe('a server killed in the middle of its work', () => {
  it('keeps every save it acknowledged, and starts again by itself', async () => {
    const call = await signIn('crystallographer');
    const edge = (n: number) => magnesia(4.2 + n / 1000);
    const created = latticeSummary.parse(
      await (
        await call('POST', '/lattices', createLatticeRequest.parse({ name: 'Kept', cell: edge(0) }))
      ).json(),
    );
    const acknowledged: number[] = [];
    const saveForever = async () => {
      for (let n = 1; ; n += 1) {
        const current = draft.parse(
          await (await call('GET', `/lattices/${created.id}/draft`)).json(),
        );
        const put = await call(
          'PUT',
          `/lattices/${created.id}/draft`,
          { cell: edge(n), method: current.method },
          current.etag,
        );
        const saved = await call(
          'POST',
          `/lattices/${created.id}/revisions`,
          { note: `save ${n}` },
          put.headers.get('etag') ?? '',
        );
        expect(saved.status).toBe(201);
        acknowledged.push(((await saved.json()) as { number: number }).number);
      }
    };
    const saving = saveForever().catch((error: unknown) => error);
    await expect.poll(() => acknowledged.length, { timeout: 30_000 }).toBeGreaterThan(5);
    await product.kill();
    // The loop ends because the connection does, not because an expectation failed.
    expect(String(await saving)).toMatch(/fetch failed|terminated|other side closed/);

    await product.restart();
    const again = await signIn('crystallographer');
    const kept = revisionList.parse(
      await (await again('GET', `/lattices/${created.id}/revisions`)).json(),
    );
    const numbers = kept.items.map((revision) => revision.number);
    expect(numbers).toEqual(expect.arrayContaining(acknowledged));
    // At most the one that was under way may be there without an answer.
    expect(numbers.length - acknowledged.length).toBeLessThanOrEqual(1);
    expect(kept.items.every((revision) => revision.evaluationHash !== null)).toBe(true);
  });
});
