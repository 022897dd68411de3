import { Inject, Injectable } from '@nestjs/common';
import { asc, eq, sql } from 'drizzle-orm';

import type { MembershipSummary } from '#common/schemas/auth';
import { DATABASE, type Database, type Executor } from '#server/database/database';
import { memberships } from '#server/workspaces/membership.table';
import { workspaces } from '#server/workspaces/workspace.table';

import { users, type UserRow } from './user.table.js';

@Injectable()
export class UsersRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  async insert(
    user: { name: string; email: string; passwordHash: string },
    executor: Executor = this.db,
  ): Promise<UserRow> {
    const [row] = await executor.insert(users).values(user).returning();
    return row!;
  }

  async findById(id: string): Promise<UserRow | null> {
    const [row] = await this.db.select().from(users).where(eq(users.id, id));
    return row ?? null;
  }

  async findByEmail(email: string, executor: Executor = this.db): Promise<UserRow | null> {
    const [row] = await executor
      .select()
      .from(users)
      .where(eq(sql`lower(${users.email})`, email.toLowerCase()));
    return row ?? null;
  }

  async hasAny(executor: Executor = this.db): Promise<boolean> {
    const rows = await executor.select({ id: users.id }).from(users).limit(1);
    return rows.length > 0;
  }

  async rename(id: string, name: string): Promise<void> {
    await this.db.update(users).set({ name }).where(eq(users.id, id));
  }

  async setPassword(
    id: string,
    passwordHash: string,
    at: Date,
    executor: Executor = this.db,
  ): Promise<void> {
    await executor
      .update(users)
      .set({ passwordHash, passwordChangedAt: at })
      .where(eq(users.id, id));
  }

  /** The workspaces a person belongs to, by name. */
  async memberships(userId: string): Promise<MembershipSummary[]> {
    return this.db
      .select({
        workspaceId: workspaces.id,
        workspaceSlug: workspaces.slug,
        workspaceName: workspaces.name,
        role: memberships.role,
        readersMayComment: workspaces.readersMayComment,
        requiresSecondPerson: workspaces.requiresSecondPerson,
      })
      .from(memberships)
      .innerJoin(workspaces, eq(workspaces.id, memberships.workspaceId))
      .where(eq(memberships.userId, userId))
      .orderBy(asc(workspaces.name), asc(workspaces.id));
  }
}
