import { sql } from 'drizzle-orm';
import {
  check,
  foreignKey,
  index,
  integer,
  pgEnum,
  pgTable,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';

import type { AnnotationAnchor } from '#common/schemas/review';
import { createdAt, idColumn, moment } from '#server/database/columns';
import { revisions } from '#server/lattices/revisions/revision.table';
import { users } from '#server/users/user.table';

type AnchorKind = AnnotationAnchor['kind'];

const anchorKinds = ['revision', 'site', 'pair'] satisfies [AnchorKind, ...AnchorKind[]];

export const anchorKind = pgEnum('annotation_anchor', anchorKinds);

/** A remark pinned to a revision, one of its sites or one of its ion pairs. */
export const annotations = pgTable(
  'annotations',
  {
    id: idColumn(),
    workspaceId: uuid('workspace_id').notNull(),
    revisionId: uuid('revision_id').notNull(),
    number: integer('number').notNull(),
    anchorKind: anchorKind('anchor_kind').notNull(),
    /** Label of the site or key of the ledger row. */
    anchorTarget: text('anchor_target'),
    text: text('text').notNull(),
    authorId: uuid('author_id').notNull(),
    createdAt: createdAt(),
    resolvedAt: moment('resolved_at'),
    resolvedById: uuid('resolved_by_id'),
  },
  (table) => [
    unique('annotations_number').on(table.revisionId, table.number),
    unique('annotations_workspace_id').on(table.workspaceId, table.id),
    foreignKey({
      name: 'annotations_revision_fk',
      columns: [table.workspaceId, table.revisionId],
      foreignColumns: [revisions.workspaceId, revisions.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'annotations_author_fk',
      columns: [table.authorId],
      foreignColumns: [users.id],
    }),
    foreignKey({
      name: 'annotations_resolved_by_fk',
      columns: [table.resolvedById],
      foreignColumns: [users.id],
    }),
    check('annotations_number_counts', sql`${table.number} >= 1`),
    check(
      'annotations_anchor_target',
      sql`(${table.anchorKind} = 'revision') = (${table.anchorTarget} is null)`,
    ),
    check('annotations_text_length', sql`char_length(${table.text}) between 1 and 4000`),
    check(
      'annotations_resolved',
      sql`(${table.resolvedAt} is null) = (${table.resolvedById} is null)`,
    ),
  ],
);
export type AnnotationRow = typeof annotations.$inferSelect;

/** Answers to a remark, in the order they were given. */
export const annotationReplies = pgTable(
  'annotation_replies',
  {
    id: idColumn(),
    workspaceId: uuid('workspace_id').notNull(),
    annotationId: uuid('annotation_id').notNull(),
    text: text('text').notNull(),
    authorId: uuid('author_id').notNull(),
    createdAt: createdAt(),
  },
  (table) => [
    index('annotation_replies_annotation').on(table.annotationId),
    foreignKey({
      name: 'annotation_replies_annotation_fk',
      columns: [table.workspaceId, table.annotationId],
      foreignColumns: [annotations.workspaceId, annotations.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'annotation_replies_author_fk',
      columns: [table.authorId],
      foreignColumns: [users.id],
    }),
    check('annotation_replies_text_length', sql`char_length(${table.text}) between 1 and 4000`),
  ],
);
export type AnnotationReplyRow = typeof annotationReplies.$inferSelect;
