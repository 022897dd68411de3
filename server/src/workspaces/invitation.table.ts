import { sql } from 'drizzle-orm';
import { check, index, pgTable, text, unique, uniqueIndex, uuid } from 'drizzle-orm/pg-core';

import { createdAt, idColumn, moment } from '#server/database/columns';
import { users } from '#server/users/user.table';

import { workspaceRole } from './membership.table.js';
import { workspaces } from './workspace.table.js';

export const invitations = pgTable(
  'invitations',
  {
    id: idColumn(),
    workspaceId: uuid('workspace_id')
      .notNull()
      .references(() => workspaces.id, { onDelete: 'cascade' }),
    email: text('email').notNull(),
    role: workspaceRole('role').notNull(),
    /** SHA-256 of the token, hexadecimal; the token itself is only in the link. */
    tokenHash: text('token_hash').notNull(),
    invitedById: uuid('invited_by_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    createdAt: createdAt(),
    expiresAt: moment('expires_at').notNull(),
    acceptedAt: moment('accepted_at'),
    acceptedById: uuid('accepted_by_id').references(() => users.id, { onDelete: 'set null' }),
    withdrawnAt: moment('withdrawn_at'),
  },
  (table) => [
    unique('invitations_token_hash').on(table.tokenHash),
    // One open invitation for an address; a new one takes the place of the old.
    uniqueIndex('invitations_open')
      .on(table.workspaceId, sql`lower(${table.email})`)
      .where(sql`${table.acceptedAt} is null and ${table.withdrawnAt} is null`),
    index('invitations_invited_by').on(table.invitedById),
    check(
      'invitations_email_form',
      sql`char_length(${table.email}) between 3 and 254 and ${table.email} like '%_@_%'`,
    ),
    check('invitations_token_hash_form', sql`${table.tokenHash} ~ '^[0-9a-f]{64}$'`),
    check('invitations_end_once', sql`${table.acceptedAt} is null or ${table.withdrawnAt} is null`),
    check('invitations_expires_later', sql`${table.expiresAt} > ${table.createdAt}`),
  ],
);
export type InvitationRow = typeof invitations.$inferSelect;
