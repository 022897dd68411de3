import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { role as roleSchema, type Role } from '#common/schemas/auth';

import { signIn, startTestApp, type Agent, type SignedIn, type TestApp } from '../helpers/app.js';
import { rockSalt } from '../helpers/cells.js';
import { makeWorkspace } from '../helpers/factories.js';
import { makeRevision } from '../helpers/lattices.js';

const nothing = '01900000-0000-7000-8000-000000000000';
const method = { toleranceRelative: 1e-10, uniformBackground: false };

let test: TestApp;
/** Addresses of a lattice, below the workspace's, in each of the three kinds of workspace. */
let lattice: string;
let foreignLattice: string;
let foreignAnnotation: string;
let foreignShare: string;
let foreignHash: string;
const people = {} as Record<Role, SignedIn>;

beforeAll(async () => {
  test = await startTestApp();
  const home = await makeWorkspace(test.db, { slug: 'home', readersMayComment: false });
  const foreign = await makeWorkspace(test.db, { slug: 'foreign' });
  for (const role of roleSchema.options) {
    people[role] = await signIn(test, role, home);
  }
  const stranger = await signIn(test, 'owner', foreign);
  lattice = below(await makeRevision(people.owner.agent, home));
  const path = await makeRevision(stranger.agent, foreign, rockSalt({ a: '4.8' }));
  foreignLattice = below(path);
  foreignHash = (await stranger.agent.get(`${path}/revisions/1`)).body.evaluationHash;
  const made = await stranger.agent
    .post(`${path}/revisions/1/annotations`)
    .send({ anchor: { kind: 'revision' }, text: 'Ours' })
    .expect(201);
  foreignAnnotation = made.body.id;
  const link = await stranger.agent.post(`${path}/revisions/1/shares`).send({}).expect(201);
  foreignShare = link.body.id;
});
afterAll(() => test.close());

/** `/api/workspaces/home/lattices/1` → `lattices/1`. */
const below = (path: string): string => path.split('/').slice(4).join('/');

interface Case {
  readonly what: string;
  readonly allowed: readonly Role[];
  /** What those get who may: the action is there and found, if not always possible now. */
  readonly status: number;
  call(agent: Agent, workspace: string, at: string): ReturnType<Agent['get']>;
}

const all = roleSchema.options;
const editors: readonly Role[] = ['owner', 'crystallographer'];
const computing: readonly Role[] = ['owner', 'crystallographer', 'reviewer'];
const judges: readonly Role[] = ['owner', 'reviewer'];

const cases: Case[] = [
  {
    what: 'evaluation.run',
    allowed: computing,
    status: 200,
    call: (agent, workspace) => agent.post(`${workspace}/evaluations`).send({ cell: rockSalt() }),
  },
  {
    what: 'evaluation of another hash',
    allowed: all,
    status: 404,
    call: (agent, workspace) => agent.get(`${workspace}/evaluations/${'0'.repeat(64)}`),
  },
  {
    what: 'lattice.read: the shelf',
    allowed: all,
    status: 200,
    call: (agent, workspace) => agent.get(`${workspace}/lattices`),
  },
  {
    what: 'lattice.create',
    allowed: editors,
    status: 201,
    call: (agent, workspace) =>
      agent.post(`${workspace}/lattices`).send({ name: 'New', cell: rockSalt() }),
  },
  ...['', '/draft', '/revisions', '/revisions/1', '/revisions/1/annotations'].map((tail): Case => ({
    what: `lattice.read: lattice${tail}`,
    allowed: all,
    status: 200,
    call: (agent, workspace, at) => agent.get(`${workspace}/${at}${tail}`),
  })),
  {
    what: 'lattice.update',
    allowed: editors,
    status: 200,
    call: (agent, workspace, at) => agent.patch(`${workspace}/${at}`).send({ name: 'Renamed' }),
  },
  {
    what: 'lattice.restore',
    allowed: editors,
    status: 200,
    call: (agent, workspace, at) => agent.post(`${workspace}/${at}/restore`),
  },
  {
    what: 'draft.edit',
    allowed: editors,
    status: 412,
    call: (agent, workspace, at) =>
      agent
        .put(`${workspace}/${at}/draft`)
        .set('if-match', '"r0-v0"')
        .send({ cell: rockSalt(), method }),
  },
  {
    what: 'draft.edit: discard',
    allowed: editors,
    status: 412,
    call: (agent, workspace, at) =>
      agent.delete(`${workspace}/${at}/draft`).set('if-match', '"r0-v0"'),
  },
  {
    what: 'revision.save',
    allowed: editors,
    status: 412,
    call: (agent, workspace, at) =>
      agent.post(`${workspace}/${at}/revisions`).set('if-match', '"r0-v0"').send({}),
  },
  {
    what: 'revision.accept',
    allowed: judges,
    status: 409,
    call: (agent, workspace, at) => agent.post(`${workspace}/${at}/revisions/1/accept`).send({}),
  },
  {
    what: 'revision.return',
    allowed: judges,
    status: 409,
    call: (agent, workspace, at) =>
      agent.post(`${workspace}/${at}/revisions/1/return`).send({ reason: 'No.' }),
  },
  {
    what: 'revision.withdraw',
    allowed: editors,
    status: 409,
    call: (agent, workspace, at) => agent.post(`${workspace}/${at}/revisions/1/withdraw`),
  },
  {
    what: 'annotation.create',
    allowed: computing,
    status: 201,
    call: (agent, workspace, at) =>
      agent
        .post(`${workspace}/${at}/revisions/1/annotations`)
        .send({ anchor: { kind: 'revision' }, text: 'Why?' }),
  },
  {
    what: 'annotation.reply',
    allowed: computing,
    status: 404,
    call: (agent, workspace, at) =>
      agent.post(`${workspace}/${at}/annotations/${nothing}/replies`).send({ text: 'So.' }),
  },
  ...['resolve', 'reopen'].map((verb): Case => ({
    what: `annotation.resolve: ${verb}`,
    allowed: computing,
    status: 404,
    call: (agent, workspace, at) => agent.post(`${workspace}/${at}/annotations/${nothing}/${verb}`),
  })),
  {
    what: 'share.list',
    allowed: computing,
    status: 200,
    call: (agent, workspace, at) => agent.get(`${workspace}/${at}/shares`),
  },
  {
    what: 'share.create',
    allowed: editors,
    status: 201,
    call: (agent, workspace, at) => agent.post(`${workspace}/${at}/revisions/1/shares`).send({}),
  },
  {
    what: 'share.revoke',
    allowed: editors,
    status: 404,
    call: (agent, workspace, at) => agent.delete(`${workspace}/${at}/shares/${nothing}`),
  },
];

