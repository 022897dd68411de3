import { randomBytes } from 'node:crypto';

import { Pool } from 'pg';

import { openDatabase, type Database } from '#server/database/database';
import { migrateDatabase } from '#server/database/migrate';

import { administer, dropDatabase, testServerUrl } from './administer.js';

/** A database of its own for one test file. */
export interface TestDatabase {
  readonly url: string;
  readonly pool: Pool;
  readonly db: Database;
  /** Closes the connections and drops the database. */
  drop(): Promise<void>;
}

/** Makes an empty database. */
export async function createEmptyDatabase(): Promise<TestDatabase> {
  const name = `holdfast_test_${randomBytes(8).toString('hex')}`;
  await administer(`create database ${name}`);
  const url = testServerUrl();
  url.pathname = `/${name}`;
  const pool = new Pool({ connectionString: url.href, max: 12 });
  // The server may close idle connections when the database is dropped.
  pool.on('error', () => undefined);
  return {
    url: url.href,
    pool,
    db: openDatabase(pool),
    drop: async () => {
      await pool.end();
      await dropDatabase(name);
    },
  };
}

/** Makes a database with all tables. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const database = await createEmptyDatabase();
  await migrateDatabase(database.pool);
  return database;
}
