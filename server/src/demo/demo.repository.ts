import { Inject, Injectable } from '@nestjs/common';
import { eq, inArray, notInArray } from 'drizzle-orm';

import {
  DATABASE,
  DATABASE_POOL,
  withTransaction,
  type Database,
  type DatabasePool,
} from '#server/database/database';
import { users } from '#server/users/user.table';
import { memberships } from '#server/workspaces/membership.table';
import { workspaces } from '#server/workspaces/workspace.table';

/** Any number will do, as long as every server of the product uses the same. */
const demoLock = 4_310_002;

@Injectable()
export class DemoRepository {
  constructor(
    @Inject(DATABASE) private readonly db: Database,
    @Inject(DATABASE_POOL) private readonly pool: DatabasePool,
  ) {}

  /** Runs the work while no other server does the same; a killed one blocks nobody. */
  async exclusively(work: () => Promise<void>): Promise<void> {
    const client = await this.pool.connect();
    try {
      await client.query('select pg_advisory_lock($1)', [demoLock]);
      await work();
    } finally {
      // Closing the connection gives the lock back, whatever state it is in.
      client.release(true);
    }
  }

  /** Whether anyone but these addresses has an account. */
  async hasOthers(emails: readonly string[]): Promise<boolean> {
    const rows = await this.db
      .select({ id: users.id })
      .from(users)
      .where(notInArray(users.email, [...emails]))
      .limit(1);
    return rows.length > 0;
  }

  /** Removes what a start that was cut short has left: these people and their workspaces. */
  async clear(emails: readonly string[]): Promise<void> {
    const people = inArray(users.email, [...emails]);
    await withTransaction(this.db, async (tx) => {
      const theirs = tx
        .select({ id: memberships.workspaceId })
        .from(memberships)
        .innerJoin(users, eq(users.id, memberships.userId))
        .where(people);
      await tx.delete(workspaces).where(inArray(workspaces.id, theirs));
      await tx.delete(users).where(people);
    });
  }
}
