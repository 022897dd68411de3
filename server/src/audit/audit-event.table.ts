import { sql } from 'drizzle-orm';
import { check, index, pgTable, text, uuid } from 'drizzle-orm/pg-core';

import { idColumn, moment } from '#server/database/columns';
import { users } from '#server/users/user.table';
import { workspaces } from '#server/workspaces/workspace.table';

/** What happened, kept as it was said then; names may have changed since. */
export const auditEvents = pgTable(
  'audit_events',
  {
    id: idColumn(),
    at: moment('at').notNull().defaultNow(),
    /** Null for what concerns an account and no workspace. */
    workspaceId: uuid('workspace_id').references(() => workspaces.id, { onDelete: 'cascade' }),
    actorId: uuid('actor_id').references(() => users.id, { onDelete: 'set null' }),
    action: text('action').notNull(),
    subject: text('subject'),
    detail: text('detail'),
    address: text('address'),
  },
  (table) => [
    index('audit_events_workspace_at').on(table.workspaceId, table.at, table.id),
    index('audit_events_actor').on(table.actorId),
    check('audit_events_action_form', sql`${table.action} ~ '^[a-z_]+\\.[a-z_]+$'`),
  ],
);
