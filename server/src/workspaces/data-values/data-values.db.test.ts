import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { ionisationEnergyKjPerMol } from '#common/chemistry/element-energetics';
import { dataValuesLimit, ownDataValue, ownDataValueList } from '#common/schemas/data-values';
import { auditPage } from '#common/schemas/workspace';
import { signIn, startTestApp, type Agent, type SignedIn, type TestApp } from '#tests/helpers/app';

import { dataValues } from './data-value.table.js';
import { DataValuesService } from './data-values.service.js';

let test: TestApp;
beforeAll(async () => {
  test = await startTestApp();
});
afterAll(() => test.close());

const pathOf = ({ workspace }: SignedIn, key = ''): string =>
  `/api/workspaces/${workspace.slug}/data-values${key && `/${encodeURIComponent(key)}`}`;

const listOf = async (person: SignedIn, agent: Agent = person.agent) =>
  ownDataValueList.parse((await agent.get(pathOf(person)).expect(200)).body).items;

describe('a workspace’s own values', () => {
  it('are none at first', async () => {
    expect(await listOf(await signIn(test, 'reader'))).toEqual([]);
  });

  it('are kept with who, when and why, and read by every member', async () => {
    const person = await signIn(test, 'crystallographer');
    const before = test.clock.now().toISOString();
    const response = await person.agent
      .put(pathOf(person, 'ionisation:Na:1'))
      .send({ value: 497, note: '  Bench notes, 3 May ' })
      .expect(200);
    const kept = ownDataValue.parse(response.body);
    expect(kept).toMatchObject({
      key: 'ionisation:Na:1',
      value: 497,
      note: 'Bench notes, 3 May',
      setBy: { id: person.user.id, name: person.user.name },
    });
    expect(kept.setAt >= before && kept.setAt <= test.clock.now().toISOString()).toBe(true);
    const reader = await signIn(test, 'reader', person.workspace);
    expect(await listOf(person, reader.agent)).toEqual([kept]);
  });

  it('stand in the place of the shipped ones in look-ups, in their own workspace only', async () => {
    const person = await signIn(test, 'owner');
    const other = await signIn(test, 'owner');
    await person.agent.put(pathOf(person, 'ionisation:Na:1')).send({ value: 497, note: 'ours' });
    const service = test.app.get(DataValuesService);
    const own = await service.overridesOf(person.workspace.id);
    expect(ionisationEnergyKjPerMol('Na', 1, own)).toEqual({
      value: 497,
      source: 'ours',
      status: 'own',
    });
    const others = await service.overridesOf(other.workspace.id);
    expect(ionisationEnergyKjPerMol('Na', 1, others)?.value).toBe(495.8);
    expect(await listOf(other)).toEqual([]);
  });

  it('are replaced, and taken back, with an entry in the log for each', async () => {
    const person = await signIn(test, 'owner');
    const path = pathOf(person, 'bond-valence-r0:Na+1|O-2');
    await person.agent.put(path).send({ value: 1.8, note: '' }).expect(200);
    await person.agent.put(path).send({ value: 1.81, note: 'refined' }).expect(200);
    expect(await listOf(person)).toMatchObject([{ value: 1.81, note: 'refined' }]);
    await person.agent.delete(path).expect(200);
    expect(await listOf(person)).toEqual([]);
    const log = await person.agent.get(`/api/workspaces/${person.workspace.slug}/audit`);
    const subject = 'bond-valence-r0:Na+1|O-2';
    expect(auditPage.parse(log.body).items).toMatchObject([
      { action: 'data.restore', subject, detail: '1.81 Å → 1.803 Å' },
      { action: 'data.override', subject, detail: '1.8 Å → 1.81 Å' },
      { action: 'data.override', subject, detail: '1.803 Å → 1.8 Å' },
    ]);
  });

  it('may be given where nothing is shipped', async () => {
    const person = await signIn(test, 'owner');
    const path = pathOf(person, 'born-exponent:U+4');
    await person.agent.put(path).send({ value: 13, note: '' }).expect(200);
    await person.agent.delete(path).expect(200);
    const again = await person.agent.delete(path);
    expect([again.status, again.body.error.code]).toEqual([404, 'data.not_found']);
    const log = await person.agent.get(`/api/workspaces/${person.workspace.slug}/audit`);
    expect(auditPage.parse(log.body).items.map(({ detail }) => detail)).toEqual([
      '13 → none',
      'none → 13',
    ]);
  });

  it('are so many and no more', async () => {
    const person = await signIn(test, 'owner');
    await test.db.insert(dataValues).values(
      Array.from({ length: dataValuesLimit }, (_, index) => ({
        workspaceId: person.workspace.id,
        key: `thermochemical-radius:X${index}-1`,
        value: 2,
        setById: person.user.id,
      })),
    );
    const more = await person.agent.put(pathOf(person, 'mass:Na')).send({ value: 23, note: '' });
    expect([more.status, more.body.error.code]).toEqual([422, 'data.too_many']);
    const known = pathOf(person, 'thermochemical-radius:X7-1');
    await person.agent.put(known).send({ value: 2.1, note: '' }).expect(200);
  });
});

