import { createHash } from 'node:crypto';

import { Inject, Injectable, type OnApplicationShutdown } from '@nestjs/common';
import connectPgSimple from 'connect-pg-simple';
import session, { Store, type SessionData } from 'express-session';

import { Clock } from '#server/config/clock';
import { DATABASE_POOL, type DatabasePool } from '#server/database/database';

import { sessionAbsoluteMs } from './session-limits.js';

const PgStore = connectPgSimple(session);

type Done = (error?: unknown) => void;
type Found = (error: unknown, session?: SessionData | null) => void;

/** The key a session is stored under: SHA-256 of the id in the cookie. */
export const storedKey = (sessionId: string): string =>
  createHash('sha256').update(sessionId).digest('hex');

/**
 * Sessions in PostgreSQL by connect-pg-simple, with two rules of ours around it: only the hash of
 * an id is stored, and no session outlives its absolute limit.
 */
@Injectable()
export class HashedSessionStore extends Store implements OnApplicationShutdown {
  private readonly inner: InstanceType<typeof PgStore>;

  constructor(
    @Inject(DATABASE_POOL) pool: DatabasePool,
    private readonly clock: Clock,
  ) {
    super();
    this.inner = new PgStore({ pool, tableName: 'sessions', createTableIfMissing: false });
  }

  override get(sessionId: string, callback: Found): void {
    this.inner.get(storedKey(sessionId), (error: unknown, found?: SessionData | null) => {
      const isTooOld =
        found !== null &&
        found !== undefined &&
        this.clock.now().getTime() - found.startedAt >= sessionAbsoluteMs;
      callback(error, isTooOld ? null : found);
    });
  }

  override set(sessionId: string, data: SessionData, callback?: Done): void {
    this.inner.set(storedKey(sessionId), data, callback);
  }

  override touch(sessionId: string, data: SessionData, callback?: () => void): void {
    this.inner.touch(storedKey(sessionId), data, callback);
  }

  override destroy(sessionId: string, callback?: Done): void {
    this.inner.destroy(storedKey(sessionId), callback);
  }

  onApplicationShutdown(): void {
    this.inner.close();
  }
}
