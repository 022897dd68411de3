import { sql } from 'drizzle-orm';
import { check, foreignKey, integer, jsonb, pgTable, uuid } from 'drizzle-orm/pg-core';

import type { CellDefinition, EvaluationMethod } from '#common/schemas/cell';
import { defaultEnergeticModel, type EnergeticModel } from '#common/schemas/energetics';
import { moment } from '#server/database/columns';
import { users } from '#server/users/user.table';

import { lattices } from '../lattice.table.js';

/** The one unsaved edit of a lattice. */
export const drafts = pgTable(
  'drafts',
  {
    latticeId: uuid('lattice_id').primaryKey(),
    workspaceId: uuid('workspace_id').notNull(),
    baseRevision: integer('base_revision').notNull(),
    version: integer('version').notNull(),
    cell: jsonb('cell').$type<CellDefinition>().notNull(),
    method: jsonb('method').$type<EvaluationMethod>().notNull(),
    model: jsonb('model').$type<EnergeticModel>().notNull().default(defaultEnergeticModel),
    updatedAt: moment('updated_at').notNull().defaultNow(),
    updatedById: uuid('updated_by_id').notNull(),
  },
  (table) => [
    foreignKey({
      name: 'drafts_lattice_fk',
      columns: [table.workspaceId, table.latticeId],
      foreignColumns: [lattices.workspaceId, lattices.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'drafts_updated_by_fk',
      columns: [table.updatedById],
      foreignColumns: [users.id],
    }),
    check('drafts_counts', sql`${table.baseRevision} >= 0 and ${table.version} >= 1`),
    check(
      'drafts_json',
      sql`jsonb_typeof(${table.cell}) = 'object' and jsonb_typeof(${table.method}) = 'object' and jsonb_typeof(${table.model}) = 'object'`,
    ),
  ],
);
export type DraftRow = typeof drafts.$inferSelect;
