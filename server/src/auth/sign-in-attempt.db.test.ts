import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { TestClock } from '#tests/helpers/clock';
import { createTestDatabase, type TestDatabase } from '#tests/helpers/database';

import { SignInAttemptRepository, type AttemptKey } from './sign-in-attempt.repository.js';
import { signInAttempts } from './sign-in-attempt.table.js';

let database: TestDatabase;
let clock: TestClock;
let attempts: SignInAttemptRepository;
beforeAll(async () => {
  database = await createTestDatabase();
  clock = new TestClock();
  attempts = new SignInAttemptRepository(database.db, clock);
});
afterAll(() => database.drop());

const keys = (account: string, address: string): AttemptKey[] => [
  { kind: 'account', value: account },
  { kind: 'address', value: address },
];

describe('counting tries', () => {
  it('never ends in a ring of waiting when tries begin and succeed all at once', async () => {
    const same = keys('ida@kiln.example', '192.0.2.1');
    for (let round = 0; round < 10; round += 1) {
      const work = Array.from({ length: 12 }, (_, index) =>
        index % 2 === 0 ? attempts.begin(same) : attempts.succeed(same),
      );
      const settled = await Promise.allSettled(work);
      expect(settled.filter(({ status }) => status === 'rejected')).toEqual([]);
      clock.advance(3_600_000);
    }
  });

  it('forgets after a day, and not before', async () => {
    await attempts.begin(keys('ole@kiln.example', '192.0.2.2'));
    clock.advance(23 * 3_600_000);
    await attempts.forgetOld();
    expect((await database.db.select().from(signInAttempts)).length).toBeGreaterThan(0);
    clock.advance(2 * 3_600_000);
    await attempts.forgetOld();
    expect(await database.db.select().from(signInAttempts)).toEqual([]);
  });
});
