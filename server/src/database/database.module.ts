import { Global, Inject, Logger, Module, type OnApplicationShutdown } from '@nestjs/common';
import { Pool } from 'pg';

import { APP_CONFIG, type AppConfig } from '#server/config/environment';

import { DATABASE, DATABASE_POOL, openDatabase } from './database.js';
import { migrateDatabase } from './migrate.js';

async function openPool(config: AppConfig): Promise<Pool> {
  const pool = new Pool({
    connectionString: config.databaseUrl,
    max: config.databaseConnections,
    connectionTimeoutMillis: 10_000,
    idleTimeoutMillis: 30_000,
    statement_timeout: 30_000,
    application_name: 'holdfast',
  });
  // An idle connection that breaks must not end the server; the next query opens another.
  pool.on('error', (error) => new Logger('Database').warn(`Connection lost: ${error.message}`));
  try {
    await migrateDatabase(pool);
  } catch (error) {
    await pool.end();
    throw error;
  }
  return pool;
}

@Global()
@Module({
  providers: [
    { provide: DATABASE_POOL, inject: [APP_CONFIG], useFactory: openPool },
    { provide: DATABASE, inject: [DATABASE_POOL], useFactory: openDatabase },
  ],
  exports: [DATABASE, DATABASE_POOL],
})
export class DatabaseModule implements OnApplicationShutdown {
  constructor(@Inject(DATABASE_POOL) private readonly pool: Pool) {}

  async onApplicationShutdown(): Promise<void> {
    await this.pool.end();
  }
}
