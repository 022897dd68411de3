import { z } from 'zod';

import { id, personSummary, timestamp } from '#common/schemas/shared';

/** What a remark is pinned to. */
export const annotationAnchor = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('revision') }),
  /** A row of the site table, by label. */
  z.object({ kind: z.literal('site'), label: z.string().max(24) }),
  /** A row of the pair ledger, by its key. */
  z.object({ kind: z.literal('pair'), key: z.string().max(120) }),
]);
export type AnnotationAnchor = z.infer<typeof annotationAnchor>;

const remarkText = z.string().trim().min(1, 'Write the remark.').max(4000);

export const annotationReply = z.object({
  id,
  author: personSummary,
  text: z.string(),
  createdAt: timestamp,
});
export const annotation = z.object({
  id,
  /** Shown in the stage and in the list; counts up per revision. */
  number: z.number().int(),
  revisionNumber: z.number().int(),
  anchor: annotationAnchor,
  text: z.string(),
  author: personSummary,
  createdAt: timestamp,
  resolvedAt: timestamp.nullable(),
  resolvedBy: personSummary.nullable(),
  replies: z.array(annotationReply),
});
export type Annotation = z.infer<typeof annotation>;
export const annotationList = z.object({ items: z.array(annotation) });

export const createAnnotationRequest = z.object({ anchor: annotationAnchor, text: remarkText });
export type CreateAnnotationRequest = z.infer<typeof createAnnotationRequest>;
export const replyRequest = z.object({ text: remarkText });

export const returnRevisionRequest = z.object({
  reason: z.string().trim().min(1, 'Say why it goes back.').max(2000),
});
export const acceptRevisionRequest = z.object({ reason: z.string().trim().max(2000).default('') });
