import fc from 'fast-check';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { problemBody } from '#common/errors/problem';
import type { CellDefinition } from '#common/schemas/cell';
import { storedEvaluation } from '#common/schemas/evaluation';

import { signIn, startTestApp, type SignedIn, type TestApp } from '../helpers/app.js';
import { rockSalt } from '../helpers/cells.js';
import { latticesPath, makeRevision } from '../helpers/lattices.js';

let test: TestApp;
let person: SignedIn;
let workspace: string;
beforeAll(async () => {
  test = await startTestApp();
  person = await signIn(test, 'owner');
  workspace = `/api/workspaces/${person.workspace.slug}`;
});
afterAll(() => test.close());

const evaluate = (cell: unknown) => person.agent.post(`${workspace}/evaluations`).send({ cell });

type Change = (cell: CellDefinition) => unknown;

const withLattice =
  (change: Partial<CellDefinition['lattice']>): Change =>
  (cell) => ({
    ...cell,
    symmetry: { kind: 'operations', operations: ['x, y, z'] },
    lattice: { ...cell.lattice, ...change },
  });
const withSite =
  (change: Partial<CellDefinition['sites'][number]>): Change =>
  (cell) => ({
    ...cell,
    sites: cell.sites.map((site, i) => (i === 0 ? { ...site, ...change } : site)),
  });

/** Many sites of one kind at places of their own in a cell without symmetry. */
const crowd: Change = (cell) => ({
  ...cell,
  lattice: { ...cell.lattice, a: '4000', b: '4000', c: '4000' },
  sites: Array.from({ length: 400 }, (_, i) => ({
    ...cell.sites[i % 2]!,
    label: `S${i}`,
    x: `${0.001 + i / 1000}`,
    y: '0.0123',
    z: '0.0271',
  })),
});

const bad: [string, Change, string, string][] = [
  [
    'charges that do not balance',
    withSite({ charge: '3' }),
    'cell.not_neutral',
    'cell.sites.0.charge',
  ],
  [
    'no charges',
    (c) => rockSalt({ charges: ['0', '0'], a: c.lattice.a }),
    'cell.no_charges',
    'cell.sites',
  ],
  [
    'two sites on one place',
    (c) => ({ ...c, sites: c.sites.map((site) => ({ ...site, x: '0', y: '0', z: '0' })) }),
    'cell.coincident_sites',
    'cell.sites.1',
  ],
  [
    'no volume',
    withLattice({ alpha: '60', beta: '60', gamma: '119.99999999999999' }),
    'cell.zero_volume',
    'cell.lattice',
  ],
  [
    'an angle as wide as the other two',
    withLattice({ alpha: '60', beta: '60', gamma: '120' }),
    'cell.angle_sum',
    'cell.lattice',
  ],
  [
    'angles beyond 360°',
    withLattice({ alpha: '130', beta: '130', gamma: '130' }),
    'cell.angle_sum',
    'cell.lattice',
  ],
  ['an angle of 180°', withLattice({ alpha: '180' }), 'cell.angle', 'cell.lattice.alpha'],
  ['an edge of nothing', withLattice({ a: '0' }), 'cell.length', 'cell.lattice.a'],
  ['an edge below nothing', withLattice({ b: '-4' }), 'cell.length', 'cell.lattice.b'],
  [
    'edges a cubic cell can’t have',
    (c) => ({ ...c, lattice: { ...c.lattice, b: '5' } }),
    'cell.system_constraint',
    'cell.lattice.b',
  ],
  ['an expression cut short', withSite({ x: '1/' }), 'cell.expression', 'cell.sites.0.x'],
  ['a name nobody has given', withSite({ y: 'v' }), 'cell.expression', 'cell.sites.0.y'],
  ['no such element', withSite({ element: 'Xx' }), 'cell.element', 'cell.sites.0.element'],
  ['too much charge', withSite({ charge: '12' }), 'cell.charge', 'cell.sites.0.charge'],
  [
    'an occupancy above one',
    withSite({ occupancy: '1.2' }),
    'cell.occupancy',
    'cell.sites.0.occupancy',
  ],
  [
    'an occupancy of nothing',
    withSite({ occupancy: '0' }),
    'cell.occupancy',
    'cell.sites.0.occupancy',
  ],
  ['a label twice', withSite({ label: 'O1' }), 'cell.label', 'cell.sites.1.label'],
  ['no sites', (c) => ({ ...c, sites: [] }), 'cell.no_sites', 'cell.sites'],
  [
    'a circle of parameters',
    (c) => ({
      ...c,
      parameters: [
        { name: 'u', expression: 'v' },
        { name: 'v', expression: 'u' },
      ],
    }),
    'cell.parameter_cycle',
    'cell.parameters.0.expression',
  ],
  [
    'an operation that is none',
    (c) => ({ ...c, symmetry: { kind: 'operations', operations: ['x, y'] } }),
    'cell.operation',
    'cell.symmetry',
  ],
  ['more than 20 000 sites', crowd, 'cell.too_many_sites', 'cell.sites'],
];

