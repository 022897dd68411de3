import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { role as roleSchema, type Role } from '#common/schemas/auth';
import { auditPage, workspaceDetail, workspaceList } from '#common/schemas/workspace';
import { signIn, startTestApp, type Agent, type SignedIn, type TestApp } from '#tests/helpers/app';
import { makeMember, makeWorkspace } from '#tests/helpers/factories';

import type { WorkspaceRow } from './workspace.table.js';

let test: TestApp;
let home: WorkspaceRow;
let foreign: WorkspaceRow;
let foreignMember: string;
const people = {} as Record<Role, SignedIn>;

beforeAll(async () => {
  test = await startTestApp();
  home = await makeWorkspace(test.db, { name: 'Home', slug: 'home' });
  foreign = await makeWorkspace(test.db, { name: 'Foreign', slug: 'foreign' });
  foreignMember = (await makeMember(test.db, foreign, 'owner')).id;
  for (const role of roleSchema.options) {
    people[role] = await signIn(test, role, home);
  }
  // A second owner, so that the table's last column never asks for the last owner's leave.
  await makeMember(test.db, home, 'owner');
});
afterAll(() => test.close());

const all = roleSchema.options;
const owner: readonly Role[] = ['owner'];

interface Case {
  readonly what: string;
  readonly allowed: readonly Role[];
  /** Status for those who may. */
  readonly status: number;
  call(agent: Agent, workspace: string): ReturnType<Agent['get']>;
}

let guests = 0;
const nobody = '01900000-0000-7000-8000-000000000000';

const cases: Case[] = [
  {
    what: 'workspace.read',
    allowed: all,
    status: 200,
    call: (agent, workspace) => agent.get(workspace),
  },
  {
    what: 'workspace.update',
    allowed: owner,
    status: 200,
    call: (agent, workspace) => agent.patch(workspace).send({ readersMayComment: true }),
  },
  {
    what: 'member.list',
    allowed: all,
    status: 200,
    call: (agent, workspace) => agent.get(`${workspace}/members`),
  },
  {
    what: 'member.change_role',
    allowed: owner,
    status: 404,
    call: (agent, workspace) =>
      agent.patch(`${workspace}/members/${nobody}`).send({ role: 'reader' }),
  },
  {
    what: 'member.remove',
    allowed: owner,
    status: 404,
    call: (agent, workspace) => agent.delete(`${workspace}/members/${nobody}`),
  },
  {
    what: 'invitation.list',
    allowed: owner,
    status: 200,
    call: (agent, workspace) => agent.get(`${workspace}/invitations`),
  },
  {
    what: 'invitation.create',
    allowed: owner,
    status: 201,
    call: (agent, workspace) =>
      agent
        .post(`${workspace}/invitations`)
        .send({ email: `table-${(guests += 1)}@kiln.example`, role: 'reader' }),
  },
  {
    what: 'invitation.withdraw',
    allowed: owner,
    status: 404,
    call: (agent, workspace) => agent.delete(`${workspace}/invitations/${nobody}`),
  },
  {
    what: 'data values: read',
    allowed: all,
    status: 200,
    call: (agent, workspace) => agent.get(`${workspace}/data-values`),
  },
  {
    what: 'data.override: set',
    allowed: ['owner', 'crystallographer'],
    status: 200,
    call: (agent, workspace) =>
      agent.put(`${workspace}/data-values/mass:Na`).send({ value: 22.99, note: '' }),
  },
  {
    what: 'data.override: restore',
    allowed: ['owner', 'crystallographer'],
    status: 404,
    call: (agent, workspace) => agent.delete(`${workspace}/data-values/mass:Mg`),
  },
  {
    what: 'audit.read',
    allowed: owner,
    status: 200,
    call: (agent, workspace) => agent.get(`${workspace}/audit`),
  },
];

const table = cases.flatMap((one) => all.map((role) => [role, one.what, one] as const));

