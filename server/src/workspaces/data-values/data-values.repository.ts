import { Inject, Injectable } from '@nestjs/common';
import { and, asc, eq, sql } from 'drizzle-orm';

import { DATABASE, type Database, type Executor } from '#server/database/database';
import { users } from '#server/users/user.table';

import { dataValues } from './data-value.table.js';

/** A workspace's own value with who set it. */
export interface OwnValueRow {
  readonly key: string;
  readonly value: number;
  readonly note: string;
  readonly setById: string;
  readonly setByName: string;
  readonly setAt: Date;
}

const fields = {
  key: dataValues.key,
  value: dataValues.value,
  note: dataValues.note,
  setById: dataValues.setById,
  setByName: users.name,
  setAt: dataValues.setAt,
};

const place = (workspaceId: string, key: string) =>
  and(eq(dataValues.workspaceId, workspaceId), eq(dataValues.key, key));

@Injectable()
export class DataValuesRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  /** All of a workspace's own values, by key. */
  async list(workspaceId: string): Promise<OwnValueRow[]> {
    return this.db
      .select(fields)
      .from(dataValues)
      .innerJoin(users, eq(users.id, dataValues.setById))
      .where(eq(dataValues.workspaceId, workspaceId))
      .orderBy(asc(dataValues.key));
  }

  async find(workspaceId: string, key: string, executor: Executor): Promise<OwnValueRow | null> {
    const [row] = await executor
      .select(fields)
      .from(dataValues)
      .innerJoin(users, eq(users.id, dataValues.setById))
      .where(place(workspaceId, key));
    return row ?? null;
  }

  async count(workspaceId: string, executor: Executor): Promise<number> {
    return executor.$count(dataValues, eq(dataValues.workspaceId, workspaceId));
  }

  /** Writes a value in place of the one under the same key. */
  async put(row: typeof dataValues.$inferInsert, executor: Executor): Promise<void> {
    await executor
      .insert(dataValues)
      .values(row)
      .onConflictDoUpdate({
        target: [dataValues.workspaceId, dataValues.key],
        set: {
          value: sql`excluded.value`,
          note: sql`excluded.note`,
          setById: sql`excluded.set_by_id`,
          setAt: sql`excluded.set_at`,
        },
      });
  }

  async remove(workspaceId: string, key: string, executor: Executor): Promise<void> {
    await executor.delete(dataValues).where(place(workspaceId, key));
  }
}
