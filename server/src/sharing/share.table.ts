import { sql } from 'drizzle-orm';
import {
  check,
  foreignKey,
  index,
  integer,
  pgTable,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';

import { createdAt, idColumn, moment } from '#server/database/columns';
import { revisions } from '#server/lattices/revisions/revision.table';
import { users } from '#server/users/user.table';

/** Links that open one revision to whoever holds them. */
export const shares = pgTable(
  'shares',
  {
    id: idColumn(),
    workspaceId: uuid('workspace_id').notNull(),
    revisionId: uuid('revision_id').notNull(),
    /** SHA-256 of the token, hexadecimal; the token itself is only in the link. */
    tokenHash: text('token_hash').notNull(),
    createdById: uuid('created_by_id').notNull(),
    createdAt: createdAt(),
    /** Null: until withdrawn. */
    expiresAt: moment('expires_at'),
    revokedAt: moment('revoked_at'),
    openedCount: integer('opened_count').notNull().default(0),
    lastOpenedAt: moment('last_opened_at'),
  },
  (table) => [
    unique('shares_token_hash').on(table.tokenHash),
    index('shares_revision').on(table.revisionId),
    foreignKey({
      name: 'shares_revision_fk',
      columns: [table.workspaceId, table.revisionId],
      foreignColumns: [revisions.workspaceId, revisions.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'shares_created_by_fk',
      columns: [table.createdById],
      foreignColumns: [users.id],
    }),
    check('shares_token_hash_form', sql`${table.tokenHash} ~ '^[0-9a-f]{64}$'`),
    check('shares_expires_later', sql`${table.expiresAt} > ${table.createdAt}`),
    check(
      'shares_opened',
      sql`${table.openedCount} >= 0 and (${table.openedCount} = 0) = (${table.lastOpenedAt} is null)`,
    ),
  ],
);
export type ShareRow = typeof shares.$inferSelect;
