import { randomBytes } from 'node:crypto';

import { Client, Pool } from 'pg';

import { openDatabase, type Database } from '#server/database/database';
import { migrateDatabase } from '#server/database/migrate';

/** A database of its own for one test file. */
export interface TestDatabase {
  readonly url: string;
  readonly pool: Pool;
  readonly db: Database;
  /** Closes the connections and drops the database. */
  drop(): Promise<void>;
}

function serverUrl(): URL {
  const text = process.env['HOLDFAST_TEST_DATABASE_URL'];
  if (text === undefined || text === '') {
    throw new Error('Set HOLDFAST_TEST_DATABASE_URL, or run the tests by npm test, which does.');
  }
  return new URL(text);
}

async function administer(statement: string): Promise<void> {
  const client = new Client({ connectionString: serverUrl().href });
  await client.connect();
  try {
    await client.query(statement);
  } finally {
    await client.end();
  }
}

/** Makes an empty database. */
export async function createEmptyDatabase(): Promise<TestDatabase> {
  const name = `holdfast_test_${randomBytes(8).toString('hex')}`;
  await administer(`create database ${name}`);
  const url = serverUrl();
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
      await administer(`drop database if exists ${name} with (force)`);
    },
  };
}

/** Makes a database with all tables. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const database = await createEmptyDatabase();
  await migrateDatabase(database.pool);
  return database;
}
