import { afterAll, beforeAll, describe, expect, it } from 'vitest';

import { createTestDatabase, type TestDatabase } from '#tests/helpers/database';

import { InstallationRepository } from './installation.repository.js';
import { installation } from './installation.table.js';

let database: TestDatabase;
let repository: InstallationRepository;
beforeAll(async () => {
  database = await createTestDatabase();
  repository = new InstallationRepository(database.db);
});
afterAll(() => database.drop());

const notice = (password: string) => ({
  workspaceName: 'Kiln Lane',
  password,
  people: [{ name: 'Mira Okafor', email: 'mira@kiln.example', role: 'owner' as const }],
});

describe('the demo’s notice', () => {
  it('is not there until it is written, then the newest', async () => {
    expect(await repository.readDemoNotice()).toBeNull();
    await repository.writeDemoNotice(notice('first'));
    await repository.writeDemoNotice(notice('second'));
    expect(await repository.readDemoNotice()).toEqual(notice('second'));
  });

  it('stands in the one row there can be', async () => {
    await expect(database.db.insert(installation).values({ isOnlyRow: false })).rejects.toThrow();
    await expect(database.db.insert(installation).values({})).rejects.toThrow();
  });
});
