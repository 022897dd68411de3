import { sql } from 'drizzle-orm';
import { boolean, check, pgTable, text, unique } from 'drizzle-orm/pg-core';

import { createdAt, idColumn } from '#server/database/columns';

export const workspaces = pgTable(
  'workspaces',
  {
    id: idColumn(),
    slug: text('slug').notNull(),
    name: text('name').notNull(),
    readersMayComment: boolean('readers_may_comment').notNull().default(true),
    requiresSecondPerson: boolean('requires_second_person').notNull().default(true),
    createdAt: createdAt(),
  },
  (table) => [
    unique('workspaces_slug').on(table.slug),
    check('workspaces_slug_form', sql`${table.slug} ~ '^[a-z0-9]([a-z0-9-]{0,46}[a-z0-9])?$'`),
    check('workspaces_name_length', sql`char_length(btrim(${table.name})) between 1 and 80`),
  ],
);
export type WorkspaceRow = typeof workspaces.$inferSelect;