describe('a value that can’t be taken', () => {
  it.each([
    'mass:Xx',
    'mass:na',
    'mass',
    'mass:',
    ':Na',
    'weight:Na',
    'ionisation:Na:0',
    'ionisation:Na',
    'radius:Na+1',
    'radius:Na+1:25',
    'radius:Fe+2:6:strange',
    'bond-valence-r0:Na+1',
    'bond-valence-r0:O-2|Na+1',
    'mass:Na\u0000',
    'constructor',
    `thermochemical-radius:S${'O'.repeat(90)}-2`,
  ])('is refused by its key: %j', async (key) => {
    const person = await signIn(test, 'owner');
    const put = await person.agent.put(pathOf(person, key)).send({ value: 1, note: '' });
    const removed = await person.agent.delete(pathOf(person, key));
    for (const { status, body } of [put, removed]) {
      expect([status, body.error.code]).toEqual([422, 'data.key']);
      expect(body.error.details.fields).toMatchObject([{ code: 'data.key', field: 'key' }]);
    }
    expect(await listOf(person)).toEqual([]);
  });

  it.each([
    ['mass:Na', -1],
    ['mass:Na', 0],
    ['mass:Na', 1e6],
    ['radius:Na+1:6', 40],
    ['born-exponent:Na+1', 1],
    ['affinity:O:2', 1e9],
    ['bond-valence-b:Na+1|O-2', 0],
  ])('is refused by its size: %s %d', async (key, value) => {
    const person = await signIn(test, 'owner');
    const { status, body } = await person.agent.put(pathOf(person, key)).send({ value, note: '' });
    expect([status, body.error.code]).toEqual([422, 'data.value']);
    expect(body.error.details.fields).toMatchObject([{ code: 'data.value', field: 'value' }]);
    expect(body.error.message).toMatch(/must lie between/);
  });

  it.each([
    ['value', '{"value": "23", "note": ""}'],
    ['value', '{"value": null, "note": ""}'],
    ['value', '{"value": 1e999, "note": ""}'],
    ['value', '{"note": ""}'],
    ['note', '{"value": 23}'],
    ['note', `{"value": 23, "note": "${'n'.repeat(301)}"}`],
  ])('is refused by its form: %s in %s', async (field, json) => {
    const person = await signIn(test, 'owner');
    const { status, body } = await person.agent
      .put(pathOf(person, 'mass:Na'))
      .set('Content-Type', 'application/json')
      .send(json);
    expect([status, body.error.code]).toEqual([400, 'request.invalid']);
    expect(body.error.details.fields[0].field).toBe(field);
  });
});
