import { sql } from 'drizzle-orm';
import {
  check,
  doublePrecision,
  index,
  jsonb,
  pgTable,
  primaryKey,
  text,
  uuid,
} from 'drizzle-orm/pg-core';

import type { EvaluationMethod } from '#common/schemas/cell';
import type { EvaluationResult } from '#common/schemas/evaluation';
import { moment } from '#server/database/columns';
import { workspaces } from '#server/workspaces/workspace.table';

/** Computed results, addressed by the hash of exactly what went in; never changed. */
export const evaluations = pgTable(
  'evaluations',
  {
    hash: text('hash').primaryKey(),
    engine: text('engine').notNull(),
    method: jsonb('method').$type<EvaluationMethod>().notNull(),
    result: jsonb('result').$type<EvaluationResult>().notNull(),
    computedAt: moment('computed_at').notNull().defaultNow(),
    durationMs: doublePrecision('duration_ms').notNull(),
  },
  (table) => [
    index('evaluations_computed').on(table.computedAt),
    check('evaluations_hash_form', sql`${table.hash} ~ '^[0-9a-f]{64}$'`),
    check(
      'evaluations_json',
      sql`jsonb_typeof(${table.method}) = 'object' and jsonb_typeof(${table.result}) = 'object'`,
    ),
    check('evaluations_duration', sql`${table.durationMs} >= 0`),
  ],
);
export type EvaluationRow = typeof evaluations.$inferSelect;

/** Which workspaces have asked for a result: the others must not learn of it by its hash. */
export const evaluationUses = pgTable(
  'evaluation_uses',
  {
    workspaceId: uuid('workspace_id')
      .notNull()
      .references(() => workspaces.id, { onDelete: 'cascade' }),
    hash: text('hash')
      .notNull()
      .references(() => evaluations.hash, { onDelete: 'cascade' }),
  },
  (table) => [
    primaryKey({ name: 'evaluation_uses_pkey', columns: [table.workspaceId, table.hash] }),
    index('evaluation_uses_hash').on(table.hash),
  ],
);
