import { sql } from 'drizzle-orm';
import {
  check,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  text,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';

import type { CellDefinition, EvaluationMethod } from '#common/schemas/cell';
import { defaultEnergeticModel, type EnergeticModel } from '#common/schemas/energetics';
import type { EvaluationProblem } from '#common/schemas/evaluation';
import { createdAt, idColumn, moment } from '#server/database/columns';
import { evaluations } from '#server/electrostatics/evaluation.table';
import { users } from '#server/users/user.table';

import { lattices, revisionStates } from '../lattice.table.js';

/**
 * Saved states of a cell. A trigger (see the migration) lets only the columns about review change.
 */
export const revisions = pgTable(
  'revisions',
  {
    id: idColumn(),
    workspaceId: uuid('workspace_id').notNull(),
    latticeId: uuid('lattice_id').notNull(),
    number: integer('number').notNull(),
    note: text('note').notNull().default(''),
    authorId: uuid('author_id').notNull(),
    createdAt: createdAt(),
    cell: jsonb('cell').$type<CellDefinition>().notNull(),
    method: jsonb('method').$type<EvaluationMethod>().notNull(),
    model: jsonb('model').$type<EnergeticModel>().notNull().default(defaultEnergeticModel),
    formula: text('formula').notNull(),
    evaluationHash: text('evaluation_hash'),
    /** Why there is no evaluation, when there is none. */
    evaluationProblem: jsonb('evaluation_problem').$type<EvaluationProblem>(),
    energyEvPerFormulaUnit: doublePrecision('energy_ev_per_formula_unit'),
    energyBoundEvPerFormulaUnit: doublePrecision('energy_bound_ev_per_formula_unit'),
    state: revisionStates('state').notNull().default('draft'),
    submittedById: uuid('submitted_by_id'),
    submittedAt: moment('submitted_at'),
    decidedById: uuid('decided_by_id'),
    decidedAt: moment('decided_at'),
    decisionReason: text('decision_reason'),
  },
  (table) => [
    unique('revisions_number').on(table.latticeId, table.number),
    unique('revisions_workspace_id').on(table.workspaceId, table.id),
    uniqueIndex('revisions_one_in_review')
      .on(table.latticeId)
      .where(sql`${table.state} = 'in_review'`),
    index('revisions_evaluation').on(table.evaluationHash),
    foreignKey({
      name: 'revisions_lattice_fk',
      columns: [table.workspaceId, table.latticeId],
      foreignColumns: [lattices.workspaceId, lattices.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'revisions_author_fk',
      columns: [table.authorId],
      foreignColumns: [users.id],
    }),
    foreignKey({
      name: 'revisions_evaluation_fk',
      columns: [table.evaluationHash],
      foreignColumns: [evaluations.hash],
    }),
    foreignKey({
      name: 'revisions_submitted_by_fk',
      columns: [table.submittedById],
      foreignColumns: [users.id],
    }),
    foreignKey({
      name: 'revisions_decided_by_fk',
      columns: [table.decidedById],
      foreignColumns: [users.id],
    }),
    check('revisions_number_counts', sql`${table.number} >= 1`),
    check(
      'revisions_json',
      sql`jsonb_typeof(${table.cell}) = 'object' and jsonb_typeof(${table.method}) = 'object' and jsonb_typeof(${table.model}) = 'object' and jsonb_typeof(coalesce(${table.evaluationProblem}, '{}')) = 'object'`,
    ),
    check(
      'revisions_evaluated_or_why_not',
      sql`num_nonnulls(${table.evaluationHash}, ${table.evaluationProblem}) = 1 and (${table.energyEvPerFormulaUnit} is null) = (${table.energyBoundEvPerFormulaUnit} is null)`,
    ),
    check(
      'revisions_submitted',
      sql`(${table.submittedById} is null) = (${table.submittedAt} is null) and (${table.state} = 'draft' or ${table.submittedAt} is not null)`,
    ),
    check(
      'revisions_decided',
      sql`(${table.decidedById} is null) = (${table.decidedAt} is null) and (${table.state} in ('accepted', 'returned')) = (${table.decidedAt} is not null)`,
    ),
    check(
      'revisions_returned_with_reason',
      sql`${table.state} <> 'returned' or btrim(coalesce(${table.decisionReason}, '')) <> ''`,
    ),
  ],
);
export type RevisionRow = typeof revisions.$inferSelect;
