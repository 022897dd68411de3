import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { users } from '#server/users/user.table';
import { signIn, signInAs, startTestApp, type TestApp } from '#tests/helpers/app';
import { makeUser, testPassword } from '#tests/helpers/factories';

let test: TestApp;
beforeAll(async () => {
  test = await startTestApp();
});
afterAll(() => test.close());

const newPassword = 'cobalt umbrella finch';

describe('changing the password', () => {
  it('opens with the new one only, and ends the sessions elsewhere', async () => {
    const { email } = await makeUser(test.db);
    const here = await signInAs(test, email);
    const elsewhere = await signInAs(test, email);
    await here
      .post('/api/me/password')
      .send({ currentPassword: testPassword, newPassword })
      .expect(200, { ok: true });
    await here.get('/api/me/sessions').expect(200);
    await elsewhere.get('/api/me/sessions').expect(401);
    await test.browser().post('/api/session').send({ email, password: testPassword }).expect(401);
    await signInAs(test, email, newPassword);
  });

  it('needs the current one, and names the field', async () => {
    const { agent, user } = await signIn(test, 'owner');
    const response = await agent
      .post('/api/me/password')
      .send({ currentPassword: 'a guess', newPassword });
    expect(response.status).toBe(401);
    expect(response.body.error.code).toBe('auth.bad_credentials');
    expect(response.body.error.details.fields[0].field).toBe('currentPassword');
    const [row] = await test.db.select().from(users).where(eq(users.id, user.id));
    expect(row!.passwordHash).toBe(user.passwordHash);
  });

  it('slows guessing of the current one from a session left open', async () => {
    const { agent } = await signIn(test, 'owner');
    const statuses: number[] = [];
    for (let index = 0; index < 6; index += 1) {
      const body = { currentPassword: `guess ${index}`, newPassword };
      statuses.push((await agent.post('/api/me/password').send(body)).status);
    }
    expect(statuses).toEqual([401, 401, 401, 401, 401, 429]);
  });

  it.each([
    ['short', 'request.invalid', 400],
    ['password123456', 'auth.weak_password', 422],
    ['holdfast-holdfast', 'auth.weak_password', 422],
  ])('refuses %s', async (weak, code, status) => {
    const { agent } = await signIn(test, 'reader');
    const response = await agent
      .post('/api/me/password')
      .send({ currentPassword: testPassword, newPassword: weak });
    expect(response.status).toBe(status);
    expect(response.body.error.code).toBe(code);
    expect(response.body.error.details.fields[0].field).toBe('newPassword');
  });

  it('stores argon2id with the parameters OWASP asks for', async () => {
    const { agent, user } = await signIn(test, 'owner');
    await agent.post('/api/me/password').send({ currentPassword: testPassword, newPassword });
    const [row] = await test.db.select().from(users).where(eq(users.id, user.id));
    // OWASP Password Storage Cheat Sheet: argon2id, m = 19456 KiB, t = 2, p = 1.
    expect(row!.passwordHash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  });
});

describe('the profile', () => {
  it('takes a new name and answers it back with initials', async () => {
    const { agent } = await signIn(test, 'reader');
    const response = await agent.patch('/api/me').send({ name: '  Åse Lindqvist ' }).expect(200);
    expect(response.body).toMatchObject({ name: 'Åse Lindqvist', initials: 'ÅL' });
  });

  it('refuses an empty name, naming the field', async () => {
    const { agent } = await signIn(test, 'reader');
    const response = await agent.patch('/api/me').send({ name: '   ' });
    expect(response.status).toBe(400);
    expect(response.body.error.details.fields).toMatchObject([{ field: 'name' }]);
  });

  it('is nobody’s but the person’s who is signed in', async () => {
    for (const [method, path] of [
      ['patch', '/api/me'],
      ['post', '/api/me/password'],
      ['get', '/api/me/sessions'],
      ['delete', '/api/me/sessions/x'],
      ['delete', '/api/session'],
      ['get', '/api/workspaces'],
    ] as const) {
      const response = await test.browser()[method](path).send({});
      expect([path, response.status, response.body.error.code]).toEqual([
        path,
        401,
        'auth.required',
      ]);
    }
  });
});
