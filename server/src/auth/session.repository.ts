import { Inject, Injectable } from '@nestjs/common';
import { and, desc, eq, gt, ne } from 'drizzle-orm';

import { DATABASE, type Database } from '#server/database/database';

import type { StoredSession } from './session-data.js';
import { sessions } from './session.table.js';

export interface SessionRow {
  readonly sid: string;
  readonly id: string;
  readonly expire: Date;
  readonly sess: StoredSession;
}

@Injectable()
export class SessionRepository {
  constructor(@Inject(DATABASE) private readonly db: Database) {}

  /** A person's sessions that have not run out, the most recently used first. */
  async list(userId: string, now: Date): Promise<SessionRow[]> {
    return this.db
      .select({
        sid: sessions.sid,
        id: sessions.id,
        expire: sessions.expire,
        sess: sessions.sess,
      })
      .from(sessions)
      .where(and(eq(sessions.userId, userId), gt(sessions.expire, now)))
      .orderBy(desc(sessions.expire), desc(sessions.id));
  }

  /** Ends one session of the person; false when they have no such session. */
  async remove(userId: string, id: string): Promise<boolean> {
    const removed = await this.db
      .delete(sessions)
      .where(and(eq(sessions.userId, userId), eq(sessions.id, id)))
      .returning({ id: sessions.id });
    return removed.length > 0;
  }

  /** Ends the person's sessions, all but the one stored under this key. */
  async removeOthers(userId: string, keptSid: string): Promise<void> {
    await this.db
      .delete(sessions)
      .where(and(eq(sessions.userId, userId), ne(sessions.sid, keptSid)));
  }
}