describe('each role and each action', () => {
  it.each(table)('%s: %s in the own workspace', async (role, _what, { allowed, status, call }) => {
    const response = await call(people[role].agent, '/api/workspaces/home');
    if (allowed.includes(role)) {
      expect(response.status).toBe(status);
      expect(response.body.error?.code).not.toBe('auth.forbidden');
    } else {
      expect([response.status, response.body.error.code]).toEqual([403, 'auth.forbidden']);
    }
  });

  it.each(table)('%s: %s, foreign and missing alike', async (role, _what, { call }) => {
    for (const workspace of ['foreign', 'missing', 'not%20a%20slug']) {
      const response = await call(people[role].agent, `/api/workspaces/${workspace}`);
      expect([response.status, response.body.error.code]).toEqual([404, 'workspace.not_found']);
    }
  });

  it.each(cases.map((one) => [one.what, one] as const))(
    'nobody signed in: %s',
    async (_what, { call }) => {
      for (const workspace of ['home', 'missing']) {
        const response = await call(test.browser(), `/api/workspaces/${workspace}`);
        expect([response.status, response.body.error.code]).toEqual([401, 'auth.required']);
      }
    },
  );

  it.each(all)('%s: leaves the own workspace', async (role) => {
    const leaver = await signIn(test, role, home);
    await leaver.agent.delete(`/api/workspaces/home/members/${leaver.user.id}`).expect(200);
  });

  it('an owner reaches nobody of another workspace through their own', async () => {
    const path = `/api/workspaces/home/members/${foreignMember}`;
    await people.owner.agent.delete(path).expect(404);
    await people.owner.agent.patch(path).send({ role: 'reader' }).expect(404);
  });
});

describe('a workspace', () => {
  it('is listed with the role to those who belong there', async () => {
    const response = await people.reviewer.agent.get('/api/workspaces').expect(200);
    expect(workspaceList.parse(response.body).items).toMatchObject([
      { slug: 'home', role: 'reviewer' },
    ]);
  });

  it('takes a new name and new rules, keeps its address, and logs it', async () => {
    const boss = await signIn(test, 'owner');
    const path = `/api/workspaces/${boss.workspace.slug}`;
    const response = await boss.agent
      .patch(path)
      .send({ name: ' Glaze Lab ', requiresSecondPerson: false })
      .expect(200);
    expect(workspaceDetail.parse(response.body)).toMatchObject({
      name: 'Glaze Lab',
      slug: boss.workspace.slug,
      requiresSecondPerson: false,
      readersMayComment: true,
      role: 'owner',
    });
    const log = auditPage.parse((await boss.agent.get(`${path}/audit`)).body);
    expect(log.items[0]).toMatchObject({
      action: 'workspace.update',
      actorName: boss.user.name,
      detail: 'name: Glaze Lab, requiresSecondPerson: false',
    });
  });

  it('changes nothing and logs nothing when nothing is asked', async () => {
    const boss = await signIn(test, 'owner');
    const path = `/api/workspaces/${boss.workspace.slug}`;
    await boss.agent.patch(path).send({}).expect(200);
    expect((await boss.agent.get(`${path}/audit`)).body.total).toBe(0);
  });

  it('pages its log, newest first, without other workspaces’ events', async () => {
    const boss = await signIn(test, 'owner');
    const path = `/api/workspaces/${boss.workspace.slug}`;
    for (const name of ['One', 'Two', 'Three']) {
      await boss.agent.patch(path).send({ name }).expect(200);
    }
    const page = (await boss.agent.get(`${path}/audit?page=2&pageSize=2`)).body;
    expect(page).toMatchObject({ page: 2, pageSize: 2, total: 3 });
    expect(page.items).toMatchObject([{ detail: 'name: One' }]);
    const bad = await boss.agent.get(`${path}/audit?page=0`);
    expect(bad.status).toBe(400);
    expect(bad.body.error.details.fields[0].field).toBe('page');
  });
});
