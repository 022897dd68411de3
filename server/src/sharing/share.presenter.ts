import type { PersonSummary } from '#common/schemas/shared';
import type { CreatedShare, SharedRevision, ShareSummary } from '#common/schemas/sharing';
import { presentRevisionDetail } from '#server/lattices/revisions/revision.presenter';
import { presentPerson } from '#server/users/person.presenter';

import type { ShareFullRow } from './shares.repository.js';
import type { OpenedShare } from './shares.service.js';

export const presentShare = (row: ShareFullRow): ShareSummary => ({
  id: row.id,
  revisionNumber: row.revisionNumber,
  createdBy: presentPerson(row.createdBy),
  createdAt: row.createdAt.toISOString(),
  expiresAt: row.expiresAt?.toISOString() ?? null,
  revokedAt: row.revokedAt?.toISOString() ?? null,
  openedCount: row.openedCount,
  lastOpenedAt: row.lastOpenedAt?.toISOString() ?? null,
});

export const presentCreatedShare = (share: ShareFullRow, token: string): CreatedShare => ({
  ...presentShare(share),
  token,
});

/** Of people, a link holder learns the name and nothing to find them by. */
const nameOnly = (person: PersonSummary): PersonSummary => ({
  ...person,
  id: '00000000-0000-0000-0000-000000000000',
});

/** The revision alone: what was said about it in review stays inside. */
export function presentSharedRevision({ share, ...evaluated }: OpenedShare): SharedRevision {
  const {
    id: _id,
    latticeId: _latticeId,
    author,
    submittedBy,
    decidedBy,
    ...shown
  } = presentRevisionDetail(evaluated);
  return {
    workspaceName: share.workspaceName,
    revision: {
      ...shown,
      author: nameOnly(author),
      submittedBy: submittedBy && nameOnly(submittedBy),
      decidedBy: decidedBy && nameOnly(decidedBy),
      decisionReason: null,
    },
    expiresAt: share.expiresAt?.toISOString() ?? null,
  };
}
