import type { InvitationPreview, InvitationSummary } from '#common/schemas/auth';

import type { PendingInvitation } from './invitations.repository.js';

export const presentInvitation = (row: PendingInvitation): InvitationSummary => ({
  id: row.id,
  email: row.email,
  role: row.role,
  invitedBy: row.invitedBy,
  createdAt: row.createdAt.toISOString(),
  expiresAt: row.expiresAt.toISOString(),
});

export const presentInvitationPreview = (
  row: PendingInvitation,
  hasAccount: boolean,
): InvitationPreview => ({
  workspaceName: row.workspaceName,
  workspaceSlug: row.workspaceSlug,
  email: row.email,
  role: row.role,
  invitedBy: row.invitedBy,
  hasAccount,
  expiresAt: row.expiresAt.toISOString(),
});
