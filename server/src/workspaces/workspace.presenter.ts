import type { Role } from '#common/schemas/auth';
import type { WorkspaceDetail } from '#common/schemas/workspace';

import type { WorkspaceRow } from './workspace.table.js';

export const presentWorkspace = (row: WorkspaceRow, role: Role): WorkspaceDetail => ({
  id: row.id,
  slug: row.slug,
  name: row.name,
  role,
  readersMayComment: row.readersMayComment,
  requiresSecondPerson: row.requiresSecondPerson,
  createdAt: row.createdAt.toISOString(),
});
