import { Inject, Injectable } from '@nestjs/common';
import { sql } from 'drizzle-orm';

import { DATABASE, type Database } from '#server/database/database';

@Injectable()
export class HealthRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  /** Asks the database for nothing; throws when it does not answer. */
  async ping(): Promise<void> {
    await this.db.execute(sql`select 1`);
  }
}
