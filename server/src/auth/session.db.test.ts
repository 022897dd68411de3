import { eq, sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { sessionList, sessionState } from '#common/schemas/auth';
import { signIn, signInAs, startTestApp, type TestApp } from '#tests/helpers/app';
import { makeMember, makeUser, makeWorkspace, testPassword } from '#tests/helpers/factories';

import { sessionAbsoluteMs, sessionCookieName, sessionIdleMs } from './session-limits.js';
import { sessions } from './session.table.js';

let test: TestApp;
beforeAll(async () => {
  test = await startTestApp();
});
afterAll(() => test.close());

const cookiesOf = (response: { headers: Record<string, unknown> }): string[] =>
  (response.headers['set-cookie'] as string[] | undefined) ?? [];

describe('signing in', () => {
  it('tells a visitor that nobody is signed in', async () => {
    const response = await test.browser().get('/api/session').expect(200);
    expect(sessionState.parse(response.body).user).toBeNull();
    expect(cookiesOf(response)).toEqual([]);
    expect(response.headers['cache-control']).toBe('no-store');
  });

  it('answers who signed in, with their workspaces and roles', async () => {
    const workspace = await makeWorkspace(test.db, { name: 'Glaze Room' });
    const user = await makeMember(test.db, workspace, 'reviewer', { name: 'Ida Brandt' });
    const response = await test
      .browser()
      .post('/api/session')
      .send({ email: ` ${user.email.toUpperCase()} `, password: testPassword })
      .expect(200);
    const state = sessionState.parse(response.body);
    expect(state.user).toMatchObject({ name: 'Ida Brandt', initials: 'IB' });
    expect(state.user?.memberships).toMatchObject([
      { workspaceName: 'Glaze Room', role: 'reviewer' },
    ]);
  });

  it('sets a cookie that scripts and other sites can’t use', async () => {
    const user = await makeUser(test.db);
    const response = await test
      .browser()
      .post('/api/session')
      .send({ email: user.email, password: testPassword });
    const cookie = cookiesOf(response).find((text) => text.startsWith(sessionCookieName));
    expect(cookie).toMatch(/HttpOnly/);
    expect(cookie).toMatch(/SameSite=Lax/);
    expect(cookie).not.toMatch(/Secure/);
  });

  it('gives the same answer for a wrong password and for no such account', async () => {
    const user = await makeUser(test.db);
    const [wrong, unknown] = await Promise.all(
      [user.email, 'nobody@kiln.example'].map((email) =>
        test.browser().post('/api/session').send({ email, password: 'not the password' }),
      ),
    );
    expect(wrong!.status).toBe(401);
    expect(wrong!.body.error.code).toBe('auth.bad_credentials');
    expect(unknown!.body.error).toEqual({
      ...wrong!.body.error,
      requestId: unknown!.body.error.requestId,
    });
  });

  it('starts a new session each time; the old cookie no longer opens anything', async () => {
    const user = await makeUser(test.db);
    const agent = await signInAs(test, user.email);
    const before = (await agent.get('/api/me/sessions')).body.items;
    const old = cookiesOf(await agent.get('/api/session'))[0]!.split(';')[0]!;
    await agent.post('/api/session').send({ email: user.email, password: testPassword });
    const after = (await agent.get('/api/me/sessions')).body.items;
    expect(after).toHaveLength(1);
    expect(after[0].id).not.toBe(before[0].id);
    const replay = await test.browser().get('/api/session').set('cookie', old);
    expect(replay.body.user).toBeNull();
  });

  it('stores neither the cookie’s id nor anything that opens a session', async () => {
    const user = await makeUser(test.db);
    const agent = await signInAs(test, user.email);
    const cookie = decodeURIComponent(cookiesOf(await agent.get('/api/session'))[0]!);
    const id = /=s:([^.]+)\./.exec(cookie)![1]!;
    const rows = await test.db.execute(sql`select sid, sess::text from sessions`);
    expect(JSON.stringify(rows.rows)).not.toContain(id);
    expect(rows.rows.length).toBeGreaterThan(0);
  });
});

describe('ending a session', () => {
  it('forgets the person on sign-out, for a copied cookie too', async () => {
    const { agent } = await signIn(test, 'reader');
    const copy = cookiesOf(await agent.get('/api/session'))[0]!.split(';')[0]!;
    await agent.delete('/api/session').expect(200, { ok: true });
    expect((await agent.get('/api/session')).body.user).toBeNull();
    await test.browser().get('/api/workspaces').set('cookie', copy).expect(401);
  });

  it('lists the person’s sessions and ends one elsewhere', async () => {
    const user = await makeUser(test.db);
    const here = await signInAs(test, user.email);
    const elsewhere = await signInAs(test, user.email);
    const { items } = sessionList.parse((await here.get('/api/me/sessions')).body);
    expect(items).toHaveLength(2);
    const other = items.find((item) => !item.isCurrent)!;
    await here.delete(`/api/me/sessions/${other.id}`).expect(200);
    await elsewhere.get('/api/me/sessions').expect(401);
    await here.get('/api/me/sessions').expect(200);
  });

  it('does not end someone else’s session, nor say that it exists', async () => {
    const victim = await signIn(test, 'reader');
    const stranger = await signIn(test, 'owner');
    const id = (await victim.agent.get('/api/me/sessions')).body.items[0].id as string;
    for (const target of [id, '01900000-0000-7000-8000-000000000000', 'no-uuid']) {
      const response = await stranger.agent.delete(`/api/me/sessions/${target}`);
      expect(response.status).toBe(404);
      expect(response.body.error.code).toBe('session.not_found');
    }
    await victim.agent.get('/api/me/sessions').expect(200);
  });

  it('ends one that was idle for too long', async () => {
    const { agent, user } = await signIn(test, 'reader');
    const [before] = await test.db.select().from(sessions).where(eq(sessions.userId, user.id));
    expect(before!.expire.getTime() - Date.now()).toBeGreaterThan(sessionIdleMs - 60_000);
    await test.db
      .update(sessions)
      .set({ expire: new Date(Date.now() - 1000) })
      .where(eq(sessions.userId, user.id));
    await agent.get('/api/me/sessions').expect(401);
  });

  it('ends one that is too old, however busy, and no longer lists it', async () => {
    const user = await makeUser(test.db);
    const old = await signInAs(test, user.email);
    await test.db.execute(sql`
      update sessions
      set sess = jsonb_set(sess::jsonb, '{startedAt}', to_jsonb(${Date.now() - sessionAbsoluteMs}::bigint))
      where user_id = ${user.id}`);
    await old.get('/api/me/sessions').expect(401);
    const fresh = await signInAs(test, user.email);
    expect((await fresh.get('/api/me/sessions')).body.items).toHaveLength(1);
  });

  it('ends with the account', async () => {
    const user = await makeUser(test.db);
    const agent = await signInAs(test, user.email);
    await test.db.execute(sql`delete from users where id = ${user.id}`);
    await agent.get('/api/me/sessions').expect(401);
    expect(await test.db.select().from(sessions).where(eq(sessions.userId, user.id))).toEqual([]);
  });
});
