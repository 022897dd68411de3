import { sql } from 'drizzle-orm';
import {
  check,
  doublePrecision,
  foreignKey,
  pgTable,
  primaryKey,
  text,
  uuid,
} from 'drizzle-orm/pg-core';

import { moment } from '#server/database/columns';
import { users } from '#server/users/user.table';

import { workspaces } from '../workspace.table.js';

/** Values of the shipped tables that a workspace replaced by its own. */
export const dataValues = pgTable(
  'data_values',
  {
    workspaceId: uuid('workspace_id').notNull(),
    key: text('key').notNull(),
    value: doublePrecision('value').notNull(),
    note: text('note').notNull().default(''),
    setById: uuid('set_by_id').notNull(),
    setAt: moment('set_at').notNull().defaultNow(),
  },
  (table) => [
    primaryKey({ name: 'data_values_pk', columns: [table.workspaceId, table.key] }),
    foreignKey({
      name: 'data_values_workspace_fk',
      columns: [table.workspaceId],
      foreignColumns: [workspaces.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'data_values_set_by_fk',
      columns: [table.setById],
      foreignColumns: [users.id],
    }),
    check('data_values_key_length', sql`char_length(${table.key}) between 1 and 80`),
    check('data_values_finite', sql`${table.value} not in ('NaN', 'Infinity', '-Infinity')`),
  ],
);