const table = cases.flatMap((one) => all.map((role) => [role, one.what, one] as const));
/** The part of the table that is about one lattice, for those who may. */
const ofLattice = table.filter(
  ([role, , one]) => one.call.length === 3 && one.allowed.includes(role),
);

describe('each role and each action', () => {
  it.each(table)('%s: %s in the own workspace', async (role, _what, { allowed, status, call }) => {
    const response = await call(people[role].agent, '/api/workspaces/home', lattice);
    if (allowed.includes(role)) {
      expect(response.status).toBe(status);
    } else {
      expect([response.status, response.body.error.code]).toEqual([403, 'auth.forbidden']);
    }
  });

  it.each(table)('%s: %s, foreign and missing workspace alike', async (role, _what, { call }) => {
    for (const workspace of ['foreign', 'missing']) {
      const at = workspace === 'foreign' ? foreignLattice : lattice;
      const response = await call(people[role].agent, `/api/workspaces/${workspace}`, at);
      expect([response.status, response.body.error.code]).toEqual([404, 'workspace.not_found']);
    }
  });

  it.each(ofLattice)('%s: %s, foreign and missing lattice alike', async (role, _what, one) => {
    const places = [foreignLattice, `lattices/${nothing}`, 'lattices/nonsense', 'lattices/%00'];
    for (const at of places) {
      const response = await one.call(people[role].agent, '/api/workspaces/home', at);
      expect([at, response.status]).toEqual([at, 404]);
      expect(response.body.error.code).toMatch(/^(lattice|revision)\.not_found$/);
    }
  });

  it.each(cases.map((one) => [one.what, one] as const))('nobody: %s', async (_what, { call }) => {
    for (const workspace of ['home', 'missing']) {
      const response = await call(test.browser(), `/api/workspaces/${workspace}`, lattice);
      expect([response.status, response.body.error.code]).toEqual([401, 'auth.required']);
    }
  });
});

describe('what belongs to another workspace', () => {
  it('is not reached through an own lattice, by anyone', async () => {
    const { agent } = people.owner;
    const home = `/api/workspaces/home/${lattice}`;
    const answers = [
      await agent.post(`${home}/annotations/${foreignAnnotation}/resolve`),
      await agent.post(`${home}/annotations/${foreignAnnotation}/replies`).send({ text: 'x' }),
      await agent.delete(`${home}/shares/${foreignShare}`),
      await agent.get(`/api/workspaces/home/evaluations/${foreignHash}`),
    ];
    expect(answers.map(({ status }) => status)).toEqual([404, 404, 404, 404]);
  });
});

describe('steps that change what the table looks at', () => {
  it.each(all)('%s: submit, and delete', async (role) => {
    const made = below(await makeRevision(people.owner.agent, people.owner.workspace));
    const path = `/api/workspaces/home/${made}`;
    const may = editors.includes(role);
    const { agent } = people[role];
    expect((await agent.post(`${path}/revisions/1/submit`)).status).toBe(may ? 200 : 403);
    expect((await agent.delete(path)).status).toBe(may ? 200 : 403);
  });
});
