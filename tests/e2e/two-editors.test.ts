import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { draft } from '#common/schemas/lattice';

import { signIn, startTestApp, type SignedIn, type TestApp } from '../helpers/app.js';
import { rockSalt } from '../helpers/cells.js';
import { makeRevision } from '../helpers/lattices.js';

let test: TestApp;
let ana: SignedIn;
let ben: SignedIn;
let path: string;
beforeAll(async () => {
  test = await startTestApp();
  ana = await signIn(test, 'crystallographer');
  ben = await signIn(test, 'crystallographer', ana.workspace);
  path = await makeRevision(ana.agent, ana.workspace);
});
afterAll(() => test.close());

const method = { toleranceRelative: 1e-10, uniformBackground: false };

const openDraft = async ({ agent }: SignedIn) =>
  draft.parse((await agent.get(`${path}/draft`).expect(200)).body);

const edit = ({ agent }: SignedIn, etag: string, a: string) =>
  agent
    .put(`${path}/draft`)
    .set('if-match', etag)
    .send({ cell: rockSalt({ a }), method });

describe('two people who edit the same lattice', () => {
  it('never overwrite each other without knowing', async () => {
    const anas = await openDraft(ana);
    const bens = await openDraft(ben);
    expect(bens.etag).toBe(anas.etag);
    const kept = draft.parse((await edit(ana, anas.etag, '4.20').expect(200)).body);
    const refused = await edit(ben, bens.etag, '4.22').expect(412);
    expect(refused.body.error).toMatchObject({
      code: 'draft.conflict',
      details: { currentEtag: kept.etag },
    });
    const seen = await openDraft(ben);
    expect(seen).toMatchObject({ etag: kept.etag, updatedBy: { id: ana.user.id } });
    const knowingly = draft.parse((await edit(ben, seen.etag, '4.22').expect(200)).body);
    await edit(ana, kept.etag, '4.21').expect(412);
    const saved = await ben.agent
      .post(`${path}/revisions`)
      .set('if-match', knowingly.etag)
      .send({ note: 'Ben’s' })
      .expect(201);
    expect(saved.body).toMatchObject({ number: 2, author: { id: ben.user.id } });
    const late = await ana.agent
      .post(`${path}/revisions`)
      .set('if-match', kept.etag)
      .send({ note: 'Ana’s' });
    expect([late.status, late.body.error.details.currentEtag]).toEqual([412, '"r2-v0"']);
  });
});
