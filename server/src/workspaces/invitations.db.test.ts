import { sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import {
  createdInvitation,
  invitationList,
  invitationPreview,
  sessionState,
} from '#common/schemas/auth';
import { signIn, signInAs, startTestApp, type SignedIn, type TestApp } from '#tests/helpers/app';
import { makeUser } from '#tests/helpers/factories';

let test: TestApp;
beforeAll(async () => {
  test = await startTestApp();
});
afterAll(() => test.close());

let made = 0;
const newAddress = () => `guest-${(made += 1)}@kiln.example`;
const account = { name: 'Noor Haddad', password: 'lantern bassoon quarry' };

const pathOf = (owner: SignedIn) => `/api/workspaces/${owner.workspace.slug}/invitations`;

async function invite(owner: SignedIn, email = newAddress(), role = 'reviewer') {
  const response = await owner.agent.post(pathOf(owner)).send({ email, role }).expect(201);
  return createdInvitation.parse(response.body);
}

const accept = (token: string, body: object = {}, agent = test.browser()) =>
  agent.post(`/api/invitations/${token}/accept`).send(body);

const expectGone = (response: { status: number; body: { error: { code: string } } }) =>
  expect([response.status, response.body.error.code]).toEqual([404, 'invitation.not_found']);

describe('an invitation', () => {
  it('says who invites whom to what, to whoever holds the link', async () => {
    const owner = await signIn(test, 'owner');
    const { token, email } = await invite(owner);
    const response = await test.browser().get(`/api/invitations/${token}`).expect(200);
    expect(invitationPreview.parse(response.body)).toMatchObject({
      workspaceName: owner.workspace.name,
      invitedBy: owner.user.name,
      email,
      role: 'reviewer',
      hasAccount: false,
    });
  });

  it('makes an account, a member and a session', async () => {
    const owner = await signIn(test, 'owner');
    const { token, email } = await invite(owner);
    const agent = test.browser();
    const state = sessionState.parse((await accept(token, account, agent).expect(200)).body);
    expect(state.user).toMatchObject({ name: 'Noor Haddad', email });
    expect(state.user?.memberships).toMatchObject([{ role: 'reviewer' }]);
    await agent.get(`/api/workspaces/${owner.workspace.slug}`).expect(200);
    await signInAs(test, email, account.password);
  });

  it('adds a workspace to the account that is signed in', async () => {
    const owner = await signIn(test, 'owner');
    const guest = await signIn(test, 'reader');
    const { token } = await invite(owner, guest.user.email);
    const state = sessionState.parse((await accept(token, {}, guest.agent).expect(200)).body);
    expect(state.user?.memberships.map(({ role }) => role).sort()).toEqual(['reader', 'reviewer']);
  });

  it('asks someone with an account to sign in first', async () => {
    const owner = await signIn(test, 'owner');
    const guest = await makeUser(test.db);
    const { token } = await invite(owner, guest.email);
    const preview = await test.browser().get(`/api/invitations/${token}`);
    expect(preview.body.hasAccount).toBe(true);
    const response = await accept(token, account);
    expect([response.status, response.body.error.code]).toEqual([401, 'auth.required']);
  });

  it('is for its own address only', async () => {
    const owner = await signIn(test, 'owner');
    const other = await signIn(test, 'reader');
    const { token } = await invite(owner);
    const response = await accept(token, {}, other.agent);
    expect([response.status, response.body.error.code]).toEqual([403, 'auth.forbidden']);
    await test.browser().get(`/api/invitations/${token}`).expect(200);
  });

  it('needs a name and a good password for a new account, and names the fields', async () => {
    const { token } = await invite(await signIn(test, 'owner'));
    const missing = await accept(token);
    expect(missing.status).toBe(400);
    expect(missing.body.error.details.fields.map((one: { field: string }) => one.field)).toEqual([
      'name',
      'password',
    ]);
    const weak = await accept(token, { name: 'Noor', password: 'password1234' });
    expect(weak.body.error).toMatchObject({
      code: 'auth.weak_password',
      details: { fields: [{ field: 'password' }] },
    });
    await accept(token, account).expect(200);
  });

  it('works once', async () => {
    const { token } = await invite(await signIn(test, 'owner'));
    await accept(token, account).expect(200);
    expectGone(await accept(token, account));
    expectGone(await test.browser().get(`/api/invitations/${token}`));
  });

  it('works once when it is accepted twice at the same moment', async () => {
    const guest = await makeUser(test.db);
    const { token } = await invite(await signIn(test, 'owner'), guest.email);
    const agents = await Promise.all([1, 2, 3].map(() => signInAs(test, guest.email)));
    const answers = await Promise.all(agents.map((agent) => accept(token, {}, agent)));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 404, 404]);
  });

  it('ends after seven days', async () => {
    const owner = await signIn(test, 'owner');
    const { token } = await invite(owner);
    test.clock.advance(7 * 24 * 3_600_000 - 60_000);
    await test.browser().get(`/api/invitations/${token}`).expect(200);
    test.clock.advance(120_000);
    expectGone(await accept(token, account));
    expect((await owner.agent.get(pathOf(owner))).body.items).toEqual([]);
  });

  it('can be withdrawn, by its own workspace', async () => {
    const owner = await signIn(test, 'owner');
    const other = await signIn(test, 'owner');
    const { id, token } = await invite(owner);
    expectGone(await other.agent.delete(`${pathOf(other)}/${id}`));
    expectGone(await owner.agent.delete(`${pathOf(owner)}/no-id`));
    await owner.agent.delete(`${pathOf(owner)}/${id}`).expect(200);
    expectGone(await owner.agent.delete(`${pathOf(owner)}/${id}`));
    expectGone(await accept(token, account));
  });

  it('is replaced by a newer one for the same address', async () => {
    const owner = await signIn(test, 'owner');
    const email = newAddress();
    const old = await invite(owner, email);
    const newer = await invite(owner, email, 'reader');
    expectGone(await test.browser().get(`/api/invitations/${old.token}`));
    const { items } = invitationList.parse((await owner.agent.get(pathOf(owner))).body);
    expect(items).toMatchObject([{ id: newer.id, role: 'reader', email }]);
  });

  it('is one when two are made for an address at the same moment', async () => {
    const owner = await signIn(test, 'owner');
    const email = newAddress();
    await Promise.all([invite(owner, email), invite(owner, email)]);
    expect((await owner.agent.get(pathOf(owner))).body.items).toHaveLength(1);
  });

  it('is not made for a member', async () => {
    const owner = await signIn(test, 'owner');
    const response = await owner.agent
      .post(pathOf(owner))
      .send({ email: owner.user.email, role: 'reader' });
    expect([response.status, response.body.error.code]).toEqual([409, 'member.already']);
  });

  it('does not show its token again, nor keep it', async () => {
    const owner = await signIn(test, 'owner');
    const { token } = await invite(owner);
    const list = await owner.agent.get(pathOf(owner));
    expect(JSON.stringify(list.body)).not.toContain(token);
    const rows = await test.db.execute(sql`select * from invitations`);
    expect(JSON.stringify(rows.rows)).not.toContain(token);
  });

  it('is not found by a token that is malformed', async () => {
    for (const token of ['x', 'a'.repeat(43), '%00', `${'a'.repeat(42)}'`]) {
      expectGone(await test.browser().get(`/api/invitations/${token}`));
    }
  });
});
