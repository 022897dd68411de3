import type { AuditEvent } from '#common/schemas/workspace';

import type { AuditEventRow } from './audit.repository.js';

export const presentAuditEvent = (row: AuditEventRow): AuditEvent => ({
  id: row.id,
  at: row.at.toISOString(),
  actorName: row.actorName,
  action: row.action,
  subject: row.subject,
  detail: row.detail,
});
