import type { SessionSummary } from '#common/schemas/auth';

import { sessionAbsoluteMs, sessionIdleMs } from './session-limits.js';
import type { SessionRow } from './session.repository.js';

/** When a session ends if nobody uses it again, Unix time in milliseconds. */
export const sessionEnd = (row: SessionRow): number =>
  Math.min(row.expire.getTime(), row.sess.startedAt + sessionAbsoluteMs);

export const presentSession = (row: SessionRow, currentSid: string): SessionSummary => ({
  id: row.id,
  isCurrent: row.sid === currentSid,
  createdAt: new Date(row.sess.startedAt).toISOString(),
  // Each use pushes the idle end to this long after it.
  lastSeenAt: new Date(row.expire.getTime() - sessionIdleMs).toISOString(),
  expiresAt: new Date(sessionEnd(row)).toISOString(),
  address: row.sess.address,
  userAgent: row.sess.userAgent,
});
