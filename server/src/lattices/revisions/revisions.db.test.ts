import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { revisionDetail, revisionList } from '#common/schemas/lattice';
import { signIn, startTestApp, type SignedIn, type TestApp } from '#tests/helpers/app';
import { rockSalt } from '#tests/helpers/cells';
import {
  draftEtag,
  latticesPath,
  makeLattice,
  makeRevision,
  saveRevision,
} from '#tests/helpers/lattices';

let test: TestApp;
let person: SignedIn;
beforeAll(async () => {
  test = await startTestApp();
  person = await signIn(test, 'crystallographer');
});
afterAll(() => test.close());

const save = (path: string, etag: string) =>
  person.agent.post(`${path}/revisions`).set('if-match', etag).send({ note: '' });

async function latticeWith(cell = rockSalt()): Promise<string> {
  const { id } = await makeLattice(person.agent, person.workspace, { cell });
  return `${latticesPath(person.workspace)}/${id}`;
}

describe('a revision', () => {
  it('keeps cell, method, note and evaluation as they were', async () => {
    const path = await makeRevision(person.agent, person.workspace);
    const before = (await person.agent.get(`${path}/revisions/1`)).body;
    await saveRevision(person.agent, path, rockSalt({ a: '4.3' }));
    const after = (await person.agent.get(`${path}/revisions/1`)).body;
    expect(after).toEqual(before);
    expect(revisionDetail.parse(after)).toMatchObject({ number: 1, note: 'As measured' });
    const list = revisionList.parse((await person.agent.get(`${path}/revisions`)).body);
    expect(list.items.map(({ number }) => number)).toEqual([2, 1]);
    expect((await person.agent.get(path)).body).toMatchObject({ headRevision: 2, hasDraft: false });
  });

  it.each([
    `cell = '{}'`,
    `method = '{}'`,
    `note = 'other'`,
    'number = 7',
    'evaluation_hash = null',
    'energy_ev_per_formula_unit = 1',
    'created_at = now()',
  ])('does not let the database set %s', async (change) => {
    await makeRevision(person.agent, person.workspace);
    await expect(test.db.execute(`update revisions set ${change}`)).rejects.toMatchObject({
      cause: { constraint: 'revisions_immutable' },
    });
  });

  it.each([
    [`state = 'in_review'`, 'revisions_submitted'],
    [`state = 'accepted'`, 'revisions_decided'],
    [
      `state = 'returned', submitted_at = now(), submitted_by_id = author_id, decided_at = now(),
        decided_by_id = author_id`,
      'revisions_returned_with_reason',
    ],
  ])('does not let the database set %s', async (change, constraint) => {
    await expect(test.db.execute(`update revisions set ${change}`)).rejects.toMatchObject({
      cause: { constraint },
    });
  });

  it('is not saved twice from the same draft', async () => {
    const path = await latticeWith();
    const etag = await draftEtag(person.agent, path);
    const answers = await Promise.all([1, 2, 3, 4].map(() => save(path, etag)));
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 412, 412, 412]);
    expect((await person.agent.get(`${path}/revisions`)).body.items).toHaveLength(1);
  });

  it('is not saved from a draft that someone has changed meanwhile', async () => {
    const path = await latticeWith();
    const etag = await draftEtag(person.agent, path);
    await saveRevision(person.agent, path, rockSalt({ a: '4.3' }));
    const response = await save(path, etag);
    expect([response.status, response.body.error.code]).toEqual([412, 'draft.conflict']);
    expect(response.body.error.details.currentEtag).toBe('"r1-v0"');
  });

  it('is not saved when nothing has changed', async () => {
    const path = await makeRevision(person.agent, person.workspace);
    const untouched = await save(path, '"r1-v0"');
    expect([untouched.status, untouched.body.error.code]).toEqual([409, 'revision.unchanged']);
    const method = { toleranceRelative: 1e-10, uniformBackground: false };
    const put = await person.agent
      .put(`${path}/draft`)
      .set('if-match', '"r1-v0"')
      .send({ cell: rockSalt(), method })
      .expect(200);
    const same = await save(path, put.body.etag);
    expect([same.status, same.body.error.code]).toEqual([409, 'revision.unchanged']);
  });

  it('is not saved from a cell that can’t be read; the fields say why', async () => {
    const path = await latticeWith(rockSalt({ a: 'wide', cation: 'Xx' }));
    const response = await save(path, await draftEtag(person.agent, path));
    expect(response.status).toBe(422);
    const fields = response.body.error.details.fields.map(({ field }: { field: string }) => field);
    expect(fields).toEqual(expect.arrayContaining(['cell.lattice.a', 'cell.sites.0.element']));
  });

  it('is saved with the reason when the cell can’t be evaluated', async () => {
    const path = await latticeWith(rockSalt({ charges: ['3', '-2'] }));
    const saved = await saveRevision(person.agent, path);
    expect(saved).toMatchObject({
      formula: 'MgO',
      evaluation: null,
      evaluationHash: null,
      energyEvPerFormulaUnit: null,
      evaluationProblem: { code: 'cell.not_neutral' },
    });
    expect(saved.evaluationProblem!.fields[0]!.field).toBe('cell.sites.0.charge');
    expect((await person.agent.get(path)).body.problemCode).toBe('cell.not_neutral');
  });

  it.each(['0', '2', '-1', '1.0', '01', 'one', '9999999999', '%00'])(
    'is not found by the number %s',
    async (number) => {
      const path = await makeRevision(person.agent, person.workspace);
      const response = await person.agent.get(`${path}/revisions/${number}`);
      expect([response.status, response.body.error.code]).toEqual([404, 'revision.not_found']);
    },
  );
});
