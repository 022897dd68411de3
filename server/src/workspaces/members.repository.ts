import { Inject, Injectable } from '@nestjs/common';
import { and, asc, eq, sql } from 'drizzle-orm';

import type { Role } from '#common/schemas/auth';
import { DATABASE, type Database, type Executor } from '#server/database/database';
import { users } from '#server/users/user.table';

import { memberships } from './membership.table.js';

export interface MemberRow {
  readonly userId: string;
  readonly name: string;
  readonly email: string;
  readonly role: Role;
  readonly joinedAt: Date;
}

const memberFields = {
  userId: users.id,
  name: users.name,
  email: users.email,
  role: memberships.role,
  joinedAt: memberships.joinedAt,
};

const place = (workspaceId: string, userId: string) =>
  and(eq(memberships.workspaceId, workspaceId), eq(memberships.userId, userId));

@Injectable()
export class MembersRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  /** False when the person is a member already. */
  async insert(
    membership: { workspaceId: string; userId: string; role: Role },
    executor: Executor = this.db,
  ): Promise<boolean> {
    const rows = await executor
      .insert(memberships)
      .values(membership)
      .onConflictDoNothing()
      .returning({ userId: memberships.userId });
    return rows.length > 0;
  }

  /** Everyone in the workspace, by name. */
  async list(workspaceId: string): Promise<MemberRow[]> {
    return this.db
      .select(memberFields)
      .from(memberships)
      .innerJoin(users, eq(users.id, memberships.userId))
      .where(eq(memberships.workspaceId, workspaceId))
      .orderBy(asc(users.name), asc(users.id));
  }

  async find(
    workspaceId: string,
    userId: string,
    executor: Executor = this.db,
  ): Promise<MemberRow | null> {
    const [row] = await executor
      .select(memberFields)
      .from(memberships)
      .innerJoin(users, eq(users.id, memberships.userId))
      .where(place(workspaceId, userId));
    return row ?? null;
  }

  async hasAddress(workspaceId: string, email: string): Promise<boolean> {
    const rows = await this.db
      .select({ userId: memberships.userId })
      .from(memberships)
      .innerJoin(users, eq(users.id, memberships.userId))
      .where(
        and(
          eq(memberships.workspaceId, workspaceId),
          eq(sql`lower(${users.email})`, email.toLowerCase()),
        ),
      );
    return rows.length > 0;
  }

  async setRole(
    workspaceId: string,
    userId: string,
    role: Role,
    executor: Executor = this.db,
  ): Promise<void> {
    await executor.update(memberships).set({ role }).where(place(workspaceId, userId));
  }

  async remove(workspaceId: string, userId: string, executor: Executor = this.db): Promise<void> {
    await executor.delete(memberships).where(place(workspaceId, userId));
  }
}
