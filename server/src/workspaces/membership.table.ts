import { index, pgEnum, pgTable, primaryKey, uuid } from 'drizzle-orm/pg-core';

import { role, type Role } from '#common/schemas/auth';
import { moment } from '#server/database/columns';
import { users } from '#server/users/user.table';

import { workspaces } from './workspace.table.js';

export const workspaceRole = pgEnum('workspace_role', role.options as [Role, ...Role[]]);

/**
 * Who belongs where. A trigger (see the migration) keeps an owner in every workspace that has
 * members, at the end of each transaction.
 */
export const memberships = pgTable(
  'memberships',
  {
    workspaceId: uuid('workspace_id')
      .notNull()
      .references(() => workspaces.id, { onDelete: 'cascade' }),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    role: workspaceRole('role').notNull(),
    joinedAt: moment('joined_at').notNull().defaultNow(),
  },
  (table) => [
    primaryKey({ name: 'memberships_pkey', columns: [table.workspaceId, table.userId] }),
    index('memberships_user').on(table.userId),
  ],
);
