import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { draft } from '#common/schemas/lattice';
import { signIn, startTestApp, type SignedIn, type TestApp } from '#tests/helpers/app';
import { rockSalt } from '#tests/helpers/cells';
import { draftEtag, latticesPath, makeLattice, makeRevision } from '#tests/helpers/lattices';

let test: TestApp;
let ana: SignedIn;
let ben: SignedIn;
beforeAll(async () => {
  test = await startTestApp();
  ana = await signIn(test, 'crystallographer');
  ben = await signIn(test, 'crystallographer', ana.workspace);
});
afterAll(() => test.close());

const method = { toleranceRelative: 1e-10, uniformBackground: false };
const edit = (a: string) => ({ cell: rockSalt({ a }), method });

const put = (person: SignedIn, path: string, etag: string, a: string) =>
  person.agent.put(`${path}/draft`).set('if-match', etag).send(edit(a));

async function freshLattice(): Promise<string> {
  const { id } = await makeLattice(ana.agent, ana.workspace);
  return `${latticesPath(ana.workspace)}/${id}`;
}

describe('a draft', () => {
  it('is the newest revision while nothing is edited', async () => {
    const path = await makeRevision(ana.agent, ana.workspace);
    const response = await ben.agent.get(`${path}/draft`).expect(200);
    expect(draft.parse(response.body)).toMatchObject({
      etag: '"r1-v0"',
      baseRevision: 1,
      isChanged: false,
      cell: rockSalt(),
      updatedAt: null,
      updatedBy: null,
    });
    expect(response.headers['etag']).toBe('"r1-v0"');
  });

  it('says who edited it last, and gets a new version each time', async () => {
    const path = await freshLattice();
    const etag = await draftEtag(ana.agent, path);
    const response = await put(ben, path, etag, '4.3').expect(200);
    const body = draft.parse(response.body);
    expect(body).toMatchObject({ isChanged: true, updatedBy: { id: ben.user.id } });
    expect(body.etag).not.toBe(etag);
    expect(response.headers['etag']).toBe(body.etag);
    expect((await ana.agent.get(`${path}/draft`)).body).toEqual(response.body);
  });

  it('updates the shelf while no revision is saved', async () => {
    const path = await freshLattice();
    const before = (await ana.agent.get(path)).body.energyEvPerFormulaUnit.value;
    await put(ana, path, await draftEtag(ana.agent, path), '2*4.212').expect(200);
    const after = (await ana.agent.get(path)).body.energyEvPerFormulaUnit.value;
    expect(after / before).toBeCloseTo(0.5, 9);
  });

  it('leaves the shelf alone once a revision is saved', async () => {
    const path = await makeRevision(ana.agent, ana.workspace);
    const before = (await ana.agent.get(path)).body.energyEvPerFormulaUnit;
    await put(ana, path, '"r1-v0"', '5').expect(200);
    const after = (await ana.agent.get(path)).body;
    expect(after.energyEvPerFormulaUnit).toEqual(before);
    expect(after.hasDraft).toBe(true);
  });

  it('needs If-Match to be changed', async () => {
    const path = await freshLattice();
    const answers = [
      await ana.agent.put(`${path}/draft`).send(edit('4.3')),
      await ana.agent.delete(`${path}/draft`),
      await ana.agent.post(`${path}/revisions`).send({}),
    ];
    for (const { status, body } of answers) {
      expect([status, body.error.code]).toEqual([428, 'request.if_match_missing']);
    }
  });

  it('goes to the first of two editors; the second hears the current version', async () => {
    const path = await freshLattice();
    const etag = await draftEtag(ana.agent, path);
    const first = await put(ana, path, etag, '4.1').expect(200);
    const second = await put(ben, path, etag, '4.2');
    expect([second.status, second.body.error.code]).toEqual([412, 'draft.conflict']);
    expect(second.body.error.details.currentEtag).toBe(first.body.etag);
    expect((await ana.agent.get(`${path}/draft`)).body.cell.lattice.a).toBe('4.1');
  });

  it('goes to exactly one of many at the same moment', async () => {
    const path = await freshLattice();
    const etag = await draftEtag(ana.agent, path);
    const answers = await Promise.all(
      Array.from({ length: 8 }, (_, i) => put(i % 2 ? ana : ben, path, etag, `4.${i + 1}`)),
    );
    const statuses = answers.map(({ status }) => status).sort();
    expect(statuses).toEqual([200, 412, 412, 412, 412, 412, 412, 412]);
    const winner = answers.find(({ status }) => status === 200)!;
    expect((await ana.agent.get(`${path}/draft`)).body.cell).toEqual(winner.body.cell);
  });

  it('takes the very edit again whose answer was lost', async () => {
    const path = await freshLattice();
    const etag = await draftEtag(ana.agent, path);
    const first = await put(ana, path, etag, '4.1').expect(200);
    const again = await put(ana, path, etag, '4.1').expect(200);
    expect(again.body).toEqual(first.body);
    await put(ben, path, etag, '4.1').expect(412);
  });

  it('never gets a version it had before, so that nobody overwrites what they have not seen', async () => {
    const path = await makeRevision(ana.agent, ana.workspace);
    const first = (await put(ana, path, '"r1-v0"', '4.1').expect(200)).body.etag;
    await ben.agent.delete(`${path}/draft`).set('if-match', first).expect(200);
    const second = (await put(ben, path, '"r1-v0"', '4.2').expect(200)).body.etag;
    expect(second).not.toBe(first);
    await put(ana, path, first, '4.3').expect(412);
  });

  it('is thrown away for the newest revision', async () => {
    const path = await makeRevision(ana.agent, ana.workspace);
    const { etag } = (await put(ana, path, '"r1-v0"', '4.1').expect(200)).body;
    await ben.agent.delete(`${path}/draft`).set('if-match', '"r1-v0"').expect(412);
    const left = await ana.agent.delete(`${path}/draft`).set('if-match', etag).expect(200);
    expect(draft.parse(left.body)).toMatchObject({ etag: '"r1-v0"', isChanged: false });
    await ana.agent.delete(`${path}/draft`).set('if-match', '"r1-v0"').expect(200);
  });

  it('is not thrown away when nothing would be left', async () => {
    const path = await freshLattice();
    const etag = await draftEtag(ana.agent, path);
    const response = await ana.agent.delete(`${path}/draft`).set('if-match', etag);
    expect([response.status, response.body.error.code]).toEqual([404, 'draft.not_found']);
  });

  it('may hold a cell that can’t be read', async () => {
    const path = await freshLattice();
    await put(ana, path, await draftEtag(ana.agent, path), '1/+').expect(200);
    expect((await ana.agent.get(path)).body.problemCode).toBe('cell.expression');
  });
});
