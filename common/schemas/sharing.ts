import { z } from 'zod';

import { revisionDetail } from '#common/schemas/lattice';
import { id, personSummary, secretToken, timestamp } from '#common/schemas/shared';

/** Days until the link ends; null: until withdrawn. */
export const createShareRequest = z.object({
  expiresInDays: z.number().int().min(1).max(365).nullable().default(null),
});

export const shareSummary = z.object({
  id,
  revisionNumber: z.number().int(),
  createdBy: personSummary,
  createdAt: timestamp,
  expiresAt: timestamp.nullable(),
  revokedAt: timestamp.nullable(),
  openedCount: z.number().int(),
  lastOpenedAt: timestamp.nullable(),
});
export type ShareSummary = z.infer<typeof shareSummary>;
export const shareList = z.object({ items: z.array(shareSummary) });

/** The token is shown this once; only its hash is kept. */
export const createdShare = shareSummary.extend({ token: secretToken });
export type CreatedShare = z.infer<typeof createdShare>;

/** What a link holder sees: one frozen revision and nothing else. */
export const sharedRevision = z.object({
  workspaceName: z.string(),
  revision: revisionDetail.omit({ id: true, latticeId: true }),
  /** Symmetry operations of the cell, so that the page needs no other request. */
  expiresAt: timestamp.nullable(),
});
export type SharedRevision = z.infer<typeof sharedRevision>;