describe('a bad cell', () => {
  it.each(bad)('with %s', async (_what, change, code, field) => {
    const response = await evaluate(change(rockSalt()));
    const { error } = problemBody.parse(response.body);
    expect([response.status, error.code]).toEqual([422, code]);
    const fields = error.details?.fields ?? [];
    expect(fields.length).toBeGreaterThan(0);
    expect(fields.some((one) => one.field.startsWith(field))).toBe(true);
    expect(fields.every((one) => one.message.length > 10)).toBe(true);
  });

  it('names every field at fault at once', async () => {
    const response = await evaluate(rockSalt({ a: 'wide', cation: 'Xx', charges: ['many', '-2'] }));
    const fields = problemBody
      .parse(response.body)
      .error.details!.fields!.map(({ field }) => field);
    expect(fields).toEqual(
      expect.arrayContaining(['cell.lattice.a', 'cell.sites.0.element', 'cell.sites.0.charge']),
    );
  });

  it('is evaluated all the same where the background is asked for', async () => {
    const method = { toleranceRelative: 1e-10, uniformBackground: true };
    const cell = rockSalt({ charges: ['3', '-2'] });
    const response = await person.agent
      .post(`${workspace}/evaluations`)
      .send({ cell, method })
      .expect(200);
    const { result } = storedEvaluation.parse(response.body);
    expect(result.warnings.length).toBeGreaterThan(0);
  });
});

const expression = fc.oneof(
  fc.constantFrom('0', '1/2', '1/3', '0.25', 'u', '1/2 - u', '-1', '2', '1e3', '1e-9', '(', ''),
  fc.double({ min: -10, max: 10, noNaN: true }).map(String),
  fc.string({ maxLength: 12 }),
);
const edge = fc.oneof(fc.double({ min: 0.5, max: 12, noNaN: true }).map(String), expression);
const angle = fc.oneof(fc.double({ min: 20, max: 170, noNaN: true }).map(String), expression);
const site = fc.record({
  label: fc.oneof(fc.constantFrom('A', 'B', 'C', 'D', ''), fc.string({ maxLength: 24 })),
  element: fc.constantFrom('Na', 'Cl', 'Mg', 'O', 'Xx', ''),
  charge: fc.oneof(fc.constantFrom('1', '-1', '2', '-2', '0'), expression),
  x: expression,
  y: expression,
  z: expression,
  occupancy: fc.oneof(fc.constant('1'), expression),
});
const symmetry = fc.oneof(
  fc.record({ kind: fc.constant('setting'), hallNumber: fc.integer({ min: 1, max: 530 }) }),
  fc.record({
    kind: fc.constant('operations'),
    operations: fc.array(
      fc.oneof(fc.constantFrom('x, y, z', '-x, -y, -z', 'y, x, -z'), fc.string({ maxLength: 20 })),
      { minLength: 1, maxLength: 4 },
    ),
  }),
);
const cell = fc.record({
  lattice: fc.record({ a: edge, b: edge, c: edge, alpha: angle, beta: angle, gamma: angle }),
  symmetry,
  parameters: fc.array(
    fc.record({ name: fc.oneof(fc.constant('u'), fc.string({ maxLength: 5 })), expression }),
    { maxLength: 2 },
  ),
  sites: fc.array(site, { maxLength: 5 }),
});

