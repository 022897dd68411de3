import { Client } from 'pg';

/** Address of the server that tests may make databases on. */
export function testServerUrl(): URL {
  const text = process.env['HOLDFAST_TEST_DATABASE_URL'];
  if (text === undefined || text === '') {
    throw new Error('Set HOLDFAST_TEST_DATABASE_URL, or run the tests by npm test, which does.');
  }
  return new URL(text);
}

/** Runs statements one by one as the role that may make databases. */
export async function administer(...statements: readonly string[]): Promise<void> {
  const client = new Client({ connectionString: testServerUrl().href });
  await client.connect();
  try {
    for (const statement of statements) {
      await client.query(statement);
    }
  } finally {
    await client.end();
  }
}

/**
 * Drops a database with whatever of ours is still connected. Not `with (force)`: that also wants to
 * end an autovacuum worker that happens to be there, which only a superuser may; a plain drop asks
 * it to leave by itself.
 */
export async function dropDatabase(name: string): Promise<void> {
  await administer(
    `select pg_terminate_backend(pid) from pg_stat_activity where datname = '${name}' and usename = current_user`,
    `drop database if exists ${name}`,
  );
}
