import { Inject, Injectable } from '@nestjs/common';
import { asc, eq } from 'drizzle-orm';

import type { Role } from '#common/schemas/auth';
import { DATABASE, type Database, type Executor } from '#server/database/database';

import { memberships } from './membership.table.js';
import { workspaces, type WorkspaceRow } from './workspace.table.js';

export interface WorkspaceOfMember extends WorkspaceRow {
  readonly role: Role;
}

export type WorkspaceChange = Partial<
  Pick<WorkspaceRow, 'name' | 'readersMayComment' | 'requiresSecondPerson'>
>;

@Injectable()
export class WorkspacesRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  /** Makes a workspace; null when the slug is taken. */
  async insert(
    workspace: { name: string; slug: string },
    executor: Executor = this.db,
  ): Promise<WorkspaceRow | null> {
    const [row] = await executor
      .insert(workspaces)
      .values(workspace)
      .onConflictDoNothing({ target: workspaces.slug })
      .returning();
    return row ?? null;
  }

  async findById(id: string, executor: Executor = this.db): Promise<WorkspaceRow | null> {
    const [row] = await executor.select().from(workspaces).where(eq(workspaces.id, id));
    return row ?? null;
  }

  /** The workspaces a person belongs to, by name. */
  async listOf(userId: string): Promise<WorkspaceOfMember[]> {
    const rows = await this.db
      .select({ workspace: workspaces, role: memberships.role })
      .from(memberships)
      .innerJoin(workspaces, eq(workspaces.id, memberships.workspaceId))
      .where(eq(memberships.userId, userId))
      .orderBy(asc(workspaces.name), asc(workspaces.id));
    return rows.map(({ workspace, role }) => ({ ...workspace, role }));
  }

  async update(
    id: string,
    change: WorkspaceChange,
    executor: Executor = this.db,
  ): Promise<WorkspaceRow | null> {
    const [row] = await executor
      .update(workspaces)
      .set(change)
      .where(eq(workspaces.id, id))
      .returning();
    return row ?? null;
  }
}
