import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { latticeSummary, shelfPage } from '#common/schemas/lattice';
import { signIn, startTestApp, type SignedIn, type TestApp } from '#tests/helpers/app';
import { rockSalt } from '#tests/helpers/cells';
import { latticesPath, makeLattice, makeRevision } from '#tests/helpers/lattices';

import { RetentionTask } from './retention.task.js';

let test: TestApp;
beforeAll(async () => {
  test = await startTestApp();
});
afterAll(() => test.close());

const dayMs = 24 * 3_600_000;

async function names(person: SignedIn, query: string): Promise<string[]> {
  const response = await person.agent.get(`${latticesPath(person.workspace)}?${query}`).expect(200);
  return shelfPage.parse(response.body).items.map(({ name }) => name);
}

describe('the shelf', () => {
  let person: SignedIn;
  beforeAll(async () => {
    person = await signIn(test, 'crystallographer');
    const salt = rockSalt({ cation: 'Na', anion: 'Cl', a: '5.64056', charges: ['1', '-1'] });
    const bad = rockSalt({ charges: ['3', '-2'] });
    const cells = [
      { name: 'Periclase', tags: ['oxide', 'Separator'] },
      { name: 'Halite', cell: salt, tags: ['halide'] },
      { name: 'a broken one', cell: bad },
    ];
    for (const given of cells) {
      await makeLattice(person.agent, person.workspace, given);
    }
  });

  it.each([
    ['sort=name&order=asc', ['a broken one', 'Halite', 'Periclase']],
    ['sort=name&order=desc', ['Periclase', 'Halite', 'a broken one']],
    ['sort=energy&order=asc', ['Periclase', 'Halite', 'a broken one']],
    ['sort=energy&order=desc', ['Halite', 'Periclase', 'a broken one']],
    ['sort=formula&order=desc', ['Halite', 'a broken one', 'Periclase']],
    ['sort=updated&order=desc', ['a broken one', 'Halite', 'Periclase']],
    ['sort=author&order=asc', ['Periclase', 'Halite', 'a broken one']],
    ['sort=state&order=asc', ['Periclase', 'Halite', 'a broken one']],
    ['sort=spaceGroup&order=asc', ['Periclase', 'Halite', 'a broken one']],
    ['sort=madelung&order=desc&search=a', ['Halite', 'Periclase', 'a broken one']],
  ])('orders by %s', async (query, expected) => {
    const found = await names(person, query);
    if (/sort=(formula|madelung)/.test(query)) {
      // Equal values come in the order of their ids, so only the different one is certain.
      expect(found.toSorted()).toEqual(expected.toSorted());
      expect(query.includes('madelung') ? found.at(-1) : found[0]).toBe(
        query.includes('madelung') ? 'a broken one' : 'Halite',
      );
    } else {
      expect(found).toEqual(expected);
    }
  });

  it.each([
    ['peri', ['Periclase']],
    ['MGO', ['Periclase', 'a broken one']],
    ['separator', ['Periclase']],
    ['F m -3 m halite', ['Halite']],
    ['Fm-3m', ['Halite', 'Periclase', 'a broken one']],
    ['225', ['Halite', 'Periclase', 'a broken one']],
    ['22', []],
    ['%', []],
    ['_', []],
    ['nothing', []],
  ])('finds %s', async (search, expected) => {
    const found = await names(person, `sort=name&order=asc&search=${encodeURIComponent(search)}`);
    expect(found.toSorted()).toEqual(expected);
  });

  it('pages and counts', async () => {
    const path = `${latticesPath(person.workspace)}?sort=name&order=asc&pageSize=2`;
    const second = shelfPage.parse((await person.agent.get(`${path}&page=2`)).body);
    expect(second).toMatchObject({
      page: 2,
      pageSize: 2,
      total: 3,
      items: [{ name: 'Periclase' }],
    });
    const beyond = shelfPage.parse((await person.agent.get(`${path}&page=9`)).body);
    expect(beyond).toMatchObject({ total: 3, items: [] });
  });

  it('says why there is no energy, and what the cell is nonetheless', async () => {
    const response = await person.agent.get(`${latticesPath(person.workspace)}?search=broken`);
    expect(shelfPage.parse(response.body).items).toMatchObject([
      { problemCode: 'cell.not_neutral', formula: 'MgO', energyEvPerFormulaUnit: null },
    ]);
  });

  it('filters by state', async () => {
    await makeRevision(person.agent, person.workspace).then((path) =>
      person.agent.post(`${path}/revisions/1/submit`).expect(200),
    );
    expect(await names(person, 'state=in_review')).toEqual(['Periclase']);
    expect(await names(person, 'state=accepted')).toEqual([]);
  });

  it('shows nobody else’s lattices', async () => {
    const stranger = await signIn(test, 'owner');
    expect(await names(stranger, '')).toEqual([]);
  });

  it.each(['page=0', 'pageSize=101', 'sort=colour', 'order=up', 'state=open', 'search=%00'])(
    'refuses %s',
    async (query) => {
      const response = await person.agent.get(`${latticesPath(person.workspace)}?${query}`);
      expect([response.status, response.body.error.code]).toEqual([400, 'request.invalid']);
    },
  );
});

