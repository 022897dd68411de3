import { sql } from 'drizzle-orm';
import {
  check,
  doublePrecision,
  foreignKey,
  index,
  integer,
  pgEnum,
  pgTable,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';

import { revisionState, type RevisionState } from '#common/schemas/lattice';
import { createdAt, idColumn, moment } from '#server/database/columns';
import { users } from '#server/users/user.table';
import { workspaces } from '#server/workspaces/workspace.table';

export const revisionStates = pgEnum(
  'revision_state',
  revisionState.options as [RevisionState, ...RevisionState[]],
);

/** What the shelf says of a lattice: of its newest revision, of its draft before there is one. */
const headline = () => ({
  formula: text('formula'),
  spaceGroupNumber: integer('space_group_number'),
  spaceGroupSymbol: text('space_group_symbol'),
  /** Reduced Madelung constant and its bound. */
  madelungReduced: doublePrecision('madelung_reduced'),
  madelungReducedBound: doublePrecision('madelung_reduced_bound'),
  energyEvPerFormulaUnit: doublePrecision('energy_ev_per_formula_unit'),
  energyBoundEvPerFormulaUnit: doublePrecision('energy_bound_ev_per_formula_unit'),
  /** Why there is no energy. */
  problemCode: text('problem_code'),
});

export const lattices = pgTable(
  'lattices',
  {
    id: idColumn(),
    workspaceId: uuid('workspace_id').notNull(),
    name: text('name').notNull(),
    tags: text('tags').array().notNull().default([]),
    prototype: text('prototype'),
    authorId: uuid('author_id').notNull(),
    state: revisionStates('state').notNull().default('draft'),
    headRevision: integer('head_revision').notNull().default(0),
    /** Counts every draft ever written, so that no two of a lattice share a version. */
    draftVersion: integer('draft_version').notNull().default(0),
    ...headline(),
    createdAt: createdAt(),
    updatedAt: moment('updated_at').notNull().defaultNow(),
    deletedAt: moment('deleted_at'),
  },
  (table) => [
    // What belongs to a lattice names both, so that it can't stand in another workspace.
    unique('lattices_workspace_id').on(table.workspaceId, table.id),
    index('lattices_shelf').on(table.workspaceId, table.updatedAt),
    index('lattices_author').on(table.authorId),
    index('lattices_deleted')
      .on(table.deletedAt)
      .where(sql`${table.deletedAt} is not null`),
    foreignKey({
      name: 'lattices_workspace_fk',
      columns: [table.workspaceId],
      foreignColumns: [workspaces.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'lattices_author_fk',
      columns: [table.authorId],
      foreignColumns: [users.id],
    }),
    check('lattices_name_length', sql`char_length(btrim(${table.name})) between 1 and 120`),
    check('lattices_tags_count', sql`cardinality(${table.tags}) <= 12`),
    check('lattices_counts', sql`${table.headRevision} >= 0 and ${table.draftVersion} >= 0`),
    check('lattices_state_of_head', sql`${table.headRevision} > 0 or ${table.state} = 'draft'`),
    check(
      'lattices_bounds',
      sql`(${table.madelungReduced} is null) = (${table.madelungReducedBound} is null) and (${table.energyEvPerFormulaUnit} is null) = (${table.energyBoundEvPerFormulaUnit} is null)`,
    ),
  ],
);
export type LatticeRow = typeof lattices.$inferSelect;
