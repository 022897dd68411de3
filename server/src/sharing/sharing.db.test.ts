import { createHash } from 'node:crypto';

import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { createdShare, sharedRevision, shareList } from '#common/schemas/sharing';
import { signIn, startTestApp, type SignedIn, type TestApp } from '#tests/helpers/app';
import { rockSalt } from '#tests/helpers/cells';
import { makeRevision, saveRevision } from '#tests/helpers/lattices';

let test: TestApp;
let maker: SignedIn;
let path: string;
beforeAll(async () => {
  test = await startTestApp();
  maker = await signIn(test, 'crystallographer');
  path = await makeRevision(maker.agent, maker.workspace);
});
afterAll(() => test.close());

const dayMs = 24 * 3_600_000;

async function share(body: object = {}, lattice = path) {
  const response = await maker.agent.post(`${lattice}/revisions/1/shares`).send(body).expect(201);
  return createdShare.parse(response.body);
}

const open = (token: string) => test.browser().get(`/api/shares/${token}`);

/** All that an answer says, but for the id of the request. */
async function answer(token: string) {
  const { status, body, headers } = await open(token);
  const { requestId: _requestId, ...error } = body.error;
  return { status, error, caching: headers['cache-control'] };
}

describe('a link', () => {
  it('is kept only as the hash of its token', async () => {
    const { token } = await share();
    expect(token).toMatch(/^[\w-]{43}$/);
    const { rows } = await test.db.execute<{ line: string }>(
      'select shares::text as line from shares',
    );
    const all = rows.map(({ line }) => line).join('\n');
    expect(all).not.toContain(token);
    expect(all).toContain(createHash('sha256').update(token).digest('hex'));
  });

  it('opens the revision it was made for, whatever came later', async () => {
    const { token } = await share();
    const before = sharedRevision.parse((await open(token).expect(200)).body);
    await saveRevision(maker.agent, path, rockSalt({ a: '4.3' }));
    const after = sharedRevision.parse((await open(token).expect(200)).body);
    expect(after.revision.number).toBe(1);
    expect(after.revision.evaluation).toEqual(before.revision.evaluation);
    expect(after.revision.cell).toEqual(before.revision.cell);
  });

  it('keeps what was said in review inside', async () => {
    const reviewer = await signIn(test, 'reviewer', maker.workspace);
    const lattice = await makeRevision(maker.agent, maker.workspace);
    await maker.agent.post(`${lattice}/revisions/1/submit`).expect(200);
    const body = { reason: 'Between us.' };
    await reviewer.agent.post(`${lattice}/revisions/1/return`).send(body).expect(200);
    const { token } = await share({}, lattice);
    const opened = await open(token).expect(200);
    for (const inside of [
      'Between us.',
      maker.user.id,
      reviewer.user.email,
      lattice.split('/').at(-1)!,
    ]) {
      expect(opened.text).not.toContain(inside);
    }
    expect(opened.body.revision.decidedBy.name).toBe(reviewer.user.name);
  });

  it('says the same whether it is wrong, out of date, withdrawn or of a deleted lattice', async () => {
    const lattice = await makeRevision(maker.agent, maker.workspace);
    const late = await share({ expiresInDays: 1 }, lattice);
    await open(late.token).expect(200);
    const withdrawn = await share({}, lattice);
    await maker.agent.delete(`${lattice}/shares/${withdrawn.id}`).expect(200);
    await maker.agent.delete(`${lattice}/shares/${withdrawn.id}`).expect(200);
    const gone = await makeRevision(maker.agent, maker.workspace);
    const deleted = await share({}, gone);
    await maker.agent.delete(gone).expect(200);
    test.clock.advance(dayMs);
    const expected = await answer('A'.repeat(43));
    expect(expected).toMatchObject({
      status: 404,
      error: { code: 'share.not_found' },
      caching: 'no-store',
    });
    for (const token of [
      late.token,
      withdrawn.token,
      deleted.token,
      'short',
      '%00',
      `${late.token}x`,
    ]) {
      expect(await answer(token)).toEqual(expected);
    }
    test.clock.advance(-dayMs);
  });

  it('opens again when its lattice is taken back', async () => {
    const lattice = await makeRevision(maker.agent, maker.workspace);
    const { token } = await share({}, lattice);
    await maker.agent.delete(lattice).expect(200);
    await open(token).expect(404);
    await maker.agent.post(`${lattice}/restore`).expect(200);
    await open(token).expect(200);
  });

  it('counts its openings, also those at the same moment', async () => {
    const lattice = await makeRevision(maker.agent, maker.workspace);
    const { token, id } = await share({ expiresInDays: 30 }, lattice);
    await Promise.all(Array.from({ length: 5 }, () => open(token).expect(200)));
    const list = shareList.parse((await maker.agent.get(`${lattice}/shares`)).body);
    expect(list.items).toMatchObject([{ id, openedCount: 5, revisionNumber: 1, revokedAt: null }]);
    expect(list.items[0]!.lastOpenedAt).not.toBeNull();
  });

  it.each([{ expiresInDays: 0 }, { expiresInDays: 366 }, { expiresInDays: 1.5 }])(
    'does not last %j',
    async (body) => {
      await maker.agent.post(`${path}/revisions/1/shares`).send(body).expect(400);
    },
  );

  it('is withdrawn through its own lattice only', async () => {
    const { id, token } = await share();
    const other = await makeRevision(maker.agent, maker.workspace);
    for (const wrong of [`${other}/shares/${id}`, `${path}/shares/nonsense`]) {
      const response = await maker.agent.delete(wrong);
      expect([response.status, response.body.error.code]).toEqual([404, 'share.not_found']);
    }
    await open(token).expect(200);
  });
});