describe('a lattice', () => {
  it('takes a name and tags, each once', async () => {
    const { agent, workspace } = await signIn(test, 'crystallographer');
    const { id } = await makeLattice(agent, workspace);
    const path = `${latticesPath(workspace)}/${id}`;
    const response = await agent.patch(path).send({ name: ' Trial 4 ', tags: ['a', 'b', 'A'] });
    expect(latticeSummary.parse(response.body)).toMatchObject({
      name: 'Trial 4',
      tags: ['A', 'b'],
    });
    const same = await agent.patch(path).send({}).expect(200);
    expect(same.body.updatedAt).toBe(response.body.updatedAt);
    await agent.patch(path).send({ name: ' ' }).expect(400);
  });

  it('may start from a cell that can’t be read yet', async () => {
    const { agent, workspace } = await signIn(test, 'crystallographer');
    const summary = await makeLattice(agent, workspace, { cell: rockSalt({ a: 'longer' }) });
    expect(summary).toMatchObject({ problemCode: 'cell.expression', formula: null });
  });

  it('can be taken back for 30 days, and not longer', async () => {
    const { agent, workspace } = await signIn(test, 'crystallographer');
    const path = await makeRevision(agent, workspace);
    await agent.delete(path).expect(200);
    for (const gone of ['draft', 'revisions', 'revisions/1', 'shares']) {
      expect([gone, (await agent.get(`${path}/${gone}`)).status]).toEqual([gone, 404]);
    }
    expect((await agent.get(path).expect(200)).body.deletedAt).not.toBeNull();
    await agent.patch(path).send({ name: 'x' }).expect(404);
    await agent.delete(path).expect(404);
    const shelf = latticesPath(workspace);
    expect((await agent.get(shelf)).body.total).toBe(0);
    expect((await agent.get(`${shelf}?deleted=true`)).body.total).toBe(1);
    await agent.post(`${path}/restore`).expect(200);
    expect((await agent.post(`${path}/restore`).expect(200)).body.deletedAt).toBeNull();
    expect((await agent.get(`${path}/revisions/1`)).status).toBe(200);

    await agent.delete(path).expect(200);
    const late = new Date(Date.now() - 31 * dayMs).toISOString();
    await test.db.execute(
      `update lattices set deleted_at = '${late}' where deleted_at is not null`,
    );
    await agent.post(`${path}/restore`).expect(404);
    await test.app.get(RetentionTask).run();
    await agent.get(path).expect(404);
  });

  it('leaves with its drafts and revisions, and what others have stays', async () => {
    const { agent, workspace } = await signIn(test, 'crystallographer');
    const gone = await makeRevision(agent, workspace, rockSalt({ a: '4.9' }));
    const kept = await makeRevision(agent, workspace, rockSalt({ a: '4.95' }));
    const { evaluationHash } = (await agent.get(`${gone}/revisions/1`)).body;
    await agent.delete(gone).expect(200);
    const old = new Date(Date.now() - 40 * dayMs).toISOString();
    await test.db.execute(`update lattices set deleted_at = '${old}' where deleted_at is not null`);
    await test.db.execute('alter table evaluations disable trigger evaluations_immutable');
    await test.db.execute(`update evaluations set computed_at = '${old}'`);
    await test.db.execute('alter table evaluations enable trigger evaluations_immutable');
    await test.app.get(RetentionTask).run();
    const evaluations = `/api/workspaces/${workspace.slug}/evaluations`;
    await agent.get(`${evaluations}/${evaluationHash}`).expect(404);
    const { body } = await agent.get(`${kept}/revisions/1`).expect(200);
    expect(body.evaluation.hash).toBe(body.evaluationHash);
  });
});
