import { drizzle, type NodePgDatabase } from 'drizzle-orm/node-postgres';
import type { Pool } from 'pg';

/** Token of the {@link Database}: `@Inject(DATABASE) private readonly db: Database`. */
export const DATABASE = Symbol('DATABASE');

/** Token of the connection pool, for the few that need plain `pg`. */
export const DATABASE_POOL = Symbol('DATABASE_POOL');

export type Database = NodePgDatabase;

export type DatabasePool = Pool;

/** What a callback of {@link withTransaction} gets. */
export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0];

/** Either: repositories take one so that their calls can join a transaction. */
export type Executor = Database | Transaction;

export const openDatabase = (pool: Pool): Database => drizzle(pool);

/** Runs the work in one transaction: all of it is kept, or nothing when it throws. */
export function withTransaction<T>(
  db: Database,
  work: (tx: Transaction) => Promise<T>,
): Promise<T> {
  return db.transaction(work);
}
