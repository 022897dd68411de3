import { count } from 'drizzle-orm';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';

import { sessionState } from '#common/schemas/auth';
import { users } from '#server/users/user.table';
import { startTestApp, type TestApp } from '#tests/helpers/app';

import { workspaces } from './workspace.table.js';

let test: TestApp;
beforeEach(async () => {
  test = await startTestApp();
});
afterEach(() => test.close());

const asked = (name: string) => ({
  name,
  email: `${name.toLowerCase()}@kiln.example`,
  password: 'marble trumpet heron',
  workspaceName: 'Größe & Öfen',
});

const numberOf = async (table: typeof users | typeof workspaces) =>
  (await test.db.select({ count: count() }).from(table))[0]!.count;

describe('setting up an empty server', () => {
  it('makes its owner, a workspace with a readable address, and a session; once', async () => {
    const agent = test.browser();
    expect((await agent.get('/api/session')).body.needsSetup).toBe(true);
    const response = await agent.post('/api/setup').send(asked('Ida')).expect(200);
    const state = sessionState.parse(response.body);
    expect(state.needsSetup).toBe(false);
    expect(state.user?.memberships).toMatchObject([
      { workspaceSlug: 'grosse-ofen', workspaceName: 'Größe & Öfen', role: 'owner' },
    ]);
    await agent.get('/api/workspaces/grosse-ofen').expect(200);
    const again = await test.browser().post('/api/setup').send(asked('Ole'));
    expect([again.status, again.body.error.code]).toEqual([409, 'setup.done']);
  });

  it('makes one owner when several try at the same moment', async () => {
    const answers = await Promise.all(
      ['Ida', 'Ole', 'Una', 'Eli'].map((name) =>
        test.browser().post('/api/setup').send(asked(name)),
      ),
    );
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409, 409, 409]);
    expect(await numberOf(users)).toBe(1);
    expect(await numberOf(workspaces)).toBe(1);
  });

  it('keeps nothing of a set-up with a weak password', async () => {
    const response = await test
      .browser()
      .post('/api/setup')
      .send({ ...asked('Ida'), password: 'password1234' });
    expect(response.body.error).toMatchObject({
      code: 'auth.weak_password',
      details: { fields: [{ field: 'password' }] },
    });
    expect(await numberOf(users)).toBe(0);
  });
});