/** Nobody asked for this status: the server itself has failed. */
function expectNoFailure(response: { status: number; body: unknown }): void {
  expect(response.status).toBeLessThan(500);
  if (response.status >= 400) {
    problemBody.parse(response.body);
  } else {
    storedEvaluation.parse(response.body);
  }
}

describe('whatever comes', () => {
  it('a cell is evaluated or refused', async () => {
    await fc.assert(
      fc.asyncProperty(cell, async (one) => expectNoFailure(await evaluate(one))),
      { numRuns: 250 },
    );
  });

  it('garbage is refused', async () => {
    await fc.assert(
      fc.asyncProperty(fc.jsonValue(), async (body) => {
        const response = await person.agent
          .post(`${workspace}/evaluations`)
          .set('content-type', 'application/json')
          .send(JSON.stringify(body));
        expect(response.status).toBe(400);
        problemBody.parse(response.body);
      }),
      { numRuns: 100 },
    );
  });

  const unstorable = ['a\0b', '\ud800', 'ok'];

  it.each(unstorable)('text like %j in any body is refused or kept', async (text) => {
    const status = text === 'ok' ? [201, 200, 201, 201] : [400, 400, 400, 400];
    const { agent } = person;
    const path = await makeRevision(agent, person.workspace);
    const method = { toleranceRelative: 1e-10, uniformBackground: false };
    const marked = { ...rockSalt(), parameters: [{ name: text, expression: '1' }] };
    const remark = { anchor: { kind: 'revision' }, text };
    const answers = [
      await agent.post(latticesPath(person.workspace)).send({ name: text, cell: rockSalt() }),
      await agent.put(`${path}/draft`).set('if-match', '"r1-v0"').send({ cell: marked, method }),
      await agent.post(`${path}/revisions/1/annotations`).send(remark),
      await agent.post(latticesPath(person.workspace)).send({ name: 'x', cell: marked }),
    ];
    expect(answers.map((one) => one.status)).toEqual(status);
  });

  it.each(['', 'lattices', 'lattices/x/draft', 'lattices/x/revisions', 'evaluations'])(
    'a body that is no JSON, or too deep, is refused at /%s',
    async (tail) => {
      const deep = `${'['.repeat(20_000)}${']'.repeat(20_000)}`;
      for (const body of ['{', 'null', '"x"', '[]', deep]) {
        for (const verb of ['post', 'put', 'patch', 'delete'] as const) {
          const response = await person.agent[verb](`${workspace}/${tail}`)
            .set('content-type', 'application/json')
            .set('if-match', '"r0-v0"')
            .send(body);
          expect(response.status).toBeGreaterThanOrEqual(400);
          expect(response.status).toBeLessThan(500);
        }
      }
    },
  );

  it.each(['%00', '%ff', '..%2f..', 'a'.repeat(3000)])(
    'an address with %s finds nothing',
    async (part) => {
      for (const path of [
        `/api/workspaces/${part}/lattices`,
        `${workspace}/lattices/${part}`,
        `${workspace}/lattices/${part}/draft`,
        `${workspace}/evaluations/${part}`,
        `/api/shares/${part}`,
      ]) {
        const { status } = await person.agent.get(path);
        expect([path, status >= 400 && status < 500]).toEqual([path, true]);
      }
    },
  );
});
