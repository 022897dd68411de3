import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { annotation, annotationList } from '#common/schemas/review';
import { signIn, startTestApp, type Agent, type SignedIn, type TestApp } from '#tests/helpers/app';
import { rockSalt } from '#tests/helpers/cells';
import { makeWorkspace } from '#tests/helpers/factories';
import { makeRevision, saveRevision } from '#tests/helpers/lattices';

let test: TestApp;
let maker: SignedIn;
let owner: SignedIn;
let reviewer: SignedIn;
let reader: SignedIn;
let path: string;
beforeAll(async () => {
  test = await startTestApp();
  maker = await signIn(test, 'crystallographer');
  owner = await signIn(test, 'owner', maker.workspace);
  reviewer = await signIn(test, 'reviewer', maker.workspace);
  reader = await signIn(test, 'reader', maker.workspace);
  path = await makeRevision(maker.agent, maker.workspace);
});
afterAll(() => test.close());

async function outcome(request: ReturnType<Agent['post']>): Promise<[number, string | undefined]> {
  const { status, body } = await request;
  return [status, body.error?.code];
}

const act = (who: SignedIn, revision: string, verb: string, body: object = {}) =>
  outcome(who.agent.post(`${revision}/${verb}`).send(body));

const reason = { reason: 'Because.' };
const ok = [200, undefined];
const wrongState = [409, 'revision.wrong_state'];

describe('the way through review', () => {
  it('goes only the steps there are', async () => {
    const lattice = await makeRevision(maker.agent, maker.workspace);
    const revision = `${lattice}/revisions/1`;
    for (const [who, verb] of [
      [maker, 'withdraw'],
      [reviewer, 'accept'],
      [reviewer, 'return'],
    ] as const) {
      expect(await act(who, revision, verb, reason)).toEqual(wrongState);
    }
    expect(await act(maker, revision, 'submit')).toEqual(ok);
    expect(await act(maker, revision, 'submit')).toEqual(wrongState);
    expect(await act(maker, revision, 'withdraw')).toEqual(ok);
    expect(await act(maker, revision, 'submit')).toEqual(ok);
    expect(await act(reviewer, revision, 'return', { reason: ' ' })).toEqual([
      400,
      'request.invalid',
    ]);
    expect(await act(reviewer, revision, 'return', reason)).toEqual(ok);
    expect(await act(maker, revision, 'submit')).toEqual(ok);
    expect((await maker.agent.get(revision)).body.decidedBy).toBeNull();
    expect(await act(reviewer, revision, 'accept', {})).toEqual(ok);
    for (const verb of ['submit', 'withdraw'] as const) {
      expect(await act(maker, revision, verb)).toEqual(wrongState);
    }
    expect((await maker.agent.get(lattice)).body.state).toBe('accepted');
  });

  it('is decided once when two decide at the same moment', async () => {
    const revision = `${await makeRevision(maker.agent, maker.workspace)}/revisions/1`;
    await act(maker, revision, 'submit');
    const answers = await Promise.all([
      act(reviewer, revision, 'accept', reason),
      act(owner, revision, 'return', reason),
    ]);
    expect(answers.map(([status]) => status).sort()).toEqual([200, 409]);
  });

  it('is taken by the newest revision, one at a time', async () => {
    const lattice = await makeRevision(maker.agent, maker.workspace);
    await act(maker, `${lattice}/revisions/1`, 'submit');
    await saveRevision(maker.agent, lattice, rockSalt({ a: '4.3' }));
    expect((await maker.agent.get(lattice)).body.state).toBe('draft');
    expect(await act(maker, `${lattice}/revisions/2`, 'submit')).toEqual(wrongState);
    expect(await act(maker, `${lattice}/revisions/1`, 'withdraw')).toEqual(ok);
    expect(await act(maker, `${lattice}/revisions/1`, 'submit')).toEqual(wrongState);
    expect(await act(maker, `${lattice}/revisions/2`, 'submit')).toEqual(ok);
    expect((await maker.agent.get(lattice)).body.state).toBe('in_review');
  });

  it('needs a second person, who neither wrote nor submitted it', async () => {
    const own = `${await makeRevision(owner.agent, owner.workspace)}/revisions/1`;
    await act(maker, own, 'submit');
    expect(await act(owner, own, 'accept', {})).toEqual([403, 'revision.own']);
    const submitted = `${await makeRevision(maker.agent, maker.workspace)}/revisions/1`;
    await act(owner, submitted, 'submit');
    expect(await act(owner, submitted, 'accept', {})).toEqual([403, 'revision.own']);
    expect(await act(owner, submitted, 'return', reason)).toEqual(ok);
    expect(await act(reviewer, own, 'accept', {})).toEqual(ok);
  });

  it('needs none where the workspace says so', async () => {
    const workspace = await makeWorkspace(test.db, { requiresSecondPerson: false });
    const alone = await signIn(test, 'owner', workspace);
    const revision = `${await makeRevision(alone.agent, workspace)}/revisions/1`;
    await act(alone, revision, 'submit');
    expect(await act(alone, revision, 'accept', {})).toEqual(ok);
  });
});

