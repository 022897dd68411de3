import { Inject, Injectable } from '@nestjs/common';
import { count, desc, eq } from 'drizzle-orm';

import { DATABASE, type Database, type Executor } from '#server/database/database';
import { users } from '#server/users/user.table';

import { auditEvents } from './audit-event.table.js';

export type NewAuditEvent = typeof auditEvents.$inferInsert;

/** An event with the present name of who caused it. */
export interface AuditEventRow {
  readonly id: string;
  readonly at: Date;
  readonly actorName: string | null;
  readonly action: string;
  readonly subject: string | null;
  readonly detail: string | null;
}

@Injectable()
export class AuditRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  async insert(event: NewAuditEvent, executor: Executor = this.db): Promise<void> {
    await executor.insert(auditEvents).values(event);
  }

  /** A page of a workspace's events, newest first, and how many there are. */
  async page(
    workspaceId: string,
    offset: number,
    limit: number,
  ): Promise<{ rows: AuditEventRow[]; total: number }> {
    const ofWorkspace = eq(auditEvents.workspaceId, workspaceId);
    const rows = await this.db
      .select({
        id: auditEvents.id,
        at: auditEvents.at,
        actorName: users.name,
        action: auditEvents.action,
        subject: auditEvents.subject,
        detail: auditEvents.detail,
      })
      .from(auditEvents)
      .leftJoin(users, eq(users.id, auditEvents.actorId))
      .where(ofWorkspace)
      .orderBy(desc(auditEvents.at), desc(auditEvents.id))
      .offset(offset)
      .limit(limit);
    const [counted] = await this.db.select({ total: count() }).from(auditEvents).where(ofWorkspace);
    return { rows, total: counted?.total ?? 0 };
  }
}
