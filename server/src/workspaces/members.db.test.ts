import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { memberList } from '#common/schemas/workspace';
import { signIn, signInAs, startTestApp, type TestApp } from '#tests/helpers/app';
import { makeMember, makeUser, makeWorkspace } from '#tests/helpers/factories';

import { memberships } from './membership.table.js';

let test: TestApp;
beforeAll(async () => {
  test = await startTestApp();
});
afterAll(() => test.close());

const rolesIn = async (workspaceId: string) =>
  (await test.db.select().from(memberships).where(eq(memberships.workspaceId, workspaceId))).map(
    ({ role }) => role,
  );

describe('members', () => {
  it('are listed by name to everyone in the workspace', async () => {
    const { agent, workspace } = await signIn(test, 'reader');
    await makeMember(test.db, workspace, 'owner', { name: 'Aino Virtanen' });
    const response = await agent.get(`/api/workspaces/${workspace.slug}/members`).expect(200);
    const { items } = memberList.parse(response.body);
    expect(items).toHaveLength(2);
    expect(items[0]).toMatchObject({ name: 'Aino Virtanen', initials: 'AV', role: 'owner' });
  });

  it('get another role, which counts from the next request on', async () => {
    const owner = await signIn(test, 'owner');
    const member = await signIn(test, 'reader', owner.workspace);
    const { slug } = owner.workspace;
    await member.agent.get(`/api/workspaces/${slug}/audit`).expect(403);
    const response = await owner.agent
      .patch(`/api/workspaces/${slug}/members/${member.user.id}`)
      .send({ role: 'owner' })
      .expect(200);
    expect(response.body).toMatchObject({ userId: member.user.id, role: 'owner' });
    const log = await member.agent.get(`/api/workspaces/${slug}/audit`).expect(200);
    expect(log.body.items[0]).toMatchObject({
      action: 'member.change_role',
      subject: member.user.name,
      detail: 'reader → owner',
      actorName: owner.user.name,
    });
  });

  it('lose all access when removed', async () => {
    const owner = await signIn(test, 'owner');
    const member = await signIn(test, 'crystallographer', owner.workspace);
    const { slug } = owner.workspace;
    await owner.agent.delete(`/api/workspaces/${slug}/members/${member.user.id}`).expect(200);
    await member.agent.get(`/api/workspaces/${slug}`).expect(404);
    expect((await member.agent.get('/api/workspaces')).body.items).toEqual([]);
  });

  it('may leave, but remove nobody else', async () => {
    const owner = await signIn(test, 'owner');
    const member = await signIn(test, 'reader', owner.workspace);
    const path = `/api/workspaces/${owner.workspace.slug}/members`;
    await member.agent.delete(`${path}/${owner.user.id}`).expect(403);
    await member.agent.delete(`${path}/${member.user.id}`).expect(200);
    expect(await rolesIn(owner.workspace.id)).toEqual(['owner']);
  });

  it('are 404 when they belong elsewhere, are unknown or no id at all', async () => {
    const owner = await signIn(test, 'owner');
    const stranger = await makeUser(test.db);
    for (const id of [stranger.id, '01900000-0000-7000-8000-000000000000', 'me']) {
      const path = `/api/workspaces/${owner.workspace.slug}/members/${id}`;
      const changed = await owner.agent.patch(path).send({ role: 'reader' });
      const removed = await owner.agent.delete(path);
      expect([changed.status, changed.body.error.code]).toEqual([404, 'member.not_found']);
      expect([removed.status, removed.body.error.code]).toEqual([404, 'member.not_found']);
    }
  });

  it('do not get a role that does not exist', async () => {
    const owner = await signIn(test, 'owner');
    const response = await owner.agent
      .patch(`/api/workspaces/${owner.workspace.slug}/members/${owner.user.id}`)
      .send({ role: 'emperor' });
    expect(response.status).toBe(400);
    expect(response.body.error.details.fields[0].field).toBe('role');
  });
});

describe('the last owner', () => {
  it('can neither leave nor step down', async () => {
    const owner = await signIn(test, 'owner');
    await makeMember(test.db, owner.workspace, 'crystallographer');
    const path = `/api/workspaces/${owner.workspace.slug}/members/${owner.user.id}`;
    const left = await owner.agent.delete(path);
    const stepped = await owner.agent.patch(path).send({ role: 'reader' });
    for (const response of [left, stepped]) {
      expect([response.status, response.body.error.code]).toEqual([409, 'member.last_owner']);
    }
    expect((await rolesIn(owner.workspace.id)).sort()).toEqual(['crystallographer', 'owner']);
    const log = await owner.agent.get(`/api/workspaces/${owner.workspace.slug}/audit`);
    expect(log.body.total).toBe(0);
  });

  it('stays when two owners leave at the same moment', async () => {
    for (let round = 0; round < 5; round += 1) {
      const workspace = await makeWorkspace(test.db);
      const pair = await Promise.all(
        [0, 1].map(async () => {
          const user = await makeMember(test.db, workspace, 'owner');
          return { user, agent: await signInAs(test, user.email) };
        }),
      );
      const answers = await Promise.all(
        pair.map(({ user, agent }) =>
          agent.delete(`/api/workspaces/${workspace.slug}/members/${user.id}`),
        ),
      );
      expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
      expect(await rolesIn(workspace.id)).toEqual(['owner']);
    }
  });

  it('stays when each of two owners takes the other’s role away at the same moment', async () => {
    const first = await signIn(test, 'owner');
    const second = await signIn(test, 'owner', first.workspace);
    const path = `/api/workspaces/${first.workspace.slug}/members`;
    await Promise.all([
      first.agent.patch(`${path}/${second.user.id}`).send({ role: 'reader' }),
      second.agent.patch(`${path}/${first.user.id}`).send({ role: 'reader' }),
    ]);
    expect((await rolesIn(first.workspace.id)).filter((role) => role === 'owner')).toHaveLength(1);
  });
});
