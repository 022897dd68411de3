import { Inject, Injectable } from '@nestjs/common';
import { and, desc, eq, gt, isNull, sql } from 'drizzle-orm';

import type { Role } from '#common/schemas/auth';
import { DATABASE, type Database, type Executor } from '#server/database/database';
import { users } from '#server/users/user.table';

import { invitations, type InvitationRow } from './invitation.table.js';
import { workspaces } from './workspace.table.js';

export interface PendingInvitation {
  readonly id: string;
  readonly email: string;
  readonly role: Role;
  readonly invitedBy: string;
  readonly createdAt: Date;
  readonly expiresAt: Date;
  readonly workspaceId: string;
  readonly workspaceName: string;
  readonly workspaceSlug: string;
}

const open = () => and(isNull(invitations.acceptedAt), isNull(invitations.withdrawnAt));

@Injectable()
export class InvitationsRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  async insert(
    invitation: typeof invitations.$inferInsert,
    executor: Executor = this.db,
  ): Promise<InvitationRow> {
    const [row] = await executor.insert(invitations).values(invitation).returning();
    return row!;
  }

  /** Withdraws whatever invitation is open for the address. */
  async withdrawAddress(
    workspaceId: string,
    email: string,
    now: Date,
    executor: Executor,
  ): Promise<void> {
    await executor
      .update(invitations)
      .set({ withdrawnAt: now })
      .where(
        and(
          eq(invitations.workspaceId, workspaceId),
          eq(sql`lower(${invitations.email})`, email.toLowerCase()),
          open(),
        ),
      );
  }

  /** Withdraws an open invitation of the workspace; null when there is none. */
  async withdraw(
    workspaceId: string,
    id: string,
    now: Date,
    executor: Executor,
  ): Promise<InvitationRow | null> {
    const [row] = await executor
      .update(invitations)
      .set({ withdrawnAt: now })
      .where(and(eq(invitations.workspaceId, workspaceId), eq(invitations.id, id), open()))
      .returning();
    return row ?? null;
  }

  /** Invitations of the workspace that can still be accepted, the newest first. */
  async listOpen(workspaceId: string, now: Date): Promise<PendingInvitation[]> {
    return this.pending()
      .where(and(eq(invitations.workspaceId, workspaceId), open(), gt(invitations.expiresAt, now)))
      .orderBy(desc(invitations.createdAt), desc(invitations.id));
  }

  /** The invitation a token opens, if it can still be accepted. */
  async findOpen(tokenHash: string, now: Date): Promise<PendingInvitation | null> {
    const [row] = await this.pending().where(
      and(eq(invitations.tokenHash, tokenHash), open(), gt(invitations.expiresAt, now)),
    );
    return row ?? null;
  }

  /** Uses an invitation up; false when someone was faster, or it has ended meanwhile. */
  async markAccepted(id: string, userId: string, now: Date, executor: Executor): Promise<boolean> {
    const rows = await executor
      .update(invitations)
      .set({ acceptedAt: now, acceptedById: userId })
      .where(and(eq(invitations.id, id), open(), gt(invitations.expiresAt, now)))
      .returning({ id: invitations.id });
    return rows.length > 0;
  }

  private pending() {
    return this.db
      .select({
        id: invitations.id,
        email: invitations.email,
        role: invitations.role,
        invitedBy: users.name,
        createdAt: invitations.createdAt,
        expiresAt: invitations.expiresAt,
        workspaceId: workspaces.id,
        workspaceName: workspaces.name,
        workspaceSlug: workspaces.slug,
      })
      .from(invitations)
      .innerJoin(workspaces, eq(workspaces.id, invitations.workspaceId))
      .innerJoin(users, eq(users.id, invitations.invitedById))
      .$dynamic();
  }
}
