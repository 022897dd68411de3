import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { storedEvaluation } from '#common/schemas/evaluation';
import { signIn, startTestApp, type SignedIn, type TestApp } from '#tests/helpers/app';
import { magnesiaEnergyEv, rockSalt } from '#tests/helpers/cells';

let test: TestApp;
let person: SignedIn;
let path: string;
beforeAll(async () => {
  test = await startTestApp();
  person = await signIn(test, 'crystallographer');
  path = `/api/workspaces/${person.workspace.slug}/evaluations`;
});
afterAll(() => test.close());

async function countOf(hash: string): Promise<number> {
  const { rows } = await test.db.execute<{ n: number }>(
    `select count(*)::int as n from evaluations where hash = '${hash}'`,
  );
  return rows[0]!.n;
}

describe('an evaluation', () => {
  it('gives the energy of MgO within its own bound', async () => {
    const response = await person.agent.post(path).send({ cell: rockSalt() }).expect(200);
    const { result, hash, durationMs } = storedEvaluation.parse(response.body);
    const { value, bound } = result.energyEvPerFormulaUnit;
    expect(Math.abs(value - magnesiaEnergyEv)).toBeLessThanOrEqual(bound);
    expect(bound).toBeLessThan(1e-8);
    expect(result.formula).toBe('MgO');
    expect(hash).toMatch(/^[0-9a-f]{64}$/);
    expect(durationMs).toBeGreaterThan(0);
  });

  it('is computed once, and read with the same digits by its hash', async () => {
    const first = (await person.agent.post(path).send({ cell: rockSalt({ a: '4.3' }) })).body;
    const again = (await person.agent.post(path).send({ cell: rockSalt({ a: '43/10' }) })).body;
    expect(again).toEqual(first);
    const read = await person.agent.get(`${path}/${first.hash}`).expect(200);
    expect(read.body).toEqual(first);
  });

  it('is shared by all who ask at the same time', async () => {
    const cell = rockSalt({ a: '4.4' });
    const answers = await Promise.all(
      Array.from({ length: 6 }, () => person.agent.post(path).send({ cell })),
    );
    const [first] = answers;
    expect(first!.status).toBe(200);
    expect(answers.every(({ body }) => JSON.stringify(body) === first!.text)).toBe(true);
    expect(await countOf(first!.body.hash)).toBe(1);
  });

  it('is not known by its hash to a workspace that has not asked for it', async () => {
    const { hash } = (await person.agent.post(path).send({ cell: rockSalt({ a: '4.5' }) })).body;
    const stranger = await signIn(test, 'owner');
    const theirs = `/api/workspaces/${stranger.workspace.slug}/evaluations`;
    for (const asked of [hash, '0'.repeat(64), 'x', '%00']) {
      const response = await stranger.agent.get(`${theirs}/${asked}`);
      expect([response.status, response.body.error.code]).toEqual([404, 'evaluation.not_found']);
    }
    await stranger.agent
      .post(theirs)
      .send({ cell: rockSalt({ a: '4.5' }) })
      .expect(200);
    await stranger.agent.get(`${theirs}/${hash}`).expect(200);
  });

  it('depends on the method', async () => {
    const cell = rockSalt({ a: '4.6' });
    const method = { toleranceRelative: 1e-6, uniformBackground: false };
    const loose = (await person.agent.post(path).send({ cell, method })).body;
    const usual = (await person.agent.post(path).send({ cell })).body;
    expect(loose.hash).not.toBe(usual.hash);
    expect(loose.result.method).toEqual(method);
  });

  it('is refused to a reader', async () => {
    const reader = await signIn(test, 'reader', person.workspace);
    const response = await reader.agent.post(path).send({ cell: rockSalt() });
    expect([response.status, response.body.error.code]).toEqual([403, 'auth.forbidden']);
  });

  it('never changes in the database', async () => {
    const change = test.db.execute('update evaluations set duration_ms = 0');
    await expect(change).rejects.toMatchObject({
      cause: { constraint: 'evaluations_immutable' },
    });
  });

  it('survives callers who leave before the answer', async () => {
    const cell = rockSalt({ a: '4.7' });
    const leaving = person.agent.post(path).send({ cell }).timeout(1);
    await expect(leaving).rejects.toMatchObject({ timeout: 1 });
    const response = await person.agent.post(path).send({ cell }).expect(200);
    expect(response.body.result.formula).toBe('MgO');
  });
});
