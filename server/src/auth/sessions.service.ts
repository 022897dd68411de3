import { Injectable } from '@nestjs/common';
import type { Request } from 'express';

import { Problem } from '#common/errors/problem';
import type { SessionSummary } from '#common/schemas/auth';
import { Clock } from '#server/config/clock';
import { uuidV7 } from '#server/database/uuid-v7';
import { isId } from '#server/http/is-id';

import { presentSession, sessionEnd } from './session.presenter.js';
import { SessionRepository } from './session.repository.js';
import { storedKey } from './session-store.js';

const maxUserAgent = 300;

const settle = (work: (done: (error?: unknown) => void) => void): Promise<void> =>
  new Promise((resolve, reject) => {
    work((error) =>
      error === undefined || error === null
        ? resolve()
        : reject(error instanceof Error ? error : new Error('The session store failed.')),
    );
  });

@Injectable()
export class SessionsService {
  constructor(
    private readonly repository: SessionRepository,
    private readonly clock: Clock,
  ) {}

  /** Starts a session under a new id; the one the browser came with ends. */
  async start(request: Request, userId: string): Promise<void> {
    await settle((done) => request.session.regenerate(done));
    Object.assign(request.session, {
      userId,
      publicId: uuidV7(),
      startedAt: this.clock.now().getTime(),
      address: request.ip ?? null,
      userAgent: request.get('user-agent')?.slice(0, maxUserAgent) ?? null,
    });
    await settle((done) => request.session.save(done));
  }

  /** Ends the session of the request. */
  async end(request: Request): Promise<void> {
    await settle((done) => request.session.destroy(done));
  }

  async list(request: Request, userId: string): Promise<SessionSummary[]> {
    const now = this.clock.now();
    const current = storedKey(request.sessionID);
    return (await this.repository.list(userId, now))
      .filter((row) => sessionEnd(row) > now.getTime())
      .map((row) => presentSession(row, current));
  }

  /**
   * Ends one of the person's sessions.
   * @throws {Problem} `session.not_found`
   */
  async revoke(userId: string, sessionId: string): Promise<void> {
    if (!isId(sessionId) || !(await this.repository.remove(userId, sessionId))) {
      throw new Problem('session.not_found');
    }
  }

  /** Ends the person's sessions elsewhere. */
  async revokeOthers(request: Request, userId: string): Promise<void> {
    await this.repository.removeOthers(userId, storedKey(request.sessionID));
  }
}
