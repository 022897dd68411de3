import { readFileSync } from 'node:fs';
import path from 'node:path';

import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { appliedPrototype, prototypeList, readCifResponse } from '#common/schemas/prototype';
import { spaceGroupDetail, spaceGroupList } from '#common/schemas/symmetry';
import { signIn, startTestApp, type Agent, type TestApp } from '#tests/helpers/app';

import { structuresFolder } from './prototypes.js';

let test: TestApp;
let visitor: Agent;
let reader: Agent;

beforeAll(async () => {
  test = await startTestApp();
  visitor = test.browser();
  reader = (await signIn(test, 'reader')).agent;
});
afterAll(() => test.close());

describe('space groups', () => {
  it('are open to anyone and may be kept for a year', async () => {
    const { body, headers } = await visitor.get('/api/space-groups').expect(200);
    expect(spaceGroupList.parse(body).items).toHaveLength(530);
    expect(headers['cache-control']).toBe('public, max-age=31536000, immutable');
  });

  it('come one by one with their operations', async () => {
    const { body } = await visitor.get('/api/space-groups/419').expect(200);
    expect(spaceGroupDetail.parse(body).operations).toHaveLength(16);
  });

  it('end at 530, and a Hall number is a number', async () => {
    const beyond = await visitor.get('/api/space-groups/531').expect(404);
    expect(beyond.body.error.code).toBe('space_group.not_found');
    expect(beyond.headers['cache-control']).toBe('no-store');
    const word = await visitor.get('/api/space-groups/cubic').expect(400);
    expect(word.body.error.code).toBe('request.invalid');
  });
});

describe('structure types', () => {
  it('are for people who are signed in', async () => {
    await visitor.get('/api/prototypes').expect(401);
    const { body } = await reader.get('/api/prototypes').expect(200);
    expect(prototypeList.parse(body).items).toHaveLength(14);
  });

  it('take ions and answer with a cell', async () => {
    const ions = [
      { element: 'Mg', charge: 2 },
      { element: 'O', charge: -2 },
    ];
    await visitor.post('/api/prototypes/rock-salt/apply').send({ ions }).expect(401);
    const { body } = await reader
      .post('/api/prototypes/rock-salt/apply')
      .send({ ions })
      .expect(200);
    expect(appliedPrototype.parse(body).cell.lattice.a).toBe('4.24');
  });

  it('name the field of an ion that can’t be', async () => {
    const ions = [
      { element: 'Mg', charge: 2 },
      { element: 'Qq', charge: -2 },
    ];
    const { body } = await reader
      .post('/api/prototypes/rock-salt/apply')
      .send({ ions })
      .expect(400);
    expect(body.error.details.fields).toMatchObject([{ field: 'ions.1.element' }]);
    await reader.post('/api/prototypes/garnet/apply').send({ ions }).expect(404);
    await reader.post('/api/prototypes/rock-salt/apply').send({ ions: 'MgO' }).expect(400);
  });
});

describe('CIF files', () => {
  const text = readFileSync(path.join(structuresFolder(), 'spinel.cif'), 'utf8');

  it('are read into a cell', async () => {
    await visitor.post('/api/cif/read').send({ text }).expect(401);
    const { body } = await reader.post('/api/cif/read').send({ text }).expect(200);
    const { cell, suggestedName, warnings } = readCifResponse.parse(body);
    expect(suggestedName).toBe('Spinel');
    expect(cell.symmetry).toEqual({ kind: 'setting', hallNumber: 526 });
    expect(cell.sites.map(({ charge }) => charge)).toEqual(['2', '3', '-2']);
    expect(warnings).toEqual([]);
  });

  it('that can’t be read are answered with the line', async () => {
    const { body } = await reader.post('/api/cif/read').send({ text: 'data_x\n_a' }).expect(422);
    expect(body.error).toMatchObject({ code: 'cif.syntax', details: { line: 2 } });
  });
});
