import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import {
  latticeSummary,
  revisionDetail,
  revisionSummary,
  shelfPage,
} from '#common/schemas/lattice';
import { appliedPrototype } from '#common/schemas/prototype';
import { annotation, annotationList } from '#common/schemas/review';
import { createdShare, sharedRevision, shareList } from '#common/schemas/sharing';
import { signIn, startTestApp, type SignedIn, type TestApp } from '../helpers/app.js';
import { magnesiaEnergyEv } from '../helpers/cells.js';
import { draftEtag, latticesPath } from '../helpers/lattices.js';

let test: TestApp;
let maker: SignedIn;
let reviewer: SignedIn;
let shelf: string;
let lattice: string;
beforeAll(async () => {
  test = await startTestApp();
  maker = await signIn(test, 'crystallographer');
  reviewer = await signIn(test, 'reviewer', maker.workspace);
  shelf = latticesPath(maker.workspace);
});
afterAll(() => test.close());

describe('the main job, from structure type to shared digits', () => {
  it('starts from rock salt with Mg²⁺ and O²⁻ at 4.212 Å', async () => {
    const ions = [
      { element: 'Mg', charge: 2 },
      { element: 'O', charge: -2 },
    ];
    const applied = appliedPrototype.parse(
      (await maker.agent.post('/api/prototypes/rock-salt/apply').send({ ions }).expect(200)).body,
    );
    const edges = { a: '4.212', b: '4.212', c: '4.212' };
    const cell = { ...applied.cell, lattice: { ...applied.cell.lattice, ...edges } };
    const response = await maker.agent
      .post(shelf)
      .send({ name: 'Periclase, trial 3', cell, prototype: applied.prototype, tags: ['oxide'] })
      .expect(201);
    const summary = latticeSummary.parse(response.body);
    lattice = `${shelf}/${summary.id}`;
    expect(summary).toMatchObject({
      formula: 'MgO',
      spaceGroupNumber: 225,
      prototype: 'rock-salt',
      state: 'draft',
      headRevision: 0,
      hasDraft: true,
    });
    const { value, bound } = summary.energyEvPerFormulaUnit!;
    expect(Math.abs(value - magnesiaEnergyEv)).toBeLessThanOrEqual(bound);
    expect(value.toFixed(5)).toBe('-47.79546');
  });

  it('saves a revision with its evaluation', async () => {
    const response = await maker.agent
      .post(`${lattice}/revisions`)
      .set('if-match', await draftEtag(maker.agent, lattice))
      .send({ note: 'First try' })
      .expect(201);
    const revision = revisionDetail.parse(response.body);
    expect(revision).toMatchObject({ number: 1, state: 'draft', note: 'First try' });
    expect(revision.evaluation!.hash).toBe(revision.evaluationHash);
    expect(response.headers['etag']).toBe('"r1-v0"');
    expect(await draftEtag(maker.agent, lattice)).toBe('"r1-v0"');
  });

  it('submits it, and the reviewer pins remarks and returns it', async () => {
    const revision = `${lattice}/revisions/1`;
    const submitted = await maker.agent.post(`${revision}/submit`).expect(200);
    expect(revisionSummary.parse(submitted.body)).toMatchObject({
      state: 'in_review',
      submittedBy: { id: maker.user.id },
    });
    const anchors = [
      { kind: 'pair', key: 'Mg+2|O-2|2.106' },
      { kind: 'site', label: 'O1' },
      { kind: 'revision' },
    ];
    for (const [index, anchor] of anchors.entries()) {
      const made = await reviewer.agent
        .post(`${revision}/annotations`)
        .send({ anchor, text: `Remark ${index + 1}` })
        .expect(201);
      expect(annotation.parse(made.body)).toMatchObject({ anchor, number: index + 1 });
    }
    const returned = await reviewer.agent
      .post(`${revision}/return`)
      .send({ reason: 'Where does the edge come from?' })
      .expect(200);
    expect(revisionSummary.parse(returned.body)).toMatchObject({
      state: 'returned',
      decidedBy: { id: reviewer.user.id },
      decisionReason: 'Where does the edge come from?',
    });
    const page = shelfPage.parse((await maker.agent.get(shelf)).body);
    expect(page.items[0]).toMatchObject({ state: 'returned', openRemarks: 3 });
  });

  it('answers, settles and submits again, and the reviewer accepts', async () => {
    const revision = `${lattice}/revisions/1`;
    const list = annotationList.parse((await maker.agent.get(`${revision}/annotations`)).body);
    const [first] = list.items;
    const remark = `${lattice}/annotations/${first!.id}`;
    const replied = await maker.agent
      .post(`${remark}/replies`)
      .send({ text: 'Powder data.' })
      .expect(201);
    expect(annotation.parse(replied.body).replies).toMatchObject([
      { text: 'Powder data.', author: { id: maker.user.id } },
    ]);
    const resolved = await reviewer.agent.post(`${remark}/resolve`).expect(200);
    expect(annotation.parse(resolved.body).resolvedBy).toMatchObject({ id: reviewer.user.id });
    await maker.agent.post(`${revision}/submit`).expect(200);
    const accepted = await reviewer.agent
      .post(`${revision}/accept`)
      .send({ reason: '' })
      .expect(200);
    expect(revisionSummary.parse(accepted.body)).toMatchObject({
      state: 'accepted',
      decisionReason: null,
    });
    const summary = latticeSummary.parse((await maker.agent.get(lattice)).body);
    expect(summary).toMatchObject({ state: 'accepted', openRemarks: 2 });
  });

  it('shares it, and someone without an account sees exactly that revision', async () => {
    const inside = revisionDetail.parse((await maker.agent.get(`${lattice}/revisions/1`)).body);
    const response = await maker.agent
      .post(`${lattice}/revisions/1/shares`)
      .send({ expiresInDays: 7 })
      .expect(201);
    const { token } = createdShare.parse(response.body);
    const opened = await test.browser().get(`/api/shares/${token}`).expect(200);
    expect(opened.headers['cache-control']).toBe('no-store');
    expect(opened.headers['referrer-policy']).toBe('no-referrer');
    const { revision, workspaceName } = sharedRevision.parse(opened.body);
    expect(workspaceName).toBe(maker.workspace.name);
    expect(revision.evaluation).toEqual(inside.evaluation);
    expect(revision.cell).toEqual(inside.cell);
    expect(revision.author.name).toBe(maker.user.name);
    for (const secret of [maker.user.email, reviewer.user.email, maker.user.id, 'Remark', '@']) {
      expect(opened.text).not.toContain(secret);
    }
    const links = shareList.parse((await maker.agent.get(`${lattice}/shares`)).body);
    expect(links.items).toMatchObject([{ revisionNumber: 1, openedCount: 1, revokedAt: null }]);
    expect(JSON.stringify(links)).not.toContain(token);
  });

  it('withdraws the link', async () => {
    const made = createdShare.parse(
      (await maker.agent.post(`${lattice}/revisions/1/shares`).send({}).expect(201)).body,
    );
    await maker.agent.delete(`${lattice}/shares/${made.id}`).expect(200);
    const gone = await test.browser().get(`/api/shares/${made.token}`);
    expect([gone.status, gone.body.error.code]).toEqual([404, 'share.not_found']);
  });

  it('leaves a trace of every step', async () => {
    const owner = await signIn(test, 'owner', maker.workspace);
    const log = await owner.agent.get(`/api/workspaces/${maker.workspace.slug}/audit?pageSize=50`);
    const actions = log.body.items.map(({ action }: { action: string }) => action).reverse();
    expect(actions.filter((action: string) => !action.startsWith('auth.'))).toEqual([
      'lattice.create',
      'revision.save',
      'revision.submit',
      'annotation.create',
      'annotation.create',
      'annotation.create',
      'revision.return',
      'annotation.reply',
      'annotation.resolve',
      'revision.submit',
      'revision.accept',
      'share.create',
      'share.create',
      'share.revoke',
    ]);
  });
});