describe('a remark', () => {
  const pin = (who: SignedIn, anchor: object, text = 'Why?', lattice = path) =>
    who.agent.post(`${lattice}/revisions/1/annotations`).send({ anchor, text });

  it.each([
    { kind: 'revision' },
    { kind: 'site', label: 'Mg1' },
    { kind: 'pair', key: 'Mg+2|O-2|2.106' },
    { kind: 'pair', key: 'Mg+2|Mg+2|2.978' },
  ])('is pinned to %j', async (anchor) => {
    const response = await pin(reviewer, anchor).expect(201);
    expect(annotation.parse(response.body).anchor).toEqual(anchor);
  });

  it('is pinned to a pair beyond the ledger’s usual reach', async () => {
    // 2.106 Å times √45 (6, 3, 0): an unlike pair, since the sum of the steps is odd.
    const key = `Mg+2|O-2|${(2.106 * Math.sqrt(45)).toFixed(3)}`;
    const { evaluation } = (await maker.agent.get(`${path}/revisions/1`)).body;
    expect(evaluation.result.pairLedger.reachA).toBeLessThan(2.106 * Math.sqrt(45));
    await pin(reviewer, { kind: 'pair', key }).expect(201);
  });

  it.each([
    [{ kind: 'site', label: 'Mg2' }, 'anchor.label'],
    [{ kind: 'site', label: '' }, 'anchor.label'],
    [{ kind: 'pair', key: 'Mg+2|O-2|2.107' }, 'anchor.key'],
    [{ kind: 'pair', key: 'Mg+2|O-2|1e9' }, 'anchor.key'],
    [{ kind: 'pair', key: 'Mg+2|O-2|-2.106' }, 'anchor.key'],
    [{ kind: 'pair', key: 'nonsense' }, 'anchor.key'],
    [{ kind: 'pair', key: '' }, 'anchor.key'],
  ])('is not pinned to %j', async (anchor, field) => {
    const response = await pin(reviewer, anchor);
    expect([response.status, response.body.error.code]).toEqual([422, 'annotation.bad_anchor']);
    expect(response.body.error.details.fields[0].field).toBe(field);
  });

  it('is not pinned to a pair where there is no ledger', async () => {
    const broken = await makeRevision(
      maker.agent,
      maker.workspace,
      rockSalt({ charges: ['3', '-2'] }),
    );
    const pair = { kind: 'pair', key: 'Mg+3|O-2|2.106' };
    await pin(reviewer, pair, 'Why?', broken).expect(422);
    await pin(reviewer, { kind: 'site', label: 'Mg1' }, 'Why?', broken).expect(201);
  });

  it('gets the next number of its revision, also when many come at once', async () => {
    const lattice = await makeRevision(maker.agent, maker.workspace);
    const people = [owner, reviewer, maker, reader];
    const made = await Promise.all(
      [...people, ...people, ...people].map((who, i) =>
        pin(who, { kind: 'revision' }, `Remark ${i}`, lattice),
      ),
    );
    const numbers = made.map(({ body }): number => body.number).sort((a, b) => a - b);
    expect(numbers).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12]);
    const response = await reader.agent.get(`${lattice}/revisions/1/annotations`).expect(200);
    const listed = annotationList.parse(response.body).items.map(({ number }) => number);
    expect(listed).toEqual(numbers);
    expect((await reader.agent.get(lattice)).body.openRemarks).toBe(12);
  });

  it('is answered in order, settled and opened again', async () => {
    const { id } = (await pin(reader, { kind: 'revision' }).expect(201)).body;
    const remark = `${path}/annotations/${id}`;
    for (const [who, text] of [
      [maker, 'One'],
      [reader, 'Two'],
      [owner, 'Three'],
    ] as const) {
      await who.agent.post(`${remark}/replies`).send({ text }).expect(201);
    }
    const resolved = await reviewer.agent.post(`${remark}/resolve`).expect(200);
    expect(annotation.parse(resolved.body)).toMatchObject({
      resolvedBy: { id: reviewer.user.id },
      replies: [{ text: 'One' }, { text: 'Two' }, { text: 'Three' }],
    });
    const again = await owner.agent.post(`${remark}/resolve`).expect(200);
    expect(again.body).toEqual(resolved.body);
    const reopened = await owner.agent.post(`${remark}/reopen`).expect(200);
    expect(reopened.body).toMatchObject({ resolvedAt: null, resolvedBy: null });
  });

  it('is settled by a crystallographer only where it is their own', async () => {
    const theirs = (await pin(reviewer, { kind: 'revision' })).body.id;
    const own = (await pin(maker, { kind: 'revision' })).body.id;
    const settle = (id: string) => outcome(maker.agent.post(`${path}/annotations/${id}/resolve`));
    expect(await settle(theirs)).toEqual([403, 'auth.forbidden']);
    expect(await settle(own)).toEqual(ok);
  });

  it('is found through its own lattice only', async () => {
    const { id } = (await pin(reviewer, { kind: 'revision' })).body;
    const other = await makeRevision(maker.agent, maker.workspace);
    for (const verb of ['resolve', 'reopen'] as const) {
      expect(await outcome(owner.agent.post(`${other}/annotations/${id}/${verb}`))).toEqual([
        404,
        'annotation.not_found',
      ]);
    }
    await owner.agent.post(`${path}/annotations/nonsense/replies`).send({ text: 'x' }).expect(404);
  });

  it('needs a text', async () => {
    for (const text of ['', '   ', 'x'.repeat(4001)]) {
      await pin(reviewer, { kind: 'revision' }, text).expect(400);
    }
  });

  it('is left to others where readers may not comment', async () => {
    const workspace = await makeWorkspace(test.db, { readersMayComment: false });
    const author = await signIn(test, 'owner', workspace);
    const silent = await signIn(test, 'reader', workspace);
    const lattice = await makeRevision(author.agent, workspace);
    await pin(silent, { kind: 'revision' }, 'Why?', lattice).expect(403);
    await silent.agent.get(`${lattice}/revisions/1/annotations`).expect(200);
  });
});
