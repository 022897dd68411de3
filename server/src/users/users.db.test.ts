import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { createTestDatabase, type TestDatabase } from '#tests/helpers/database';
import { join, makeUser, makeWorkspace, testPassword } from '#tests/helpers/factories';

import { PasswordHasher } from './password-hasher.js';
import { users } from './user.table.js';
import { UsersRepository } from './users.repository.js';
import { UsersService } from './users.service.js';

let database: TestDatabase;
let service: UsersService;
beforeAll(async () => {
  database = await createTestDatabase();
  service = new UsersService(new UsersRepository(database.db), new PasswordHasher());
});
afterAll(() => database.drop());

describe('accounts', () => {
  it('are one for each address, whatever its capitals, also for two at the same moment', async () => {
    const account = { name: 'Una', password: testPassword };
    const made = await Promise.allSettled(
      ['una@kiln.example', 'UNA@kiln.example'].map((email) =>
        service.createUser({ ...account, email }),
      ),
    );
    expect(made.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
    await expect(
      service.createUser({ ...account, email: 'Una@Kiln.example' }),
    ).rejects.toMatchObject({ code: 'member.already' });
    expect(await service.findByEmail('uNa@kiln.example')).toMatchObject({ name: 'Una' });
  });

  it('open with their own password only', async () => {
    const user = await service.createUser({
      name: 'Eli',
      email: 'eli@kiln.example',
      password: 'velvet harbour nine',
    });
    expect(await service.passwordFits(user, 'velvet harbour nine')).toBe(true);
    expect(await service.passwordFits(user, 'velvet harbour ten')).toBe(false);
    expect(await service.passwordFits(null, 'velvet harbour nine')).toBe(false);
  });

  it('see their workspaces by name', async () => {
    const user = await makeUser(database.db, { name: 'Ole Berg' });
    const [second, first] = [
      await makeWorkspace(database.db, { name: 'B room' }),
      await makeWorkspace(database.db, { name: 'A room' }),
    ];
    await join(database.db, second, user, 'reader');
    await join(database.db, first, user, 'owner');
    const current = await service.currentUser(user.id);
    expect(current).toMatchObject({ initials: 'OB' });
    expect(current?.memberships.map(({ workspaceName, role }) => [workspaceName, role])).toEqual([
      ['A room', 'owner'],
      ['B room', 'reader'],
    ]);
    expect(await service.currentUser('01900000-0000-7000-8000-000000000000')).toBeNull();
  });

  it.each([
    ['an empty name', { name: '  ' }],
    ['no address', { email: 'nobody' }],
    ['a password that is not hashed', { passwordHash: 'open sesame' }],
  ])('are refused by the database with %s', async (_what, wrong) => {
    const right = { name: 'X', email: 'x@kiln.example', passwordHash: '$argon2id$v=19$x' };
    await expect(database.db.insert(users).values({ ...right, ...wrong })).rejects.toThrow();
  });
});
