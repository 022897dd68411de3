import { sql } from 'drizzle-orm';
import {
  check,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  text,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';

import {
  computationKind,
  computationState,
  type ComputationKind,
  type ComputationState,
} from '#common/schemas/computation';
import { createdAt, idColumn, moment } from '#server/database/columns';
import { users } from '#server/users/user.table';
import { workspaces } from '#server/workspaces/workspace.table';

export const computationKinds = pgEnum(
  'computation_kind',
  computationKind.options as [ComputationKind, ...ComputationKind[]],
);
export const computationStates = pgEnum(
  'computation_state',
  computationState.options as [ComputationState, ...ComputationState[]],
);

/** Work that takes longer than an answer may: asked once per input, its result written once. */
export const computations = pgTable(
  'computations',
  {
    id: idColumn(),
    workspaceId: uuid('workspace_id').notNull(),
    kind: computationKinds('kind').notNull(),
    /** SHA-256 of the kind, the engine's version and the input, hex. */
    inputHash: text('input_hash').notNull(),
    input: jsonb('input').$type<unknown>().notNull(),
    state: computationStates('state').notNull().default('waiting'),
    /** What it is doing, in words, and how much of it is done, 0 … 1. */
    stage: text('stage').notNull().default(''),
    progress: doublePrecision('progress').notNull().default(0),
    secondsLeft: doublePrecision('seconds_left'),
    result: jsonb('result').$type<unknown>(),
    problemCode: text('problem_code'),
    problemMessage: text('problem_message'),
    attempts: integer('attempts').notNull().default(0),
    askedById: uuid('asked_by_id').notNull(),
    createdAt: createdAt(),
    startedAt: moment('started_at'),
    /** Last sign of life of whoever computes it. */
    aliveAt: moment('alive_at'),
    endedAt: moment('ended_at'),
  },
  (table) => [
    uniqueIndex('computations_input')
      .on(table.workspaceId, table.inputHash)
      .where(sql`${table.state} in ('waiting', 'running', 'done')`),
    index('computations_asked').on(table.workspaceId, table.createdAt),
    foreignKey({
      name: 'computations_workspace_fk',
      columns: [table.workspaceId],
      foreignColumns: [workspaces.id],
    }).onDelete('cascade'),
    foreignKey({
      name: 'computations_asked_by_fk',
      columns: [table.askedById],
      foreignColumns: [users.id],
    }),
    check('computations_hash_form', sql`${table.inputHash} ~ '^[0-9a-f]{64}$'`),
    check('computations_progress_part', sql`${table.progress} between 0 and 1`),
    check(
      'computations_done_with_result',
      sql`(${table.state} = 'done') = (${table.result} is not null)`,
    ),
    check(
      'computations_failed_with_reason',
      sql`(${table.state} = 'failed') = (${table.problemCode} is not null)`,
    ),
  ],
);
export type ComputationRow = typeof computations.$inferSelect;
