import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { auditEvents } from '#server/audit/audit-event.table';
import { startTestApp, type Agent, type TestApp } from '#tests/helpers/app';
import { makeUser, testPassword } from '#tests/helpers/factories';

import { signInAttempts } from './sign-in-attempt.table.js';

let test: TestApp;
beforeAll(async () => {
  test = await startTestApp({ env: { HOLDFAST_TRUST_PROXY: '1' } });
});
afterAll(async () => {
  await test.close();
  delete process.env['HOLDFAST_TRUST_PROXY'];
});

let nextAddress = 1;
/** An address of its own, so that cases do not slow each other. */
const newAddress = () => `192.0.2.${nextAddress++}`;

const attempt = (agent: Agent, email: string, password: string, address: string) =>
  agent.post('/api/session').set('x-forwarded-for', address).send({ email, password });

async function fail(
  agent: Agent,
  email: string,
  address: string,
  times: number,
): Promise<number[]> {
  const statuses: number[] = [];
  for (let index = 0; index < times; index += 1) {
    statuses.push((await attempt(agent, email, 'wrong password', address)).status);
  }
  return statuses;
}

describe('guessing the password of an account', () => {
  it('is slowed after five failures, the right password included, and says for how long', async () => {
    const { email } = await makeUser(test.db);
    const address = newAddress();
    const agent = test.browser();
    expect(await fail(agent, email, address, 6)).toEqual([401, 401, 401, 401, 401, 429]);
    const refused = await attempt(agent, email, testPassword, address);
    expect(refused.status).toBe(429);
    expect(refused.body.error.code).toBe('auth.slowed');
    expect(refused.body.error.details.retryAfterSeconds).toBeGreaterThanOrEqual(1);
    expect(refused.headers['retry-after']).toBe(
      String(refused.body.error.details.retryAfterSeconds),
    );
  });

  it('waits longer each time but never more than a minute', async () => {
    const { email } = await makeUser(test.db);
    const agent = test.browser();
    await fail(agent, email, newAddress(), 5);
    const waits: number[] = [];
    for (let round = 0; round < 9; round += 1) {
      const slowed = await attempt(agent, email, 'wrong password', newAddress());
      const wait = slowed.body.error.details.retryAfterSeconds as number;
      waits.push(wait);
      test.clock.advance(wait * 1000);
      expect((await attempt(agent, email, 'wrong password', newAddress())).status).toBe(401);
    }
    expect(waits).toEqual([1, 2, 4, 8, 16, 32, 60, 60, 60]);
  });

  it('is slowed for an address without an account just the same', async () => {
    const statuses = await fail(test.browser(), 'ghost@kiln.example', newAddress(), 6);
    expect(statuses).toEqual([401, 401, 401, 401, 401, 429]);
  });

  it('is counted before it is judged: many at once gain nothing', async () => {
    const { email } = await makeUser(test.db);
    const address = newAddress();
    const answers = await Promise.all(
      Array.from({ length: 15 }, () => attempt(test.browser(), email, 'wrong password', address)),
    );
    const statuses = answers.map(({ status }) => status);
    expect(statuses.filter((status) => status === 401)).toHaveLength(5);
    expect(statuses.filter((status) => status === 429)).toHaveLength(10);
  });

  it('starts anew after the right password', async () => {
    const { email } = await makeUser(test.db);
    const address = newAddress();
    await fail(test.browser(), email, address, 4);
    expect((await attempt(test.browser(), email, testPassword, address)).status).toBe(200);
    expect(await fail(test.browser(), email, address, 5)).toEqual([401, 401, 401, 401, 401]);
  });

  it('does not keep the owner out of a browser they have signed in with', async () => {
    const { email } = await makeUser(test.db);
    const own = test.browser();
    await attempt(own, email, testPassword, newAddress());
    await own.delete('/api/session').expect(200);
    await fail(test.browser(), email, newAddress(), 6);
    expect((await attempt(test.browser(), email, testPassword, newAddress())).status).toBe(429);
    expect((await attempt(own, email, testPassword, newAddress())).status).toBe(200);
  });

  it('is slowed in a known browser too', async () => {
    const { email } = await makeUser(test.db);
    const own = test.browser();
    await attempt(own, email, testPassword, newAddress());
    expect(await fail(own, email, newAddress(), 6)).toEqual([401, 401, 401, 401, 401, 429]);
  });

  it('can’t use a known browser of another account', async () => {
    const [{ email: own }, { email: victim }] = [await makeUser(test.db), await makeUser(test.db)];
    const agent = test.browser();
    await attempt(agent, own, testPassword, newAddress());
    await fail(test.browser(), victim, newAddress(), 5);
    expect((await attempt(agent, victim, 'wrong password', newAddress())).status).toBe(429);
  });
});

describe('guessing from one address', () => {
  it('is slowed across accounts, and a right password of one’s own washes nothing clean', async () => {
    const address = newAddress();
    const { email: own } = await makeUser(test.db);
    for (let index = 0; index < 19; index += 1) {
      const email = `target-${index}@kiln.example`;
      expect((await attempt(test.browser(), email, 'wrong password', address)).status).toBe(401);
    }
    expect((await attempt(test.browser(), own, testPassword, address)).status).toBe(200);
    const next = (name: string) => attempt(test.browser(), name, 'wrong password', address);
    expect((await next('target-a@kiln.example')).status).toBe(401);
    expect((await next('target-b@kiln.example')).status).toBe(429);
  });
});

describe('over https', () => {
  it('sets cookies that never travel without encryption', async () => {
    const { email } = await makeUser(test.db);
    const response = await attempt(test.browser(), email, testPassword, newAddress()).set(
      'x-forwarded-proto',
      'https',
    );
    const cookies = response.headers['set-cookie'] as unknown as string[];
    expect(cookies).toHaveLength(2);
    for (const cookie of cookies) {
      expect(cookie).toMatch(/; Secure/);
      expect(cookie).toMatch(/; HttpOnly/);
    }
  });
});

describe('what is kept', () => {
  it('survives in the database by hash, and is forgotten after a day', async () => {
    const { email } = await makeUser(test.db);
    const address = newAddress();
    await fail(test.browser(), email, address, 6);
    const rows = await test.db.select().from(signInAttempts);
    expect(JSON.stringify(rows)).not.toContain(email);
    expect(JSON.stringify(rows)).not.toContain(address);
    test.clock.advance(25 * 3_600_000);
    expect(await fail(test.browser(), email, address, 5)).toEqual([401, 401, 401, 401, 401]);
  });

  it('is an audit event with the person for wrong and right passwords', async () => {
    const user = await makeUser(test.db);
    await attempt(test.browser(), user.email, 'wrong password', newAddress());
    await attempt(test.browser(), user.email, testPassword, newAddress());
    const events = await test.db
      .select({ action: auditEvents.action, address: auditEvents.address })
      .from(auditEvents)
      .where(eq(auditEvents.actorId, user.id))
      .orderBy(auditEvents.id);
    expect(events.map(({ action }) => action)).toEqual(['auth.sign_in_failed', 'auth.sign_in']);
    expect(events.every(({ address }) => address?.startsWith('192.0.2.'))).toBe(true);
  });
});
