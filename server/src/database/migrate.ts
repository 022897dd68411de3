import path from 'node:path';

import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate } from 'drizzle-orm/node-postgres/migrator';
import type { Pool } from 'pg';

import { projectRoot } from '../config/project-root.js';

/** Any number will do, as long as every server of the product uses the same. */
const migrationLock = 4_310_001;

export const migrationsFolder = (): string => path.join(projectRoot(), 'drizzle', 'migrations');

/**
 * Brings the database to the newest state. Servers that start together wait for each other on an
 * advisory lock, which ends with the connection, so a killed server blocks nobody.
 */
export async function migrateDatabase(pool: Pool, folder = migrationsFolder()): Promise<void> {
  const client = await pool.connect();
  try {
    await client.query('select pg_advisory_lock($1)', [migrationLock]);
    await migrate(drizzle(client), { migrationsFolder: folder });
    await client.query('select pg_advisory_unlock($1)', [migrationLock]);
    client.release();
  } catch (error) {
    client.release(true);
    throw error;
  }
}
